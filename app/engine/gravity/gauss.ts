/** Gauss and Legendre's rule of ten points on −1 to 1, node and weight. */
export const GAUSS_TEN: readonly (readonly [node: number, weight: number])[] = [
  [0.14887433898163122, 0.29552422471475287],
  [0.4333953941292472, 0.26926671930999635],
  [0.6794095682990244, 0.21908636251598204],
  [0.8650633666889845, 0.1494513491505806],
  [0.9739065285171717, 0.06667134430868814],
].flatMap(([node = 0, weight = 0]) => [[node, weight] as const, [-node, weight] as const]);
