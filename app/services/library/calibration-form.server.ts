import type { Submission } from "@conform-to/react";
import { data, redirect } from "react-router";
import { calibrationResult } from "#app/lib/calibration-result.ts";
import type { CalibrationAnswer } from "#app/lib/calibration-view.ts";
import { kindPath } from "#app/lib/library-kinds.ts";
import { calibrationSchema, type CalibrationValues } from "#app/schemas/calibration.ts";
import { readForm, statusOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { calibrate, takeCalibration, type Calibrated, type Versions } from "./calibrate.server.ts";

const FITTED_FIELD = /^(?:flow|fit|rows\[\d{1,2}\]\.(?:step|bow|uncertainty))$/;

const answer = (
  lastResult: CalibrationAnswer["lastResult"],
  result: CalibrationAnswer["result"] = null,
): CalibrationAnswer => ({ lastResult, result });

/**
 * Does what the form of a calibration asks for: fits, or (`intent` 'use') puts the fitted values into the library and leads to
 * the material. Everything typed goes back with the result or with what is wrong.
 * @throws 403 for a role that may not, 404 for what is not the person's own
 */
export async function calibrationForm(request: Request, scope: ActorScope, materialId: string | undefined) {
  const { formData, submission } = await readForm(request, calibrationSchema);
  if (submission.status !== "success") return data(answer(submission.reply()), { status: statusOf(submission) });
  const { value } = submission;
  if (formData.get("intent") === "use") return take(formData, submission, scope, materialId);
  const computed = await calibrate(scope, materialId, value);
  return computed.outcome === "fault"
    ? data(answer(submission.reply(computed)), { status: 400 })
    : data(answer(submission.reply(), shown(computed, value, formData)));
}

function shown(
  { calibration, workings, flow, versions }: Extract<Calibrated, { outcome: "computed" }>,
  { bows }: CalibrationValues,
  formData: FormData,
) {
  const fitted = [...formData].flatMap(([name, value]): [string, string][] =>
    FITTED_FIELD.test(name) && typeof value === "string" ? [[name, value]] : [],
  );
  const seen = Object.entries(versions).map(([name, version]): [string, string] => [`seen.${name}`, String(version)]);
  return calibrationResult(calibration, {
    flow: flow.input,
    bond: flow.bond,
    bows,
    workings,
    sent: [...fitted, ...seen],
  });
}

/** A version that was not sent is none that there is. */
const seenVersion = (formData: FormData, name: keyof Versions) => {
  const text = formData.get(`seen.${name}`);
  return typeof text === "string" && /^\d{1,9}$/.test(text) ? Number(text) : 0;
};

async function take(
  formData: FormData,
  submission: Extract<Submission<CalibrationValues>, { status: "success" }>,
  scope: ActorScope,
  materialId: string | undefined,
) {
  const seen = {
    material: seenVersion(formData, "material"),
    carrier: seenVersion(formData, "carrier"),
    flow: seenVersion(formData, "flow"),
  };
  const used = await takeCalibration(scope, materialId, { values: submission.value, seen });
  if (used.outcome === "saved") throw redirect(`${kindPath("bonding-materials")}/${used.id}`);
  if (used.outcome === "fault") return data(answer(submission.reply(used)), { status: 400 });
  const changed = "The flow, the material or the carrier was changed since: calibrate again and look at the result.";
  return data(answer(submission.reply({ formErrors: [changed] })), { status: 409 });
}
