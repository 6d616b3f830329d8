import { data, redirect } from "react-router";
import { holdForm, stopForm } from "#app/schemas/block-form.ts";
import { floorEntryForm } from "#app/schemas/floor-entry.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { enter } from "#app/services/floor/entries.server.ts";
import { holdLot, stopStep } from "#app/services/floor/hold-and-stop.server.ts";

/** Takes a form of the floor: an entry, a hold or a stop. What is not taken says why: in a sentence, or in its fields. */
export async function takeFloorForm(scope: ActorScope, lotId: string, form: FormData) {
  const intent = form.get("intent");
  if (intent === "stop" || intent === "hold") {
    const sent = intent === "stop" ? parseForm(form, stopForm) : parseForm(form, holdForm);
    if (sent.status !== "success") return { outcome: "refused" as const, sentence: null, lastResult: sent.reply() };
    if (sent.value.intent === "stop") await stopStep(scope, lotId, sent.value);
    else await holdLot(scope, lotId, sent.value);
    return { outcome: "stored" as const };
  }
  const sent = parseForm(form, floorEntryForm);
  if (sent.status !== "success") return { outcome: "refused" as const, sentence: null, lastResult: sent.reply() };
  const entered = await enter(scope, lotId, sent.value);
  if (entered.outcome === "stored") return entered;
  return { outcome: "refused" as const, sentence: entered.sentence, lastResult: sent.reply() };
}

/** The same for a form of a page. One that was taken leads to `back`. */
export async function floorForm(scope: ActorScope, lotId: string, request: Request, back: (form: FormData) => string) {
  const form = await postedForm(request);
  const taken = await takeFloorForm(scope, lotId, form);
  if (taken.outcome === "stored") throw redirect(back(form));
  const { sentence, lastResult } = taken;
  return data({ sentence, lastResult }, { status: sentence === null ? 400 : 409 });
}
