import { data, redirect } from "react-router";
import type { SubmissionResult } from "@conform-to/react";
import { UNIT_CHANGES, type UnitAnswer, type UnitChange } from "#app/lib/carrier-units.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { carrierUnitSchema } from "#app/schemas/carrier-unit.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { postedForm, versionOf } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { addCarrierUnit, changeCarrierUnit, measureCarrierUnit } from "./carrier-units.server.ts";
import { LIBRARY } from "./kinds.server.ts";

/**
 * Does what a form about the pieces of a carrier asks for: adds one, or changes one (`change` and `piece`). Done, it leads back
 * to the address that it came from.
 * @throws 403 for a role that may not, 404 for an id that names nothing, 400 for what no form of ours sends
 */
export async function saveCarrierUnitForm(
  request: Request,
  scope: ActorScope,
  { carrierId, back }: { carrierId: string; back: string },
) {
  requireOnSite(scope, LIBRARY.carrier.edit);
  const formData = await postedForm(request);
  const change = formData.get("change");
  if (change !== null) return changeUnit(scope, carrierId, back, formData, change);
  const submission = parseForm(formData, carrierUnitSchema);
  const answer = (result: SubmissionResult<string[]>): UnitAnswer => ({ lastResult: result, refused: null });
  if (submission.status !== "success") return data(answer(submission.reply()), { status: 400 });
  const saved = await addCarrierUnit(scope, carrierId, submission.value);
  if (saved.outcome === "saved") throw redirect(back);
  const taken = { fieldErrors: { mark: ["There is already a piece of this carrier with that mark."] } };
  return data(answer(submission.reply(taken)), { status: 409 });
}

async function changeUnit(
  scope: ActorScope,
  carrierId: string,
  back: string,
  formData: FormData,
  asked: FormDataEntryValue,
) {
  if (asked === "measure") return measureUnit(scope, carrierId, back, formData);
  if (typeof asked !== "string" || !Object.hasOwn(UNIT_CHANGES, asked))
    throw problem(400, "That is nothing that can be done to a piece of a carrier.");
  const change = asked as UnitChange;
  const id = pieceOf(formData);
  const saved = await changeCarrierUnit(scope, carrierId, { id, version: versionOf(formData), change });
  if (saved.outcome === "saved") throw redirect(back);
  return data({ lastResult: null, refused: refusal(saved) } satisfies UnitAnswer, { status: 409 });
}

const pieceOf = (formData: FormData) => {
  const piece = formData.get("piece");
  return idFrom(typeof piece === "string" ? piece : undefined, "piece");
};

/** Blank takes a measured variation away. */
async function measureUnit(scope: ActorScope, carrierId: string, back: string, formData: FormData) {
  const id = pieceOf(formData);
  const typed = formData.get("variation");
  const read = readQuantity(typeof typed === "string" ? typed : "", RULES.thicknessVariation);
  if (!read.ok && !read.blank)
    return data({ lastResult: null, refused: `Not saved: ${read.message}` } satisfies UnitAnswer, { status: 400 });
  const variation = read.ok ? read.value : null;
  const saved = await measureCarrierUnit(scope, carrierId, { id, version: versionOf(formData), variation });
  if (saved.outcome === "saved") throw redirect(back);
  return data({ lastResult: null, refused: refusal(saved) } satisfies UnitAnswer, { status: 409 });
}

function refusal(saved: Exclude<Awaited<ReturnType<typeof changeCarrierUnit>>, { outcome: "saved" }>): string {
  switch (saved.outcome) {
    case "conflict":
      return `${saved.conflict.by} changed this piece at ${saved.conflict.at.slice(0, 16).replace("T", " ")} UTC, after you had opened the page. It stands below as it is now.`;
    case "not possible":
      return `${saved.mark} has another state by now: that cannot be done to it.`;
    case "name taken":
      return "Somebody changed the pieces of this carrier at the same moment. Please try again.";
  }
}
