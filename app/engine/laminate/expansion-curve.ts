import { EngineInputError } from "../errors.ts";
import { requireTemperature, requireWithin } from "../inputs.ts";

/**
 * A coefficient of expansion over temperature, 1/K: points joined by straight lines, temperatures (K) rising, or a polynomial
 * Σ c_k T^k in T (K) between two temperatures. `shift` is added all along, such as the error common to a whole curve.
 */
export type ExpansionCurve =
  | { kind: "points"; temperatures: readonly number[]; coefficients: readonly number[]; shift?: number }
  | { kind: "polynomial"; terms: readonly number[]; from: number; to: number; shift?: number };

/** How far beyond its ends a curve is followed, at the value of its end, K (common practice, no source). */
export const CURVE_REACH = 25;

/** Checks a curve; `field` names it in errors. */
export function checkExpansionCurve(curve: ExpansionCurve, field: string): ExpansionCurve {
  requireWithin(`${field}.shift`, curve.shift ?? 0, -1e-3, 1e-3, "1/K");
  if (curve.kind === "polynomial") {
    const from = requireTemperature(`${field}.from`, curve.from);
    if (!(requireTemperature(`${field}.to`, curve.to) > from))
      throw new EngineInputError(`${field}.to`, "must lie above where the polynomial starts", `above ${from} K`);
    if (curve.terms.length === 0) throw new EngineInputError(`${field}.terms`, "are missing", "at least one");
    for (const at of [curve.from, (curve.from + curve.to) / 2, curve.to])
      requireWithin(`${field} at ${at} K`, polynomial(curve.terms, at), -1e-3, 1e-2, "1/K");
    return curve;
  }
  const { temperatures, coefficients } = curve;
  if (temperatures.length < 2 || temperatures.length !== coefficients.length)
    throw new EngineInputError(field, "needs one coefficient for each temperature", "at least two of each");
  temperatures.forEach((temperature, n) => {
    requireTemperature(`${field}.temperatures[${n}]`, temperature);
    const before = temperatures[n - 1];
    if (before !== undefined && !(temperature > before))
      throw new EngineInputError(`${field}.temperatures[${n}]`, "must lie above the one before", `above ${before} K`);
  });
  coefficients.forEach((value, n) => requireWithin(`${field}.coefficients[${n}]`, value, -1e-3, 1e-2, "1/K"));
  return curve;
}

/** Lowest and highest temperature that a curve is stated for, K. */
export function curveRange(curve: ExpansionCurve): { from: number; to: number } {
  if (curve.kind === "polynomial") return { from: curve.from, to: curve.to };
  return { from: curve.temperatures[0] ?? 0, to: curve.temperatures.at(-1) ?? 0 };
}

/**
 * Thermal strain along a curve between two temperatures (K), integrated in closed form. Up to 25 K beyond its ends the curve
 * keeps the value of its end; farther out it is refused.
 * @throws EngineInputError naming `field`
 */
export function curveStrain(curve: ExpansionCurve, from: number, to: number, field: string): number {
  const range = curveRange(curve);
  for (const at of [from, to]) {
    if (at < range.from - CURVE_REACH || at > range.to + CURVE_REACH)
      throw new EngineInputError(
        field,
        `its curve is not known at ${at} K`,
        `${range.from - CURVE_REACH} to ${range.to + CURVE_REACH} K`,
      );
  }
  return antiderivative(curve, range, to) - antiderivative(curve, range, from) + (curve.shift ?? 0) * (to - from);
}

/** Integral of the curve from its start to a temperature, without the shift. */
function antiderivative(curve: ExpansionCurve, { from, to }: { from: number; to: number }, at: number): number {
  const inside = Math.min(to, Math.max(from, at));
  const beyond = at - inside;
  if (curve.kind === "polynomial")
    return primitive(curve.terms, inside) - primitive(curve.terms, from) + polynomial(curve.terms, inside) * beyond;
  const { temperatures, coefficients } = curve;
  let total = 0;
  for (let n = 1; n < temperatures.length; n += 1) {
    const [t0, t1] = [temperatures[n - 1] ?? 0, temperatures[n] ?? 0];
    const [a0, a1] = [coefficients[n - 1] ?? 0, coefficients[n] ?? 0];
    if (inside <= t0) break;
    const end = Math.min(inside, t1);
    const atEnd = a0 + ((a1 - a0) * (end - t0)) / (t1 - t0);
    total += ((a0 + atEnd) / 2) * (end - t0);
  }
  const edge = beyond > 0 ? (coefficients.at(-1) ?? 0) : (coefficients[0] ?? 0);
  return total + edge * beyond;
}

function polynomial(terms: readonly number[], t: number): number {
  return terms.reduceRight((value, term) => value * t + term, 0);
}

function primitive(terms: readonly number[], t: number): number {
  return terms.reduceRight((value, term, power) => value * t + term / (power + 1), 0) * t;
}
