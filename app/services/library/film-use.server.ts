import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { StackLayer } from "#app/db/entities/stack-layer.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";

export interface FilmUse {
  kind: "stack" | "flow";
  id: string;
  name: string;
}

/** Stacks and flows of the person's own programs that use a film. */
export async function whereFilmIsUsed(scope: ActorScope, filmId: string): Promise<FilmUse[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const where = { film: filmId, program: { $in: programs } };
    const layers = await em.find(StackLayer, where, { populate: ["stack"] });
    const changes = await em.find(FlowStepFilm, where, { populate: ["step.flow"] });
    const uses = [
      ...layers.map(({ stack }): FilmUse => ({ kind: "stack", id: stack.id, name: stack.name })),
      ...changes.map(({ step }): FilmUse => ({ kind: "flow", id: step.flow.id, name: step.flow.name })),
    ];
    const distinct = [...new Map(uses.map((use) => [use.id, use])).values()];
    return distinct.toSorted((a, b) => a.name.localeCompare(b.name));
  });
}
