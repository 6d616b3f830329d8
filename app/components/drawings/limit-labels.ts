import type { PlotFrame } from "./plot.ts";

export interface LimitLabel {
  x: number;
  anchor: "start" | "end";
  /** 0 is the lowest; each tier stands one label's height higher. */
  tier: number;
}

const BESIDE = 5;

/**
 * Places for the labels at the foot of vertical lines. A label stands right of its own line, or left when only that
 * side is free of other lines; labels that would overlap stand a tier higher.
 * @param lines places of the labelled lines, px, ascending
 * @param widths of their labels, px
 * @param others places of the plot's other vertical lines, px
 */
export function limitLabels(
  lines: readonly number[],
  widths: readonly number[],
  others: readonly number[],
  frame: PlotFrame,
): LimitLabel[] {
  const all = [...lines, ...others];
  const tiers: [from: number, to: number][][] = [];
  return lines.map((line, index) => {
    const width = widths[index] ?? 0;
    const right = [line + BESIDE, line + BESIDE + width] as const;
    const left = [line - BESIDE - width, line - BESIDE] as const;
    const crossed = ([from, to]: readonly [number, number]) => all.filter((x) => x > from && x < to).length;
    const inside = ([from, to]: readonly [number, number]) => from >= frame.left && to <= frame.right;
    const toLeft = inside(left) && (!inside(right) || crossed(left) < crossed(right));
    const place = toLeft ? left : right;
    let tier = 0;
    while (tiers[tier]?.some(([from, to]) => place[0] < to + BESIDE && place[1] > from - BESIDE)) tier += 1;
    (tiers[tier] ??= []).push([place[0], place[1]]);
    return { x: toLeft ? place[1] : place[0], anchor: toLeft ? "end" : "start", tier };
  });
}
