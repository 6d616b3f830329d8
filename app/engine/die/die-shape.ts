/** The surface of a rectangular die, w = κ_x x²/2 + κ_y y²/2 + twist x y, about its centre. */
export interface DieSurface {
  /** 1/m, κ's sign: positive when the device side is concave. */
  curvatureX: number;
  curvatureY: number;
  twist: number;
}

/** Heights over the centre, m, κ's sign. */
export interface DieShape {
  /** Middle of the two sides across x, and of the two across y. */
  alongX: number;
  alongY: number;
  /** The corners where x and y have the same sign, and the other two. */
  cornerSame: number;
  cornerOpposite: number;
  /** Highest less lowest place of the die, m, never negative. */
  warp: number;
}

/**
 * Shape of a die of `length` along x and `width` along y, m. The surface is of second degree, so its highest and lowest places
 * are the centre, a corner, or the top of the parabola along a side. Small slopes.
 */
export function dieShape({ curvatureX, curvatureY, twist }: DieSurface, length: number, width: number): DieShape {
  const [a, b] = [length / 2, width / 2];
  const height = (x: number, y: number) => (curvatureX * x * x + curvatureY * y * y) / 2 + twist * x * y;
  const places = [
    0,
    height(a, b),
    height(a, -b),
    height(a, crest(twist * a, curvatureY, b)),
    height(crest(twist * b, curvatureX, a), b),
  ];
  return {
    alongX: height(a, 0),
    alongY: height(0, b),
    cornerSame: height(a, b),
    cornerOpposite: height(a, -b),
    warp: Math.max(...places) - Math.min(...places),
  };
}

/** Where a parabola of slope and curvature at its middle turns, if that lies within `half` of it, else its end. */
function crest(slope: number, curvature: number, half: number): number {
  const at = curvature === 0 ? half : -slope / curvature;
  return Math.abs(at) <= half ? at : half;
}
