import { Carrier } from "#app/db/entities/carrier.ts";
import type { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import type { EntityManager } from "@mikro-orm/postgresql";
import { calibratePair, type CalibratedValue, type Calibration } from "#app/engine/calibration/calibrate-pair.ts";
import { calibrationWorkings } from "#app/engine/calibration/working.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import type { Measured } from "#app/engine/measured.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { toleranceOf } from "#app/lib/calibration-result.ts";
import { FITS } from "#app/lib/calibration-view.ts";
import { shownWorking, type ShownWorking } from "#app/lib/shown-working.ts";
import type { CalibrationValues } from "#app/schemas/calibration.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram, requireOnSite } from "../permission.server.ts";
import { conflictOf, saving, touch, type Saved } from "../record.server.ts";
import { findMaterial, readPairFlow, type PairFlow } from "./calibration.server.ts";
import { LIBRARY } from "./kinds.server.ts";

/** Versions of all that a calibration rests on, so that what is used is what was seen. */
export interface Versions {
  material: number;
  carrier: number;
  flow: number;
}

export type Calibrated =
  | { outcome: "fault"; formErrors?: string[]; fieldErrors?: Record<string, string[]> }
  | { outcome: "computed"; calibration: Calibration; workings: ShownWorking[]; flow: PairFlow; versions: Versions };

interface Loaded {
  material: BondingMaterial;
  carrier: Carrier;
  flow: PairFlow;
  versions: Versions;
}

async function load(em: EntityManager, scope: ActorScope, materialId: string | undefined, flowId: string) {
  const material = await findMaterial(em, materialId);
  const flow = await readPairFlow(em, scope, { materialId: material.id, flowId });
  requireInProgram(scope, "run assessments", flow.programId, "flow");
  const carrier = await em.findOne(Carrier, { id: flow.bond.carrier.id }, { populate: ["updatedBy"] });
  if (!carrier) throw notFound("carrier");
  const versions = { material: material.version, carrier: carrier.version, flow: flow.version };
  return { material, carrier, flow, versions } satisfies Loaded;
}

function compute({ flow, versions }: Loaded, { fit, bows }: CalibrationValues): Calibrated {
  if (flow.fault !== null) return { outcome: "fault", formErrors: [flow.fault] };
  const known = new Set(flow.states.map(({ number }) => number));
  const unknown = bows.filter(({ step }) => !known.has(step));
  if (unknown.length > 0) {
    const says = ["The pair has no bow of its own after this step. Choose one of the list."];
    return { outcome: "fault", fieldErrors: Object.fromEntries(unknown.map(({ row }) => [`rows[${row}].step`, says])) };
  }
  const { quantities } = FITS[fit];
  if (flow.bond.carrier.expansion === null && fit !== "modulus")
    return {
      outcome: "fault",
      fieldErrors: { fit: ["The carrier expands as silicon does: fit the locked-in modulus alone."] },
    };
  const measurements = bows.map(({ step, bow, standardUncertainty }) => ({
    flow: flow.input,
    step,
    // The engine's sagitta is the opposite of the standard bow, both ways.
    sagitta: standardBow(bow),
    standardUncertainty,
  }));
  try {
    return {
      outcome: "computed",
      calibration: calibratePair(measurements, quantities),
      workings: calibrationWorkings(measurements, quantities).map(shownWorking),
      flow,
      versions,
    };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { outcome: "fault", formErrors: [`These bows cannot be fitted: ${error.reason}.`] };
  }
}

/**
 * Fits what the form asks for to measured bows of pairs. Nothing is stored.
 * @throws 403 for somebody who may not run assessments in the flow's program, 404 for what is not theirs
 */
export async function calibrate(
  scope: ActorScope,
  materialId: string | undefined,
  values: CalibrationValues,
): Promise<Calibrated> {
  requireOnSite(scope, "see the library");
  const loaded = await inScope(scope, (em) => load(em, scope, materialId, values.flow));
  return compute(loaded, values);
}

/** The flow itself is not named: the library is the whole site's, the flow one program's. */
const noteOf = (bows: number, beside: string | null) =>
  `calibrated on ${bows} measured ${bows === 1 ? "bow" : "bows"} of pairs${beside ? `, together with ${beside}` : ""}`;

function fittedAs({ value, standardUncertainty }: CalibratedValue, note: string): Measured {
  const on = new Date().toISOString().slice(0, 10);
  return { value, tolerance: toleranceOf(standardUncertainty), source: "measured here", note, on };
}

export type Used = Saved | { outcome: "changed" } | Exclude<Calibrated, { outcome: "computed" }>;

/**
 * Fits once more and puts the fitted values into material and carrier. What anything of it rests on must be as it was when the
 * result was seen; otherwise nothing is written.
 * @throws 403 for a role that may not edit carriers and bonds
 */
export async function takeCalibration(
  scope: ActorScope,
  materialId: string | undefined,
  { values, seen }: { values: CalibrationValues; seen: Versions },
): Promise<Used> {
  requireOnSite(scope, LIBRARY.bondingMaterial.edit);
  return saving<Exclude<Used, Saved>>(() =>
    inScope(scope, async (em) => {
      const loaded = await load(em, scope, materialId, values.flow);
      const { material, carrier, versions } = loaded;
      const conflict = conflictOf(material, seen.material) ?? conflictOf(carrier, seen.carrier);
      if (conflict) return { outcome: "conflict", conflict };
      if (versions.flow !== seen.flow) return { outcome: "changed" };
      const computed = compute(loaded, values);
      if (computed.outcome === "fault") return computed;
      const { calibration } = computed;
      if (calibration.kind === "refused") return { outcome: "fault", formErrors: [calibration.reason] };
      const together = calibration.values.length > 1;
      const note = (beside: string) => noteOf(values.bows.length, together ? beside : null);
      for (const fitted of calibration.values) {
        if (fitted.quantity === "lockedInModulus") {
          em.assign(material, { effectiveModulus: fittedAs(fitted, note(`the expansion of ${carrier.name}`)) });
          touch(material, scope);
        } else {
          em.assign(carrier, { expansion: fittedAs(fitted, note(`the locked-in modulus of ${material.name}`)) });
          touch(carrier, scope);
        }
      }
      await em.flush();
      return { outcome: "saved", id: material.id };
    }),
  );
}
