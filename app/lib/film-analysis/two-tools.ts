import type { KnownTool } from "./pair-points.ts";

/**
 * Two instruments, one for each scan of a pair, as the one that a budget asks for: its uncertainty of one scan is the root mean square
 * of theirs, so that root two of it is that of the difference. What is not known of one is not known of both.
 */
export function twoTools(one: KnownTool, other: KnownTool): KnownTool {
  const rms = (a: number, b: number) => Math.hypot(a, b) / Math.SQRT2;
  const [a, b] = [one.repeatability, other.repeatability];
  const [x, y] = [one.offset, other.offset];
  return {
    name: `${one.name} and ${other.name}`,
    repeatability:
      a && b
        ? {
            standardUncertainty: rms(a.standardUncertainty, b.standardUncertainty),
            degreesOfFreedom: Math.min(a.degreesOfFreedom ?? Infinity, b.degreesOfFreedom ?? Infinity),
          }
        : null,
    forTwo: one.forTwo === null || other.forTwo === null ? null : rms(one.forTwo, other.forTwo),
    offset: x && y ? { standardUncertainty: rms(x.standardUncertainty, y.standardUncertainty) } : null,
  };
}
