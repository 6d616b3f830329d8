import { data, redirect } from "react-router";
import type { z } from "zod";
import { clearForm, holdForm } from "#app/schemas/block-form.ts";
import { assignForm } from "#app/schemas/lot-sheet-form.ts";
import { waferStatusForm } from "#app/schemas/wafer-status-form.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { assignSheet } from "#app/services/floor/assign-sheet.server.ts";
import { clearBlock, holdLot } from "#app/services/floor/hold-and-stop.server.ts";
import { setWaferStatus } from "#app/services/wafers/wafer-status.server.ts";

type Submitted<Schema extends z.ZodType> = ReturnType<typeof parseForm<Schema>>;

/** The answer to a form of the lot's page that was not taken. */
function refused(
  intent: string,
  { reply }: Pick<Submitted<z.ZodType>, "reply">,
  errors?: Record<string, string[]>,
  block?: string,
) {
  return data({ intent, block, lastResult: reply(errors && { fieldErrors: errors }) }, { status: 400 });
}

/** What the floor's forms on the page of a lot do; null for a form that is none of them. A form that was taken leads back to the page. */
export async function lotForm(scope: ActorScope, lotId: string, form: FormData) {
  const back = () => redirect(`/lots/${lotId}`);
  switch (form.get("intent")) {
    case "assign": {
      const sent = parseForm(form, assignForm);
      if (sent.status !== "success") return refused("assign", sent);
      const assigned = await assignSheet(scope, lotId, sent.value);
      if (assigned.outcome === "refused") return refused("assign", sent, { [assigned.field]: [assigned.sentence] });
      throw back();
    }
    case "hold": {
      const sent = parseForm(form, holdForm);
      if (sent.status !== "success") return refused("hold", sent);
      await holdLot(scope, lotId, sent.value);
      throw back();
    }
    case "clear": {
      const sent = parseForm(form, clearForm);
      if (sent.status !== "success") return refused("clear", sent, undefined, String(form.get("block")));
      await clearBlock(scope, lotId, sent.value);
      throw back();
    }
    case "status": {
      const sent = parseForm(form, waferStatusForm);
      if (sent.status !== "success") return refused("status", sent);
      await setWaferStatus(scope, lotId, sent.value);
      throw back();
    }
    default:
      return null;
  }
}
