import type { Plot, PlotPoint } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

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
        text: signedTick(value / MILLIMETRE),
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
        text: signedTick(value / MICROMETRE),
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
