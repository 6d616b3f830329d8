import { requireWithin } from "../inputs.ts";

/** Okada and Tokumaru's fit, α = a (1 − exp(−b (T − c))) + d T, with α in 1/K and T in K. */
const A = 3.725e-6;
const B = 5.88e-3;
const C = 124;
const D = 5.548e-10;

const LOWEST = 120;
const HIGHEST = 1500;

/**
 * Linear expansion coefficient of silicon, 1/K, at `temperature` (K). Range 120 to 1500 K; outside it throws
 * `EngineInputError`. The data scatter by ±0.2e-6 1/K about the fit; at 25 °C it lies 1.4 % below the recommended
 * 2.59e-6 1/K. Source: Okada and Tokumaru 1984, abstract.
 */
export function siliconExpansion(temperature: number): number {
  const t = requireWithin("temperature", temperature, LOWEST, HIGHEST, "K");
  return A * (1 - Math.exp(-B * (t - C))) + D * t;
}

/**
 * Thermal strain of silicon between two temperatures (K): the closed integral of `siliconExpansion`, positive on heating.
 * Range 120 to 1500 K for both; outside it throws `EngineInputError`.
 */
export function siliconThermalStrain(from: number, to: number): number {
  const t0 = requireWithin("from", from, LOWEST, HIGHEST, "K");
  const t1 = requireWithin("to", to, LOWEST, HIGHEST, "K");
  // exp(−b(T1 − c)) − exp(−b(T0 − c)) through expm1, so that a small step keeps its digits.
  const decay = (Math.exp(-B * (t0 - C)) * Math.expm1(-B * (t1 - t0))) / B;
  return A * (t1 - t0 + decay) + (D / 2) * (t1 - t0) * (t1 + t0);
}
