import { data, redirect } from "react-router";
import type { HistoryAnswer } from "#app/lib/history-answer.ts";
import { setAsideSchema, typedStressSchema } from "#app/schemas/stress-value-form.ts";
import { postedForm, versionOf } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import {
  addTypedValue,
  putValueBack,
  setValueAside,
  putMeanIntoUse,
  type HistoryChanged,
} from "./change-values.server.ts";

const answer = (part: Partial<HistoryAnswer>, status: 400 | 409) =>
  data<HistoryAnswer>({ lastResult: null, refused: null, value: null, ...part }, { status });

/**
 * Does what a form of a film's history asks for (`intent`) and leads back to `back`.
 * @throws 403 for a role that may not, 404 for an id that names nothing, 400 for what no form of ours sends
 */
export async function historyForm(
  request: Request,
  scope: ActorScope,
  { filmId, back }: { filmId: string | undefined; back: string },
) {
  requireOnSite(scope, "edit films");
  const formData = await postedForm(request);
  const asked = { filmId, version: versionOf(formData) ?? 0 };
  const text = formData.get("row");
  const id = typeof text === "string" ? text : undefined;
  switch (formData.get("intent")) {
    case "set aside": {
      const submission = parseForm(formData, setAsideSchema);
      if (submission.status !== "success")
        return answer({ value: id ?? null, refused: submission.error?.["reason"]?.[0] ?? "Say why." }, 400);
      return told(await setValueAside(scope, asked, { id, reason: submission.value.reason }), back, id);
    }
    case "put back":
      return told(await putValueBack(scope, asked, { id }), back, id);
    case "use mean":
      return told(await putMeanIntoUse(scope, asked), back, undefined);
    case "add": {
      const submission = parseForm(formData, typedStressSchema);
      if (submission.status !== "success") return answer({ lastResult: submission.reply() }, 400);
      const added = await addTypedValue(scope, asked, submission.value);
      if (added.outcome === "saved") throw redirect(back);
      return answer({ lastResult: submission.reply({ formErrors: [refusedWords(added)] }) }, 409);
    }
    default:
      throw problem(400, "That is nothing that can be done to a film’s history.");
  }
}

function told(changed: HistoryChanged, back: string, id: string | undefined) {
  if (changed.outcome === "saved") throw redirect(back);
  return answer({ refused: refusedWords(changed), value: id ?? null }, 409);
}

function refusedWords(changed: Exclude<HistoryChanged, { outcome: "saved" }>): string {
  switch (changed.outcome) {
    case "refused":
      return changed.reason;
    case "conflict":
      return `${changed.conflict.by} saved this film at ${changed.conflict.at.slice(0, 16).replace("T", " ")} UTC, after you had opened the page. It stands below as it is now: look at it and try again.`;
    case "name taken":
      return "Somebody changed this film’s history at the same moment. Please try again.";
  }
}
