const LETTERS = 26;

/** The letters of a flow's assessments in their order: A to Z, then AA, AB. `number` counts from 1. */
export function revisionLetters(number: number): string {
  let [letters, rest] = ["", number];
  while (rest > 0) {
    const place = (rest - 1) % LETTERS;
    letters = String.fromCharCode(65 + place) + letters;
    rest = (rest - 1 - place) / LETTERS;
  }
  return letters;
}

/** The revision of its flow that an assessment is; one of a lot is none. */
export function revisionOf({ number, lot }: { number: number; lot: { name: string } | null }): string {
  return lot === null ? revisionLetters(number) : "none";
}
