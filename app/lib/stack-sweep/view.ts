import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { DrawnAxis, DrawnCurve, DrawnLevel, DrawnMap, SweptView } from "#app/schemas/stack-sweep.ts";
import { temperatureWords } from "../stack-words.ts";
import { answerValue, type SweepAnswer } from "./answers.ts";
import { isOn, shareAt, type SweepAxis } from "./axis.ts";
import { limitCrossings } from "./crossings.ts";
import { answerCurve, sweptCurve } from "./curve.ts";
import { supportThresholds, type SweepLimit } from "./limits.ts";
import { levelsOf } from "./levels.ts";
import { levelLines, MAP_CELLS, mapValues, regionAbove, sweptMap, type Field } from "./map.ts";
import { stateOf, sweptPlace, type SweptPlace } from "./model.ts";
import { crossingSentence, ownSentence, rangeSentence } from "./sentences.ts";
import { ticksOn } from "./ticks.ts";

/** A sweep that can be worked out. */
export interface SweepQuestion {
  stack: StackInput;
  x: SweepAxis;
  /** null for a curve */
  y: SweepAxis | null;
  answer: SweepAnswer;
  limits: readonly SweepLimit[];
  site: SiteLimits;
}

/** Works a sweep out: drawn, and in words. `fault` where the engine refuses every place of it. */
export function sweptView(question: SweepQuestion): { swept: SweptView; fault: null } | { swept: null; fault: string } {
  const { stack, x, y, answer } = question;
  const axes = y ? [x, y] : [x];
  const own = sweptPlace(stack);
  const { drawn, places } = y ? drawnMap(question, y, own) : drawnCurve(question, own);
  const refused = places.find(({ fault }) => fault !== null);
  if (refused && places.every(({ fault }) => fault !== null))
    return { swept: null, fault: `The engine refuses all of this range: ${refused.fault}.` };
  const values = places.map(({ figures }) => figures && answerValue(answer, figures));
  const temperature = stack.temperature ?? ROOM_TEMPERATURE;
  const value = own.figures && answerValue(answer, own.figures);
  const curled = own.figures !== null && own.figures.load > 1;
  return {
    fault: null,
    swept: {
      answer: answer.key,
      temperature: temperatureWords(temperature),
      summary: [ownSentence(axes, answer, { value, curled, temperature }), rangeSentence(values, answer)],
      crossings: crossingsOf(question, axes),
      remarks: remarksOf(question, axes, refused?.fault ?? null),
      drawn,
    },
  };
}

/** Along each input, the others as the stack has them. */
function crossingsOf({ stack, answer, limits }: SweepQuestion, axes: readonly SweepAxis[]): string[] {
  const sentences = axes.flatMap((axis) =>
    limits.map((limit) =>
      crossingSentence(
        axis,
        answer,
        limit,
        limitCrossings(stack, axis, answer, limit.value),
        axes.filter((other) => other !== axis).map(({ input }) => input),
      ),
    ),
  );
  // Where there is no answer at all, both limits say the same.
  return [...new Set(sentences)];
}

/** What is to be minded of a sweep. */
function remarksOf({ stack, answer }: SweepQuestion, axes: readonly SweepAxis[], refused: string | null): string[] {
  const found: string[] = [];
  if (!axes.every((axis) => isOn(axis, axis.input.value)))
    found.push("The stack as it is lies outside of what is drawn.");
  const cold = (stack.temperature ?? ROOM_TEMPERATURE) === ROOM_TEMPERATURE;
  const moves = (word: string) => axes.some(({ input }) => input.key.endsWith(word));
  if (cold && moves("expansion") && !moves("temperature"))
    found.push(
      "At 25 °C, where stresses are stated, expansion moves nothing. Type another temperature to see what it does.",
    );
  if (answer.key === "stress")
    found.push(
      "Stress is that of small deflections, at the face of the film where it is largest; of lines the mean of both directions.",
    );
  if (refused) found.push(`Left blank where the engine refuses it: ${refused}.`);
  return found;
}

function drawnAxis({ input, from, to, log }: SweepAxis, { stack, site }: SweepQuestion): DrawnAxis {
  const thresholds = input.key === "silicon" ? supportThresholds(stack.wafer.diameter, site) : [];
  return {
    label: input.label,
    dimension: input.rule.dimension,
    unit: input.unit,
    from,
    to,
    log,
    own: input.value,
    thresholds: thresholds.filter(({ value }) => value > from && value < to),
  };
}

function drawnCurve(question: SweepQuestion, own: SweptPlace): { drawn: DrawnCurve; places: SweptPlace[] } {
  const { stack, x, answer, limits } = question;
  const axis = drawnAxis(x, question);
  const ticks = ticksOn(axis).map(({ value }) => value);
  const curve = sweptCurve(stack, x, answer, [x.input.value, ...ticks]);
  const y = own.figures && isOn(x, x.input.value) ? answerValue(answer, own.figures) : null;
  return {
    places: curve.places,
    drawn: {
      kind: "curve",
      x: axis,
      ...answerCurve(curve, answer),
      curled: curve.curled,
      own: y === null ? null : { x: x.input.value, y },
      limits: limits.map(({ value, label }) => ({ value, label })),
    },
  };
}

function drawnMap(question: SweepQuestion, y: SweepAxis, own: SweptPlace): { drawn: DrawnMap; places: SweptPlace[] } {
  const { stack, x, answer, limits } = question;
  const map = sweptMap(stack, x, y);
  const values = mapValues(map, answer);
  const level = (value: number, limit: string | null): DrawnLevel => ({
    value,
    limit,
    lines: levelLines(map, fieldOf(answer), value).map(rounded),
  });
  const near = (value: number) => limits.some((limit) => Math.abs(limit.value - value) <= 1e-6 * Math.abs(value));
  const levels = [
    ...levelsOf(values)
      .filter((value) => !near(value))
      .map((value) => level(value, null)),
    ...limits.map(({ value, label }) => level(value, label)),
  ].filter(({ lines }) => lines.length > 0);
  const [alongX, alongY] = [shareAt(x, x.input.value), shareAt(y, y.input.value)];
  const inside = isOn(x, x.input.value) && isOn(y, y.input.value);
  return {
    places: map.places,
    drawn: {
      kind: "map",
      x: drawnAxis(x, question),
      y: drawnAxis(y, question),
      cells: MAP_CELLS,
      values: values.map((value) => value && Number(value.toPrecision(7))),
      states: map.places.map((place) => stateOf(place, answer)).join(""),
      levels,
      curled: {
        outlines: regionAbove(map, CURLED, 1).map(rounded),
        begins: levelLines(map, CURLED, 1).map(rounded),
      },
      without: answer.beyond
        ? regionAbove(map, { of: answer.beyond, folded: answer.key !== "radius" }, 1).map(rounded)
        : [],
      own: inside ? { x: alongX, y: alongY, value: own.figures && answerValue(answer, own.figures) } : null,
    },
  };
}

const CURLED: Field = { of: ({ load }) => load, folded: true };
const fieldOf = ({ field, folded = false }: SweepAnswer): Field => ({ of: field, folded });

/** Shares to a hundredth of a pixel. */
const rounded = (line: readonly { x: number; y: number }[]) =>
  line.map(({ x, y }) => ({ x: Number(x.toFixed(5)), y: Number(y.toFixed(5)) }));
