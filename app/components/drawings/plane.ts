import { coordinate } from "./coordinate.ts";

/** A drawing over two quantities for a width of screen; text is in its own units, which come out as pixels or more down to the narrowest. */
export interface PlaneSize {
  width: number;
  height: number;
  inset: { left: number; right: number; top: number; bottom: number };
  text: number;
  /** about how many ticks an axis has room for */
  ticks: number;
  /** whether the names of the axes stand beside them; else the drawing's surroundings say them */
  named: boolean;
}

export const PLANE_WIDE: PlaneSize = {
  width: 720,
  height: 440,
  inset: { left: 64, right: 16, top: 12, bottom: 44 },
  text: 14,
  ticks: 6,
  named: true,
};

/** Shown 256 px wide on the narrowest phone. */
export const PLANE_NARROW: PlaneSize = {
  width: 320,
  height: 320,
  inset: { left: 50, right: 12, top: 10, bottom: 26 },
  text: 15.5,
  ticks: 3,
  named: false,
};

/** Where things lie in the frame of a plane: its bounds, and places from shares of its axes, 0 to 1 from the lower left. */
export function planeBox({ width, height, inset }: PlaneSize) {
  const plot = { width: width - inset.left - inset.right, height: height - inset.top - inset.bottom };
  return {
    ...plot,
    left: inset.left,
    top: inset.top,
    right: inset.left + plot.width,
    bottom: inset.top + plot.height,
    atX: (share: number) => inset.left + share * plot.width,
    atY: (share: number) => inset.top + (1 - share) * plot.height,
  };
}

export type PlaneBox = ReturnType<typeof planeBox>;

/** A line or, with several, an outline, from shares of the axes. */
export function planePath(lines: readonly (readonly { x: number; y: number }[])[], { atX, atY }: PlaneBox): string {
  return lines
    .map((line) =>
      line.map(({ x, y }, n) => `${n === 0 ? "M" : "L"}${coordinate(atX(x))} ${coordinate(atY(y))}`).join(""),
    )
    .join("");
}
