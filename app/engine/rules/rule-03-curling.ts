import type { LyingShape } from "../flow/shape.ts";
import type { StepState } from "../flow/walk.ts";
import { againstUpperLimit, exceeds } from "./against-limit.ts";
import { isBonded, whatLies } from "./bonded.ts";
import type { Figure, Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf } from "./make-finding.ts";
import { height } from "./words.ts";
import { formatQuantity } from "../units/format.ts";
import { formatNumber } from "../units/format-number.ts";

const TITLE = "Curling";
const make = findingsOf(3, TITLE);

/** The critical load itself: a load of as much as it is the limit, and not a site's to set. */
const CRITICAL = 1;

const ratio = (value: number) => formatNumber(value, { significant: 2, trim: true });
const radius = (shape: LyingShape) =>
  formatQuantity(shape.rollRadius ?? 0, "length", { unit: "m", significant: 2, trim: true });

/** Shapes that the step leaves free: at peak only where its tool does. A gripper holds a few places and lets it roll. */
function freeShapes(state: StepState): LyingShape[] {
  const shapes = state.atRoom ? [state.atRoom] : [];
  if (state.atPeak && state.step.equipment?.atPeak === "free") shapes.push(state.atPeak);
  return shapes;
}

/** The shape let go has its working with the step, so it is given none here. */
const figuresOf = (shape: LyingShape, workings: RuleContext["workings"]): Figure[] => [
  { label: "Load over critical load", value: shape.stabilityRatio, unit: "1" },
  {
    label: "Edge lift",
    value: shape.warp,
    unit: "m",
    working: workings?.warp(shape) ?? null,
  },
];
const limitOf = () => ({ label: "Critical load", value: CRITICAL, unit: "1" as const, source: "plate theory" });

/** What a held wafer would do if it were let go: said, not judged. */
function ifReleased(state: StepState): Finding[] {
  const { released, step } = state;
  if (released.regime !== "curled" || released.rollRadius === null) return [];
  return [
    make(
      state,
      "clear",
      `Held by its ${step.planned}: curling is not judged. Do not release: it would roll to a radius of about ${radius(released)}, edges lifting ${height(released.warp)}.`,
      { figures: figuresOf(released, null), limit: limitOf() },
    ),
  ];
}

function judge({ limits, workings }: RuleContext, state: StepState): Finding[] {
  const shapes = freeShapes(state);
  const worst = shapes.reduce<LyingShape | null>(
    (most, shape) => (!most || shape.stabilityRatio > most.stabilityRatio ? shape : most),
    null,
  );
  const held = isBonded(state.after) || state.atRoom === null;
  const released = held ? ifReleased(state) : [];
  if (!worst) return released;
  const outcome = againstUpperLimit(worst.stabilityRatio, CRITICAL, CRITICAL - limits.curlMargin.value, "do not run");
  if (outcome === "clear") return released;
  const what = whatLies(state.after);
  const load = `${ratio(worst.stabilityRatio)} times the load at which it rolls up`;
  const rolled = exceeds(worst.stabilityRatio, CRITICAL) && worst.rollRadius !== null;
  const reason = rolled
    ? `${what} is free and carries ${load}: it rolls to a radius of about ${radius(worst)}, edges lifting ${height(worst.warp)}.`
    : `${what} is free and carries ${load}.`;
  return [
    make(state, outcome, reason, {
      remedy: isBonded(state.after)
        ? "Choose a carrier or a bond that bows less, or leave more silicon."
        : "Plan tape, ring or carrier for this step, leave more silicon, or lower the film force.",
      figures: figuresOf(worst, workings),
      limit: limitOf(),
    }),
    ...released,
  ];
}

export const curlingRule: Rule = {
  number: 3,
  title: TITLE,
  judge,
};

export const aboutCurling: RuleAbout = {
  asks: "Where the wafer or pair is free: does it stay clear of the load at which it rolls up about one axis? A held wafer is not judged; what it would do if released is said.",
  limits: ["curlMargin"],
};
