import { data, redirect } from "react-router";
import { holdForm, stopForm } from "#app/schemas/block-form.ts";
import { floorEntryForm } from "#app/schemas/floor-entry.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { enter } from "#app/services/floor/entries.server.ts";
import { holdLot, stopStep } from "#app/services/floor/hold-and-stop.server.ts";

/**
 * Takes a form of the floor: an entry, a hold or a stop. One that was taken leads to `back`; the answer to another says what is wrong, in
 * its fields or, where it was refused, in a sentence.
 */
export async function floorForm(scope: ActorScope, lotId: string, request: Request, back: (form: FormData) => string) {
  const form = await postedForm(request);
  const intent = form.get("intent");
  if (intent === "stop" || intent === "hold") {
    const sent = intent === "stop" ? parseForm(form, stopForm) : parseForm(form, holdForm);
    if (sent.status !== "success") return data({ sentence: null, lastResult: sent.reply() }, { status: 400 });
    if (sent.value.intent === "stop") await stopStep(scope, lotId, sent.value);
    else await holdLot(scope, lotId, sent.value);
    throw redirect(back(form));
  }
  const sent = parseForm(form, floorEntryForm);
  if (sent.status !== "success") return data({ sentence: null, lastResult: sent.reply() }, { status: 400 });
  const entered = await enter(scope, lotId, sent.value);
  if (entered.outcome === "refused")
    return data({ sentence: entered.sentence, lastResult: sent.reply() }, { status: 409 });
  throw redirect(back(form));
}
