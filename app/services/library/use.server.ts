import type { EntityManager } from "@mikro-orm/postgresql";
import { FlowStepFilm } from "#app/db/entities/flow-step-film.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { StackLayer } from "#app/db/entities/stack-layer.ts";
import { Stack } from "#app/db/entities/stack.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { LibraryKey, LibraryUse } from "#app/schemas/library-records.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";

interface Question {
  id: string;
  program: { $in: string[] };
}

const use = (kind: LibraryUse["kind"], { id, name }: { id: string; name: string }): LibraryUse => ({ kind, id, name });

const stepsWith = (column: "carrier" | "bondingMaterial" | "tape" | "equipment") => {
  return async (em: EntityManager, { id, program }: Question): Promise<LibraryUse[]> => {
    const steps = await em.find(FlowStep, { [column]: id, program }, { populate: ["flow"] });
    return steps.map(({ flow }) => use("flow", flow));
  };
};

const USES: Record<LibraryKey, (em: EntityManager, question: Question) => Promise<LibraryUse[]>> = {
  film: async (em, { id, program }) => {
    const layers = await em.find(StackLayer, { film: id, program }, { populate: ["stack"] });
    const changes = await em.find(FlowStepFilm, { film: id, program }, { populate: ["step.flow"] });
    return [...layers.map(({ stack }) => use("stack", stack)), ...changes.map(({ step }) => use("flow", step.flow))];
  },
  silicon: async (em, { id, program }) => {
    const stacks = await em.find(Stack, { silicon: id, program });
    const flows = await em.find(Flow, { silicon: id, program });
    return [...stacks.map((stack) => use("stack", stack)), ...flows.map((flow) => use("flow", flow))];
  },
  carrier: stepsWith("carrier"),
  bondingMaterial: stepsWith("bondingMaterial"),
  tape: stepsWith("tape"),
  equipment: stepsWith("equipment"),
};

/** Stacks and flows of the person's own programs that use a record of the library, each once, by name. */
export async function whereUsed(scope: ActorScope, key: LibraryKey, id: string): Promise<LibraryUse[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const uses = await USES[key](em, { id, program: { $in: programs } });
    const distinct = [...new Map(uses.map((each) => [each.id, each])).values()];
    return distinct.toSorted((a, b) => a.name.localeCompare(b.name));
  });
}
