import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import { stepsInWords } from "#app/lib/step-numbers.ts";
import { plannedRowsHeight } from "./planned-spans.ts";
import { supportSegments, wordLines } from "./support-segments.ts";
import { textWidth } from "./text-width.ts";
import { wrapText } from "./wrap-text.ts";

interface LineBar {
  required: readonly SupportClass[];
  planned: readonly (string | null)[];
  outcomes?: readonly Outcome[];
  numbers?: readonly number[];
  variant?: "screen" | "paper" | "floor";
}

interface LineBarSizes {
  width: number;
  gutter: number;
  text: number;
  numberY: number;
  headY: number;
  bar: { y: number; height: number };
  plannedY: number;
  /** room below the line of the planned support */
  foot: number;
  line: number;
  thin: number;
  extension: readonly [above: number, below: number];
}

/** Sizes in px: 12.5 px words on screen; on paper 11 pt, where the bar is drawn about 680 px wide. */
const SCREEN: LineBarSizes = {
  width: 1200,
  gutter: 1,
  text: 12.5,
  numberY: 17,
  headY: 24,
  bar: { y: 32, height: 32 },
  plannedY: 82,
  foot: 16,
  line: 1,
  thin: 0.75,
  extension: [15, 9],
};
const PAPER: LineBarSizes = {
  width: 680,
  gutter: 0,
  text: 14.6,
  numberY: 15,
  headY: 20,
  bar: { y: 24, height: 30 },
  plannedY: 69,
  foot: 13,
  line: 0.6,
  thin: 0.6,
  extension: [12, 7],
};

const NUMBERED = [1, 2, 5, 10, 20];

export const PLANNED_TITLE = "Planned support";

/** Number of a step: its own where given, else its place. */
export function numberAt({ numbers }: LineBar, index: number): number {
  return numbers?.[index] ?? index + 1;
}

/** Places of a support bar in a line, and its height in its own px. */
export function lineBarLayout(bar: LineBar) {
  const sizes = bar.variant === "paper" ? PAPER : SCREEN;
  const { width, gutter, text, plannedY, foot } = sizes;
  const columnWidth = (width - 2 * gutter) / bar.required.length;
  const narrow = bar.variant === "paper" ? narrowWords(bar, columnWidth, text, width - 8) : [];
  const lineHeight = text * 1.25;
  const widest = textWidth(String(numberAt(bar, bar.required.length - 1)), text, true) + 4;
  const noneBefore = bar.planned.findIndex((each) => each !== null);
  return {
    sizes,
    columnWidth,
    /** Numbers that would touch are left out: every second one stands, or every fifth. */
    numbered: NUMBERED.find((every) => every * columnWidth >= widest) ?? 50,
    narrowWords: narrow,
    lineHeight,
    hasRoomForTitle: noneBefore < 0 || noneBefore * columnWidth > textWidth(PLANNED_TITLE, text) + 8,
    height: plannedY + foot + plannedRowsHeight(bar.planned, columnWidth, text) + narrow.length * lineHeight,
  };
}

/** Words that have no room on their segment, with the steps that they are for, in lines: 'Tape or ring: step 11'. */
function narrowWords(bar: LineBar, columnWidth: number, size: number, lineWidth: number): string[] {
  const found = new Map<string, number[]>();
  for (const { word, wordAt } of supportSegments(bar.required, bar.outcomes ?? [])) {
    if (!wordAt || wordLines(word, (wordAt.to - wordAt.from) * columnWidth, size).fits) continue;
    const numbers = Array.from({ length: wordAt.to - wordAt.from }, (_, index) => numberAt(bar, wordAt.from + index));
    found.set(word, [...(found.get(word) ?? []), ...numbers]);
  }
  if (found.size === 0) return [];
  const words = [...found].map(
    ([word, numbers], index) => `${index === 0 ? word : word.toLowerCase()}: ${stepsInWords(numbers)}`,
  );
  return wrapText(words.join("; "), lineWidth, size, 3);
}
