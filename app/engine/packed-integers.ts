/**
 * The digits, in the order in which programs are full of these characters: small numbers are the frequent ones, so what compresses
 * the program around a table compresses the table too.
 */
const DIGITS = "etnr,iaoslu.()=:cfdmhpg;?v0b1y*[]wk-/Mx+&2>!|TS45PLR";
/** Digits that are followed by another one of the same number; the others end it. */
const LEADING = 8;
const LAST = DIGITS.length - LEADING;

/**
 * Integers as text, for tables that a page loads; a small one takes one character. A number z (0, −1, 1, −2, 2 … as 0, 1, 2, 3,
 * 4 …) is a bijective numeral of base 8 with a last digit of base 44.
 */
export function packIntegers(values: readonly number[]): string {
  return values.map((value) => numeral(value < 0 ? -2 * value - 1 : 2 * value)).join("");
}

function numeral(z: number): string {
  let text = DIGITS.charAt(LEADING + (z % LAST));
  for (let rest = Math.floor(z / LAST); rest > 0; rest = Math.floor((rest - 1) / LEADING))
    text = DIGITS.charAt((rest - 1) % LEADING) + text;
  return text;
}

/** The integers that `packIntegers` has made text of. */
export function unpackIntegers(text: string): number[] {
  const values: number[] = [];
  let leading = 0;
  for (const character of text) {
    const digit = DIGITS.indexOf(character);
    if (digit < LEADING) leading = LEADING * leading + digit + 1;
    else {
      const z = LAST * leading + digit - LEADING;
      values.push(z % 2 === 1 ? -(z + 1) / 2 : z / 2);
      leading = 0;
    }
  }
  return values;
}
