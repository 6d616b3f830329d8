import { predictedAgainstMeasured, type Parity } from "#app/engine/profile/lot-figures/predicted-against-measured.ts";
import type { Predicted, PredictionGroup, PredictionPoint } from "#app/schemas/prediction.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "./list-params.ts";
import { csvOf, type CsvMark } from "./csv.ts";

/** Names of the columns that the points sort by; the first is the default. */
export const PREDICTION_SORTS = ["measured", "off", "group", "name", "predicted", "value", "program"] as const;

/** How far a point is off, in standard uncertainties of the difference. */
export const offBy = ({ predicted, predictedUncertainty, measured, measuredUncertainty }: PredictionPoint): number =>
  (measured - predicted) / Math.hypot(predictedUncertainty, measuredUncertainty);

const keyOf = (point: PredictionPoint, sort: string): string | number => {
  switch (sort) {
    case "off":
      return Math.abs(offBy(point));
    case "group":
      return point.group.toLowerCase();
    case "name":
      return point.name.toLowerCase();
    case "predicted":
      return point.predicted;
    case "value":
      return point.measured;
    case "program":
      return point.program;
    default:
      return point.measuredAt;
  }
};

/** The points that a search leaves, in the order that is asked for. */
export function chosenPoints(points: readonly PredictionPoint[], params: ListParams): PredictionPoint[] {
  const query = params.query.toLowerCase();
  const direction = params.descending ? -1 : 1;
  return points
    .filter(({ name, group, instrument }) => [name, group, instrument].join("\n").toLowerCase().includes(query))
    .toSorted((a, b) => {
      const [left, right] = [keyOf(a, params.sort), keyOf(b, params.sort)];
      return (left < right ? -direction : left > right ? direction : 0) || a.id.localeCompare(b.id);
    });
}

export function pageOfPoints(points: readonly PredictionPoint[], params: ListParams): ListPage<PredictionPoint> {
  const from = (params.page - 1) * PAGE_SIZE;
  return { rows: points.slice(from, from + PAGE_SIZE), total: points.length, params };
}

/** What the model is off by, over all points, for each step or film, and for each flow; those that it is off at first. */
export function compared(
  points: readonly PredictionPoint[],
): { all: PredictionGroup; groups: PredictionGroup[]; flows: PredictionGroup[] } | null {
  if (points.length === 0) return null;
  const by = (of: (point: PredictionPoint) => string, some = points) =>
    predictedAgainstMeasured(some.map((point) => ({ ...point, step: of(point) })));
  const { all, steps } = by(({ group }) => group);
  const ofFlows = points.filter(({ flow }) => flow !== undefined);
  return {
    all: withOff(all),
    groups: offFirst(steps),
    flows: ofFlows.length > 0 ? offFirst(by(({ flow = "" }) => flow, ofFlows).steps) : [],
  };
}

const offFirst = (groups: Parity[]): PredictionGroup[] =>
  groups
    .map(withOff)
    .toSorted((a, b) => Number(b.isOff) - Number(a.isOff) || b.agreement - a.agreement || a.step.localeCompare(b.step));

const withOff = (parity: Parity): PredictionGroup => ({ ...parity, isOff: parity.off.length > 0 });

const UNITS: Record<Predicted, { unit: string; perSi: number }> = {
  bow: { unit: "um", perSi: 1e6 },
  stress: { unit: "MPa", perSi: 1e-6 },
};

/** Points as CSV with a point as decimal mark; uncertainties are standard ones. */
export function predictionsCsv(of: Predicted, points: readonly PredictionPoint[], mark?: CsvMark): string {
  const { unit, perSi } = UNITS[of];
  const head = [
    of === "bow" ? "step" : "film",
    of === "bow" ? "lot_wafer" : "wafer",
    "program",
    "measured_on",
    "instrument",
    `predicted_${unit}`,
    `predicted_standard_uncertainty_${unit}`,
    `measured_${unit}`,
    `measured_standard_uncertainty_${unit}`,
    "measured_uncertainty_stated",
  ];
  const scaled = (value: number) => Number((value * perSi).toPrecision(12));
  const rows = points.map((point) => [
    point.group,
    point.name,
    point.program,
    point.measuredAt.slice(0, 10),
    point.instrument,
    scaled(point.predicted),
    scaled(point.predictedUncertainty),
    scaled(point.measured),
    scaled(point.measuredUncertainty),
    point.stated ? "yes" : "no",
  ]);
  return csvOf([head, ...rows], mark);
}
