import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import type { ColourToken } from "./colour.ts";

/**
 * Levels that a hatch can show, lightest first. Severity and support share one family: a diagonal line in any drawing of
 * the product means one of these and nothing else.
 */
export type HatchLevel = "clear" | "gripper" | "caution" | "need" | "unknown" | "stop";

/** How a level is ruled at 45 degrees. Pitch is perpendicular to the lines; both in px, the same on paper. */
export interface HatchStyle {
  /** null: left empty. */
  pitch: number | null;
  stroke: number;
  crossed: boolean;
  colour: ColourToken;
  /** The outline is broken where the level says that something is missing. */
  dashedOutline: boolean;
}

export const HATCH_STYLES: Readonly<Record<HatchLevel, HatchStyle>> = {
  clear: { pitch: null, stroke: 0, crossed: false, colour: "clear", dashedOutline: false },
  gripper: { pitch: 18, stroke: 1.2, crossed: false, colour: "caution", dashedOutline: false },
  caution: { pitch: 9, stroke: 1.2, crossed: false, colour: "caution", dashedOutline: false },
  need: { pitch: 4.5, stroke: 1.1, crossed: false, colour: "need", dashedOutline: false },
  unknown: { pitch: 11, stroke: 1.1, crossed: true, colour: "ink", dashedOutline: true },
  stop: { pitch: 5, stroke: 1.1, crossed: true, colour: "stop", dashedOutline: false },
};

/** Each outcome with its level and the word that stands beside it. */
export const OUTCOME_SIGNS: Readonly<Record<Outcome, { level: HatchLevel; word: string }>> = {
  clear: { level: "clear", word: "Clear" },
  caution: { level: "caution", word: "Caution" },
  "needs support": { level: "need", word: "Needs support" },
  "cannot judge": { level: "unknown", word: "Cannot judge" },
  "do not run": { level: "stop", word: "Do not run" },
};

/** Each support class with its level and the word that stands beside it. */
export const SUPPORT_SIGNS: Readonly<Record<SupportClass, { level: HatchLevel; word: string }>> = {
  bare: { level: "clear", word: "Bare" },
  "thin-wafer gripper": { level: "gripper", word: "Thin-wafer gripper" },
  "tape or ring": { level: "caution", word: "Tape or ring" },
  carrier: { level: "need", word: "Carrier" },
  "none fits": { level: "stop", word: "None fits" },
};
