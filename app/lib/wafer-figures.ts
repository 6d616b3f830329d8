import { thicknessFigures } from "#app/engine/profile/map/thickness-sites.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { WaferMeasurementContent } from "#app/schemas/wafer.ts";

/** A figure of a wafer with how it was measured, SI. */
export interface WaferFigure {
  value: number;
  /** standard; null where nobody gave one */
  uncertainty: number | null;
  how: string;
  /** the day on which it was measured, or came in where that is not known, ISO */
  on: string;
}

export const WAFER_FIGURES = ["bow", "warp", "thickness", "thickness variation", "stress"] as const;
export type WaferFigureName = (typeof WAFER_FIGURES)[number];
export type WaferFigures = Partial<Record<WaferFigureName, WaferFigure>>;

/** What a table says of a wafer, and on which day (ISO). */
export interface DatedContent {
  content: WaferMeasurementContent;
  on: string;
}

/** A stress that two scans gave. */
export interface DatedStress {
  stress: number;
  stressUncertainty: number;
  on: string;
  how: string;
}

type Summary = Extract<WaferMeasurementContent, { kind: "summary" }>;
type Figure = Summary["figures"][number];

/** The newest of each figure of a wafer; of two of one day the first that is given. */
export function newestFigures(tables: readonly DatedContent[], scans: readonly DatedStress[]): WaferFigures {
  const newest: WaferFigures = {};
  const offer = (name: WaferFigureName, figure: WaferFigure | null) => {
    const known = newest[name];
    if (figure && (!known || figure.on > known.on)) newest[name] = figure;
  };
  for (const { content, on } of tables)
    for (const [name, figure] of figuresOf(content)) offer(name, { ...figure, uncertainty: null, on });
  for (const { stress, stressUncertainty, on, how } of scans)
    offer("stress", { value: stress, uncertainty: stressUncertainty, on, how });
  return newest;
}

type Told = [name: WaferFigureName, figure: Pick<WaferFigure, "value" | "how">];

function figuresOf(content: WaferMeasurementContent): Told[] {
  switch (content.kind) {
    case "summary":
      return (["bow", "warp", "thickness", "thickness variation"] as const).flatMap((name): Told[] => {
        const figure = bestOf(content.figures.filter(({ quantity }) => quantity === name));
        return figure ? [[name, { value: figure.value, how: howSummed(figure, content.measured) }]] : [];
      });
    case "thickness map": {
      const { sites, underneath } = content;
      const [x, y, z] = [sites.map((site) => site.x), sites.map((site) => site.y), sites.map((site) => site.thickness)];
      const figures = sites.length < 2 ? null : thicknessFigures({ x, y, z });
      if (!figures) return [];
      const over = `over ${sites.length} sites, ${underneathWords(underneath)}`;
      return [
        ["thickness", { value: figures.mean, how: `mean ${over}` }],
        ["thickness variation", { value: figures.ttv, how: over }],
      ];
    }
    case "reduced stress": {
      const stress = content.stresses.find((row) => row.stress !== null)?.stress;
      return stress === undefined || stress === null
        ? []
        : [["stress", { value: stress, how: "as its tool reduced it" }]];
    }
  }
}

/** Statistics that stand for the wafer as a whole, the best first; a spread or an extreme does not. */
const WHOLE: readonly Figure["statistic"][] = ["centre", "mean", null];

function bestOf(figures: readonly Figure[]): (Figure & { value: number }) | null {
  const given = figures.filter((figure): figure is Figure & { value: number } => figure.value !== null);
  for (const statistic of WHOLE) {
    const found = given.find((figure) => figure.statistic === statistic);
    if (found) return found;
  }
  return null;
}

const SUPPORTS = {
  "three points": "on three points",
  ring: "on a ring",
  table: "on a table",
  centre: "held at the centre",
} as const;

/** How a summary was measured, in words. */
export function measuredWords(measured: Summary["measured"]): string {
  if (!measured) return "not said how";
  const { sideUp, support, gravity } = measured;
  return `${sideUp} side up, ${SUPPORTS[support]}, gravity ${gravity}`;
}

function howSummed({ quantity, statistic, reference, edgeExclusion }: Figure, measured: Summary["measured"]): string {
  const shape = quantity !== "thickness" && quantity !== "thickness variation";
  return [
    ...(shape ? [measuredWords(measured)] : []),
    ...(statistic ? [statistic === "centre" ? "at the centre" : statistic] : []),
    ...(reference ? [`from the ${reference} plane`] : []),
    ...(edgeExclusion === null
      ? []
      : [
          `${formatQuantity(edgeExclusion, "length", { unit: "mm", significant: 3, trim: true })} left out at the edge`,
        ]),
  ].join(", ");
}

/** What lay under a wafer while it was mapped, in words: a tape or a carrier counts into what was read. */
export function underneathWords(underneath: string | null | undefined): string {
  if (!underneath) return "not said what lay under it";
  return underneath === "nothing" ? "nothing under it" : `${underneath} under it, as read`;
}
