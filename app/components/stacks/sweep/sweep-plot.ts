import type { Plot, PlotTick } from "#app/components/drawings/plot.ts";
import { inUnit, type SweepAnswer } from "#app/lib/stack-sweep/answers.ts";
import { roundValues, ticksOn } from "#app/lib/stack-sweep/ticks.ts";
import type { DrawnAxis, DrawnCurve } from "#app/schemas/stack-sweep.ts";

/** From this ratio of its ends on an answer that is never negative is drawn over powers of ten. */
const WIDE = 20;
/** Room above and below the curve, as a share of its height or of its powers of ten. */
const ROOM = 0.06;
const TICKS = 6;

export const axisName = ({ label, unit }: Pick<DrawnAxis, "label" | "unit">) => `${label}, ${unit}`;
export const axisText = ({ dimension, unit }: DrawnAxis, value: number) => inUnit(value, dimension, unit);

/** The curve of an answer over one input of a stack. */
export function sweepPlot({ x, points, gaps, curled, own, limits }: DrawnCurve, answer: SweepAnswer): Plot {
  const first = curled[0];
  const onlyFromLeft = curled.length === 1 && first && first.from === x.from && first.to < x.to;
  return {
    x: {
      scale: x.log ? "log" : "linear",
      from: x.from,
      to: x.to,
      ticks: ticksOn(x),
      title: axisName(x),
      format: (value) => axisText(x, value),
    },
    y: answerAxis([...points.map(({ y }) => y), ...limits.map(({ value }) => value)], answer),
    series: [
      {
        id: "answer",
        label: answer.label,
        dash: "solid",
        marker: "none",
        colourToken: "silicon",
        points,
        gaps,
        labelled: "none",
      },
    ],
    yLimits: limits.map(({ value, label }) => ({ value, lines: [label] })),
    xLimits: x.thresholds.map(({ value, label }) => ({ value, lines: [label, axisText(x, value)] })),
    ...(own && { chosen: own }),
    ...(onlyFromLeft
      ? { regime: { upTo: first.to, label: `curls below ${axisText(x, first.to)}`, inside: "curled about one axis" } }
      : { shaded: curled.map((stretch) => ({ ...stretch, label: "curled about one axis" })) }),
  };
}

function answerAxis(values: readonly number[], answer: SweepAnswer): Plot["y"] {
  const [least, most] = values.length > 0 ? [Math.min(...values), Math.max(...values)] : [0, 1];
  const format = answer.words;
  if (least > 0 && most >= WIDE * least) {
    const room = (most / least) ** ROOM;
    const [from, to] = [least / room, most * room];
    return { scale: "log", from, to, ticks: ticksWithin(from, to, true, answer), format };
  }
  const room = most > least ? (most - least) * ROOM : Math.max(Math.abs(most) * ROOM, 1e-9);
  const [from, to] = [least >= 0 && least < room ? 0 : least - room, most + room];
  return { scale: "linear", from, to, ticks: ticksWithin(from, to, false, answer), format };
}

function ticksWithin(from: number, to: number, log: boolean, answer: SweepAnswer): PlotTick[] {
  const ticks = roundValues(from, to, log, TICKS).map((value) => ({ value, text: answer.words(value) }));
  return ticks.filter(({ text }, n) => ticks.findIndex((other) => other.text === text) === n);
}
