/** Nodes and weights of Gauss and Legendre's rule on 0 to 1, exact for polynomials up to degree 2 `count` − 1. */
export function gaussLegendre(count: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(count);
  const weights = new Float64Array(count);
  for (let n = 0; n < count; n += 1) {
    let x = Math.cos((Math.PI * (n + 0.75)) / (count + 0.5));
    let slope = 1;
    for (let step = 0; step < 100; step += 1) {
      let [previous, value] = [1, x];
      for (let k = 2; k <= count; k += 1)
        [previous, value] = [value, ((2 * k - 1) * x * value - (k - 1) * previous) / k];
      slope = (count * (x * value - previous)) / (x * x - 1);
      const change = value / slope;
      x -= change;
      if (Math.abs(change) < 1e-15) break;
    }
    nodes[n] = (1 - x) / 2;
    weights[n] = 1 / ((1 - x * x) * slope * slope);
  }
  return { nodes, weights };
}
