import { chooseExaggeration } from "./choose-exaggeration.ts";

/** A bow more than this many times the median may be taken out of the choice. */
const FAR_ABOVE = 4;

export interface SetAsideExaggeration {
  /** For every bow line of the page that has none of its own. */
  common: number;
  /** One entry per bow: its own exaggeration where it was set aside, which must then be printed beside the line. */
  own: readonly (number | null)[];
}

/**
 * The page's exaggeration when single large bows would flatten all others: bows above four times the median are drawn at
 * their own scale.
 * @param bows bows of the page's wafers, m, either sign
 * @param diameter wafer diameter, m
 */
export function setAsideExaggeration(bows: readonly number[], diameter: number): SetAsideExaggeration {
  const sizes = bows.map(Math.abs);
  const sorted = [...sizes].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  const median = ((sorted[Math.ceil(middle) - 1] ?? 0) + (sorted[Math.floor(middle)] ?? 0)) / 2;
  const isFar = (size: number) => size > FAR_ABOVE * median;
  const common = chooseExaggeration(
    sizes.filter((size) => !isFar(size)),
    diameter,
  );
  const own = sizes.map((size) => {
    if (!isFar(size)) return null;
    const scale = chooseExaggeration([size], diameter);
    return scale < common ? scale : null;
  });
  return { common, own };
}
