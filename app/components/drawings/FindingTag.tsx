import type { ReactNode } from "react";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { OUTCOME_SIGNS, type HatchLevel } from "./severity.ts";
import { Swatch } from "./Swatch.tsx";

const WORD_CLASSES: Readonly<Record<HatchLevel, string>> = {
  clear: "text-clear",
  gripper: "text-caution font-semibold",
  caution: "text-caution font-semibold",
  need: "text-need font-semibold",
  unknown: "text-ink font-semibold",
  stop: "text-stop font-semibold",
};

export interface FindingTagProps {
  outcome: Outcome;
  /** Another word of the same weight, such as 'Step stopped'; the outcome's own by default. */
  word?: string;
  /** What follows the word: the rule, or where it happens first. */
  children?: ReactNode;
}

/** Outcome of a finding: hatch and word together, so that it reads without colour. */
export function FindingTag({ outcome, word, children }: FindingTagProps) {
  const sign = OUTCOME_SIGNS[outcome];
  return (
    <span className="inline-flex flex-wrap items-center gap-x-1.5">
      <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
        <Swatch level={sign.level} />
        <span className={WORD_CLASSES[sign.level]}>{word ?? sign.word}</span>
      </span>
      {children === undefined ? null : <span className="text-quiet">{children}</span>}
    </span>
  );
}
