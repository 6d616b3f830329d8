const COUNTS = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
];

/** A count as a word up to twelve, as a number beyond. */
export const count = (number: number) => COUNTS[number] ?? String(number);
