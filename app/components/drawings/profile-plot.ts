import type { Plot, PlotPoint } from "./plot.ts";

export interface ProfilePlotInput {
  /** x: position along the scan from the centre, m; y: height, m. In ascending x. */
  pre: readonly PlotPoint[];
  post: readonly PlotPoint[];
  /** post − pre, from the level of the fit. */
  difference: readonly PlotPoint[];
  /** The fitted parabola. */
  fit: readonly PlotPoint[];
  /** Scan radius shown, and the width of the rim that was left out of the fit, m. */
  radius: number;
  edgeExclusion: number;
  formatPosition: (metres: number) => string;
  formatHeight: (metres: number) => string;
}

const MICROMETRE = 1e-6;
const MILLIMETRE = 1e-3;
/** Difference points drawn at most; the line beneath them has all. */
const SHOWN_POINTS = 32;

/** Profiles before and after a film, their difference and the parabola fitted to it. */
export function profilePlot(input: ProfilePlotInput): Plot {
  const heights = [...input.pre, ...input.post, ...input.difference].map((point) => point.y);
  const lowest = Math.min(0, ...heights);
  const highest = Math.max(0, ...heights);
  const room = (highest - lowest || MICROMETRE) * 0.05;
  const heightStep = niceStep((highest - lowest || MICROMETRE) / 4);
  const positionStep = niceStep(input.radius / 2);
  const every = Math.max(1, Math.ceil(input.difference.length / SHOWN_POINTS));
  return {
    x: {
      scale: "linear",
      from: -input.radius,
      to: input.radius,
      ticks: multiples(positionStep, -input.radius, input.radius).map((value) => ({
        value,
        text: signed(value / MILLIMETRE),
      })),
      title: "Along the scan, mm; ruled rim left out",
      format: input.formatPosition,
    },
    y: {
      scale: "linear",
      from: lowest - room,
      to: highest + room,
      ticks: multiples(heightStep, lowest - room, highest + room).map((value) => ({
        value,
        text: signed(value / MICROMETRE),
      })),
      format: input.formatHeight,
    },
    series: [
      { id: "fit", label: "fitted parabola", dash: "solid", marker: "none", colourToken: "copper", points: input.fit },
      { id: "pre", label: "before film", dash: "dotted", marker: "none", colourToken: "quiet", points: input.pre },
      { id: "post", label: "after film", dash: "long", marker: "none", colourToken: "silicon", points: input.post },
      {
        id: "difference",
        label: "difference",
        dash: "none",
        marker: "circle",
        colourToken: "copper",
        points: input.difference,
        markersAt: input.difference.filter((_, index) => index % every === 0).map((point) => point.x),
      },
    ],
    leftOut:
      input.edgeExclusion > 0
        ? [
            { from: -input.radius, to: -input.radius + input.edgeExclusion },
            { from: input.radius - input.edgeExclusion, to: input.radius },
          ]
        : [],
  };
}

/** 1, 2 or 5 times a power of ten, at least the given step. */
function niceStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  const digit = [1, 2, 5, 10].find((each) => each * decade >= least * 0.999) ?? 10;
  return digit * decade;
}

function multiples(step: number, from: number, to: number): number[] {
  const values: number[] = [];
  for (let index = Math.ceil(from / step - 1e-9); index * step <= to + step * 1e-9; index += 1)
    values.push(index * step);
  return values;
}

/** A tick's number with the minus sign of the trade, not a hyphen. */
function signed(value: number): string {
  const text = String(Math.round(Math.abs(value) * 100) / 100);
  return value < 0 && text !== "0" ? `−${text}` : text;
}
