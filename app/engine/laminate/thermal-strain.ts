import { EngineInputError } from "../errors.ts";
import { requireTemperature } from "../inputs.ts";
import { siliconThermalStrain } from "../silicon/expansion.ts";
import { curveStrain } from "./expansion-curve.ts";
import type { Expansion } from "./layer.ts";

/**
 * Free thermal strain between two temperatures (K), positive on heating with a positive coefficient. A constant is multiplied
 * out, silicon uses its closed integral (120 to 1500 K), a stated curve is integrated piece by piece, a function is integrated to 1e-10 of the strain. `field` names the
 * expansion in errors.
 */
export function thermalStrain(cte: Expansion, from: number, to: number, field = "cte"): number {
  const t0 = requireTemperature("from", from);
  const t1 = requireTemperature("to", to);
  if (t0 === t1) return 0;
  if (cte === "silicon") return siliconThermalStrain(t0, t1);
  if (typeof cte === "number") return cte * (t1 - t0);
  if (typeof cte === "object") return curveStrain(cte, t0, t1, field);
  const coefficient = checked(cte, field);
  const [low, high, sign] = t0 < t1 ? [t0, t1, 1] : [t1, t0, -1];
  return sign * integrate(coefficient, low, high);
}

function checked(cte: (temperature: number) => number, field: string): (temperature: number) => number {
  return (temperature) => {
    const value = cte(temperature);
    if (typeof value !== "number" || !Number.isFinite(value)) {
      throw new EngineInputError(field, `gives no finite coefficient at ${temperature} K`);
    }
    return value;
  };
}

/** Panels start at no more than 10 K, so that a kink in a tabulated curve is seen; each is halved until Simpson's rule holds. */
function integrate(f: (t: number) => number, low: number, high: number): number {
  const panels = Math.ceil((high - low) / 10);
  let total = 0;
  for (let n = 0; n < panels; n += 1) {
    const a = low + ((high - low) * n) / panels;
    const b = low + ((high - low) * (n + 1)) / panels;
    const [fa, fm, fb] = [f(a), f((a + b) / 2), f(b)];
    total += simpson(f, { a, b, fa, fm, fb }, 20);
  }
  return total;
}

interface Panel {
  a: number;
  b: number;
  fa: number;
  fm: number;
  fb: number;
}

function simpson(f: (t: number) => number, p: Panel, depth: number): number {
  const middle = (p.a + p.b) / 2;
  const left: Panel = { a: p.a, b: middle, fa: p.fa, fm: f((p.a + middle) / 2), fb: p.fm };
  const right: Panel = { a: middle, b: p.b, fa: p.fm, fm: f((middle + p.b) / 2), fb: p.fb };
  const whole = rule(p);
  const halves = rule(left) + rule(right);
  const scale = (p.b - p.a) * Math.max(Math.abs(p.fa), Math.abs(p.fm), Math.abs(p.fb));
  if (depth === 0 || Math.abs(halves - whole) <= 1e-10 * scale) return halves + (halves - whole) / 15;
  return simpson(f, left, depth - 1) + simpson(f, right, depth - 1);
}

function rule({ a, b, fa, fm, fb }: Panel): number {
  return ((b - a) / 6) * (fa + 4 * fm + fb);
}
