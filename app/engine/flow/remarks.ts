import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { formatQuantity } from "../units/format.ts";
import { lockTemperature, type BondState } from "./bond.ts";
import { knownBetween } from "./carrier-expansion.ts";
import { bendsUnequally } from "./layers.ts";
import type { FlowInput, StepInput } from "./model.ts";
import { allFilms, type WaferState } from "./state.ts";

/** Ranges start at 20, 25 or 30 °C without meaning a difference, K (common practice, no source). */
const RANGE_SLACK = 5;

const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });

/** What a step's figures rest on that nobody stated, a sentence each. */
export function stepRemarks(flow: FlowInput, number: number, step: StepInput, after: WaferState): string[] {
  if (step.skipped) return incomingTakenAsFilm(flow, number);
  return [
    // Two bonds of one material, or on carriers of one kind, have one remark.
    ...new Set(after.bonds.flatMap((bond) => unstatedFlowPoint(step, bond))),
    ...new Set(after.bonds.flatMap((bond) => beyondKnownExpansion(step, bond))),
    ...incomingTakenAsFilm(flow, number),
    ...flowsByMean(step, after),
  ];
}

function beyondKnownExpansion({ peakTemperature }: StepInput, bond: BondState): string[] {
  const known = knownBetween(bond.carrier);
  if (!known) return [];
  const outside = [lockTemperature(bond), peakTemperature, ROOM_TEMPERATURE].filter(
    (temperature) => temperature < known.from - RANGE_SLACK || temperature > known.to + RANGE_SLACK,
  );
  if (outside.length === 0) return [];
  const where = [...new Set(outside)].map(celsius).join(", ");
  return [
    `The expansion of ${bond.carrier.name} is stated for ${celsius(known.from)} to ${celsius(known.to)} and used at ${where}.`,
  ];
}

function unstatedFlowPoint({ peakTemperature }: StepInput, { material }: BondState): string[] {
  if (!material.flows || material.flowPoint) return [];
  const { name, softening } = material;
  if (softening === null || peakTemperature < softening.value) return [];
  return [
    `${name} is a thermoplastic without a flow point: above ${celsius(softening.value)} its plates are taken not to slide, and the pair keeps its state of rest.`,
  ];
}

function incomingTakenAsFilm({ wafer: { incoming } }: FlowInput, number: number): string[] {
  if (number !== 1 || !incoming || incoming.filmShare !== null) return [];
  return [
    "Nobody said which part of the incoming shape films cause: all of it is taken as film, which grows with the inverse square of the thickness as the wafer is thinned.",
  ];
}

/** Yielding by the mean of both directions; its error is measured at `unequalCurvature`. */
function flowsByMean({ peakTemperature }: StepInput, after: WaferState): string[] {
  const yielded = allFilms(after).some(({ plasticStrain }) => plasticStrain !== 0);
  if (!yielded || peakTemperature <= ROOM_TEMPERATURE || !bendsUnequally(after)) return [];
  return [
    "Metal yields here by the mean of both directions: along and across, the curvature can be off by a tenth of the larger one, the mean of both by 2 %.",
  ];
}
