/** A failure that a person is meant to read: one sentence, and perhaps the last lines of what failed; never a stack. */
export class Sentence extends Error {
  /**
   * @param {string} message the sentence
   * @param {string} [details] the last lines that the failing program printed
   */
  constructor(message, details = "") {
    super(message);
    this.name = "Sentence";
    this.details = details;
  }
}

/** Thrown into whatever is under way once stopping has begun; nobody is told. */
export class Stopped extends Error {}

/**
 * Prints a failure: the sentence and its details, or, where a defect of this program is the cause, the stack.
 *
 * @param {unknown} error
 */
export function printFailure(error) {
  if (error instanceof Stopped) return;
  if (!(error instanceof Sentence)) return console.error(error);
  if (error.details) console.error(error.details);
  console.error(error.message);
}
