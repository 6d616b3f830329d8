import { data, redirect } from "react-router";
import { stackSchema } from "#app/schemas/stack.ts";
import { readForm, refusal, versionOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { stackConflict, typedStack } from "#app/services/stack-page.server.ts";
import { removeStack, saveStack } from "#app/services/stacks.server.ts";

/**
 * Saves or removes a posted stack, or answers the form with everything that was typed, what is wrong with it and the panel of it. A list
 * button pressed without scripts and 'work it out' change nothing and are no errors.
 * @param id of the stack, null for a new one
 */
export async function postedStack(scope: ActorScope, request: Request, id: string | null) {
  const { formData, submission } = await readForm(request, stackSchema);
  if (id !== null && formData.get("intent") === "remove") {
    await removeStack(scope, id);
    throw redirect("/stacks");
  }
  const typed = () => typedStack(scope, formData, submission.payload, id);
  if (submission.status === undefined || formData.get("intent") === "estimate")
    return {
      again: data({
        lastResult: { ...submission.reply(), error: undefined },
        version: null,
        conflict: null,
        ...(await typed()),
      }),
    };
  if (submission.status !== "success")
    return {
      again: data({ ...refusal(submission, null, "stack"), conflict: null, ...(await typed()) }, { status: 400 }),
    };
  const saved = await saveStack(scope, { id, version: versionOf(formData), values: submission.value });
  if (saved.outcome === "saved") return { savedAs: saved.id };
  const conflict = saved.outcome === "conflict" && id !== null ? await stackConflict(scope, id) : null;
  const answer = refusal(submission, saved, "stack");
  return {
    again: data(
      { ...answer, version: conflict?.version ?? answer.version, conflict, ...(await typed()) },
      { status: 409 },
    ),
  };
}
