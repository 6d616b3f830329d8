import { readChangeForm, type ChangeFormView } from "#app/lib/change-request-form.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { ChangeReach } from "#app/schemas/change-request.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { changeReach, changeSubjects } from "./change-request.server.ts";

export interface ChangeRequestPage {
  form: ChangeFormView;
  /** null while the question is not whole */
  reach: ChangeReach | null;
  programs: { value: string; label: string }[];
}

/** A question of what a change would do, as an address has it, with its answer. */
export async function changeRequestPage(scope: ActorScope, search: URLSearchParams): Promise<ChangeRequestPage> {
  const { view: form, change } = readChangeForm(search, await changeSubjects(scope));
  const programs = programsWhere(scope.actor, "see the work").map(({ programName, programSlug }) => ({
    value: programSlug,
    label: programName,
  }));
  // A program that is not theirs narrows nothing: it looks as if nobody had named one.
  const program = programs.find(({ value }) => value === form.fields.program)?.value;
  const reach = change ? await changeReach(scope, change, program) : null;
  return { form, reach, programs };
}
