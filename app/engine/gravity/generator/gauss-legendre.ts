/** Nodes and weights of Gauss and Legendre's rule on 0 to 1. */
export function gaussLegendre(points: number): { node: number; weight: number }[] {
  return Array.from({ length: points }, (_, n) => {
    let x = Math.cos((Math.PI * (n + 0.75)) / (points + 0.5));
    let slope = 1;
    for (let round = 0; round < 100; round += 1) {
      let [before, value] = [1, x];
      for (let k = 2; k <= points; k += 1) [before, value] = [value, ((2 * k - 1) * x * value - (k - 1) * before) / k];
      slope = (points * (x * value - before)) / (x * x - 1);
      const step = value / slope;
      x -= step;
      if (Math.abs(step) < 1e-15) break;
    }
    return { node: (1 + x) / 2, weight: 1 / ((1 - x * x) * slope * slope) };
  });
}
