import { EngineInputError } from "../errors.ts";

export interface NumberStyle {
  /** Significant digits, 1 to 17; zeros at the end stay. */
  significant?: number;
  /** Digits after the decimal point; negative rounds to tens, hundreds. Used instead of `significant`. */
  decimals?: number;
  /** Whether zeros at the end of the decimals go. Default only when no digits are asked for. */
  trim?: boolean;
  /** Whether a positive number gets a plus. Default false. */
  sign?: boolean;
}

/** Digits shown when nothing is asked for. */
const USUAL_DIGITS = 4;

/**
 * A number as text: point as decimal mark, the true minus sign, never a negative zero. Without digits asked for, four
 * significant ones without zeros at the end. Numbers beyond 1e21 are shown with a power of ten (1.2e25).
 */
export function formatNumber(value: number, style: NumberStyle = {}): string {
  if (!Number.isFinite(value)) throw new EngineInputError("value", "is not a finite number and cannot be shown");
  const size = Math.abs(value);
  const digits = style.decimals === undefined ? bySignificant(size, style) : byDecimals(size, style.decimals);
  const trim = style.trim ?? (style.decimals === undefined && style.significant === undefined);
  const text = trim && !digits.includes("e") && digits.includes(".") ? digits.replace(/\.?0+$/, "") : digits;
  if (Number(text) === 0) return text;
  if (value < 0) return `\u2212${text}`;
  return style.sign ? `+${text}` : text;
}

function bySignificant(size: number, { significant = USUAL_DIGITS }: NumberStyle): string {
  const [mantissa = "0", power = "0"] = size.toExponential(significant - 1).split("e");
  const exponent = Number(power);
  if (Math.abs(exponent) > 20) return `${mantissa}e${exponent}`;
  return Number(`${mantissa}e${exponent}`).toFixed(Math.max(0, significant - 1 - exponent));
}

function byDecimals(size: number, decimals: number): string {
  if (size >= 1e21) return size.toExponential(USUAL_DIGITS - 1).replace("+", "");
  if (decimals >= 0) return size.toFixed(Math.min(decimals, 100));
  const step = 10 ** -decimals;
  return (Math.round(size / step) * step).toFixed(0);
}
