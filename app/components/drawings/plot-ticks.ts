/** 1, 2 or 5 times a power of ten, at least the given step. */
export function niceStep(least: number): number {
  const decade = 10 ** Math.floor(Math.log10(least));
  const digit = [1, 2, 5, 10].find((each) => each * decade >= least * 0.999) ?? 10;
  return digit * decade;
}

/** Multiples of a step within a range. */
export function multiples(step: number, from: number, to: number): number[] {
  const values: number[] = [];
  for (let index = Math.ceil(from / step - 1e-9); index * step <= to + step * 1e-9; index += 1)
    values.push(index * step);
  return values;
}

/** A tick's number with the minus sign of the trade, not a hyphen. */
export function signedTick(value: number): string {
  const text = String(Math.round(Math.abs(value) * 100) / 100);
  return value < 0 && text !== "0" ? `−${text}` : text;
}
