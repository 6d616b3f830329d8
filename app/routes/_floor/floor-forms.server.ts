import { data, redirect } from "react-router";
import { holdForm, stopForm } from "#app/schemas/block-form.ts";
import { floorEntryForm } from "#app/schemas/floor-entry.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { enter } from "#app/services/floor/entries.server.ts";
import { holdLot, stopStep } from "#app/services/floor/hold-and-stop.server.ts";
import { postedPhotos } from "#app/services/incidents/report-form.server.ts";
import { reportFromFloor } from "#app/services/incidents/report-from-floor.server.ts";

/** A form of the floor as it came, with the photos of an incident. */
type Posted = Awaited<ReturnType<typeof postedPhotos>>;

async function posted(request: Request): Promise<Posted> {
  if (request.headers.get("Content-Type")?.startsWith("multipart/form-data")) return postedPhotos(request);
  return { formData: await postedForm(request), files: [], faults: [] };
}

/**
 * Takes a form of the floor: an entry, a hold, a stop or an incident. What is not taken says why: in a sentence, or in its fields.
 * @throws 400 for what is no form
 */
export async function takeFloorForm(scope: ActorScope, lotId: string, request: Request) {
  return takePosted(scope, lotId, await posted(request));
}

async function takePosted(scope: ActorScope, lotId: string, { formData: form, files, faults }: Posted) {
  const intent = form.get("intent");
  if (intent === "incident") {
    const reported = await reportFromFloor(scope, lotId, form, { files, faults });
    if (reported.outcome === "stored") return { outcome: "stored" as const };
    return { outcome: "refused" as const, sentence: null, lastResult: reported.lastResult };
  }
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
  const sent = await posted(request);
  const taken = await takePosted(scope, lotId, sent);
  if (taken.outcome === "stored") throw redirect(back(sent.formData));
  const { sentence, lastResult } = taken;
  return data({ sentence, lastResult }, { status: sentence === null ? 400 : 409 });
}
