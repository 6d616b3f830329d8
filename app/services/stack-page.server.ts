import type { StackAround } from "#app/lib/stack-around.ts";
import type { StackConflict } from "#app/lib/stack-conflict.ts";
import { stackDraft, type StackChoices } from "#app/lib/stack-draft.ts";
import type { StackPanel } from "#app/lib/stack-panel.ts";
import { newStackText, stackText, textOfStack, type StackText } from "#app/lib/stack-text.ts";
import { viewTemperature } from "#app/lib/stack-view.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { stackPanel } from "./estimate-answer.ts";
import { allOfLibrary } from "./library/library.server.ts";
import { siteLimits } from "./limits.server.ts";
import { findStack, getStack, programsForNewStack, stackChoices } from "./stacks.server.ts";
import { isUuid } from "./uuid.server.ts";

/** Films and silicon of the library, with what a stack takes from them. */
async function libraryChoices(scope: ActorScope): Promise<StackChoices> {
  const [films, silicon] = await Promise.all([allOfLibrary(scope, "film"), allOfLibrary(scope, "silicon")]);
  return {
    films: films.map(({ id, name, kind, stress, youngsModulus, poissonsRatio, expansion }) => ({
      id,
      name,
      kind,
      stress,
      youngsModulus: youngsModulus.value,
      poissonsRatio: poissonsRatio.value,
      expansion: expansion.value,
    })),
    silicon: silicon.map(({ id, name, orientation, diameter, thickness }) => ({
      id,
      name,
      orientation,
      diameter,
      thickness: thickness.value,
    })),
  };
}

async function surroundings(scope: ActorScope, search: URLSearchParams, own: string | null): Promise<StackAround> {
  const at = (search.get("at") ?? "").slice(0, 60);
  const asked = search.get("with") ?? "";
  const laidOver = asked === own ? "" : asked;
  const [choices, limits, others, other] = await Promise.all([
    libraryChoices(scope),
    siteLimits(scope),
    stackChoices(scope),
    isUuid(laidOver) ? findStack(scope, laidOver) : null,
  ]);
  const panel = other && stackPanel(stackDraft(textOfStack(other), choices), null, limits);
  return {
    choices,
    limits,
    view: {
      at,
      with: other ? other.id : "",
      withFault: laidOver && !panel ? "There is no such stack, or it belongs to a program that is not yours." : null,
    },
    overlay: panel && { ...panel.room, name: other.name },
    others: others.filter(({ id }) => id !== own),
  };
}

function panelOfText(text: StackText, { view, choices, limits }: StackAround): StackPanel | null {
  return stackPanel(stackDraft(text, choices), viewTemperature(view.at).temperature, limits);
}

/** What a form that was not saved goes back with besides its text: the panel of what was typed, under the view that it asked for. */
export async function typedStack(scope: ActorScope, formData: FormData, payload: unknown, own: string | null) {
  const search = new URLSearchParams();
  for (const name of ["at", "with"]) {
    const value = formData.get(name);
    if (typeof value === "string" && value !== "") search.set(name, value);
  }
  const around = await surroundings(scope, search, own);
  return { view: around.view, overlay: around.overlay, panel: panelOfText(stackText(payload), around) };
}

/** What somebody else has saved meanwhile, as the form would show it now. */
export async function stackConflict(scope: ActorScope, id: string): Promise<StackConflict> {
  const stack = await getStack(scope, id);
  const { version, updatedBy, updatedAt } = stack.stamp;
  return { by: updatedBy, at: updatedAt, version, theirs: textOfStack(stack) };
}

/** Everything that the page of a stored stack shows. */
export async function stackPage(scope: ActorScope, id: string | undefined, search: URLSearchParams) {
  const stack = await getStack(scope, id);
  const around = await surroundings(scope, search, stack.id);
  const text = textOfStack(stack);
  return { stack, text, ...around, person: scope.actor.id, panel: panelOfText(text, around) };
}

/** Everything that the page of a new stack shows: blank, or a copy of the stack that the address names as `from`. */
export async function newStackPage(scope: ActorScope, search: URLSearchParams) {
  const programs = programsForNewStack(scope);
  const from = search.get("from");
  const copied = from === null ? null : await getStack(scope, from);
  const around = await surroundings(scope, search, null);
  const text = copied
    ? { ...textOfStack(copied), name: `Copy of ${copied.name}`.slice(0, 120) }
    : newStackText(programs.length === 1 ? (programs[0]?.id ?? "") : "");
  return { programs, text, ...around, person: scope.actor.id, panel: panelOfText(text, around) };
}
