import type { ReferenceSummary } from "#app/lib/reference-summary.ts";
import type { Plot, PlotSeries } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

export interface ReferencePlotInput {
  /** oldest first: ISO date, and why it does not count */
  readings: readonly { measuredOn: string; setAside: string | null }[];
  summary: Pick<ReferenceSummary, "errors" | "within" | "limits">;
  formatError: (metres: number) => string;
}

const MICROMETRE = 1e-6;
/** The least that the axis shows on either side, m. */
const LEAST = 0.05e-6;
const MOST_TICKS = 12;

/** Readings of a wafer of known bow, in their order: read less known, with the interval that agrees and the control limits. */
export function referencePlot({ readings, summary, formatError }: ReferencePlotInput): Plot {
  const { errors, within, limits } = summary;
  const [first, last] = [0.5, readings.length + 0.5];
  const values = errors.map(({ error }) => error);
  const largest = Math.max(
    LEAST,
    within ?? 0,
    ...values.map(Math.abs),
    ...(limits ? [Math.abs(limits.upper), Math.abs(limits.lower)] : []),
  );
  const reach = 1.08 * largest;
  const every = Math.ceil(readings.length / MOST_TICKS);
  const points = errors.map(({ error }, n) => ({ x: n + 1, y: error }));
  const counted = points.filter((_, n) => readings[n]?.setAside === null);
  const aside = points.filter((_, n) => readings[n]?.setAside !== null);
  const level = (id: string, label: string, y: number): PlotSeries => ({
    id,
    label,
    dash: "reference",
    marker: "none",
    colourToken: "ink",
    points: [
      { x: first, y },
      { x: last, y },
    ],
  });
  return {
    x: {
      scale: "linear",
      from: first,
      to: last,
      ticks: readings.flatMap((_, n) => (n % every === 0 ? [{ value: n + 1, text: String(n + 1) }] : [])),
      stops: readings.map((_, n) => n + 1),
      title: "Reading, oldest first",
      format: (place) => {
        const n = Math.min(readings.length, Math.max(1, Math.round(place)));
        return `${n}, ${readings[n - 1]?.measuredOn ?? ""}`;
      },
    },
    y: {
      scale: "linear",
      from: -reach,
      to: reach,
      ticks: multiples(niceStep(reach / 3), -reach, reach).map((value) => ({
        value,
        text: `${signedTick(value / MICROMETRE)}\u00A0µm`,
      })),
      format: formatError,
    },
    series: [
      {
        id: "read",
        label: "read less known",
        dash: "solid",
        marker: "circle",
        colourToken: "silicon",
        points: counted,
        markersAt: counted.map(({ x }) => x),
      },
      ...(aside.length > 0
        ? [
            {
              id: "aside",
              label: "set aside",
              dash: "none" as const,
              marker: "square" as const,
              colourToken: "quiet" as const,
              points: aside,
              markersAt: aside.map(({ x }) => x),
              labelled: "none" as const,
            },
          ]
        : []),
      ...(limits
        ? [
            level("upper", "upper limit", limits.upper),
            level("centre", "centre", limits.centre),
            level("lower", "lower limit", limits.lower),
          ]
        : []),
    ],
    bands:
      within === null
        ? []
        : [{ colourToken: "clear", runs: [[first, last].map((x) => ({ x, low: -within, high: within }))] }],
  };
}
