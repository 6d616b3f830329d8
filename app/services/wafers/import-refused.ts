/** Thrown inside a transaction so that nothing of a file is kept; says why, for the person who brought it. */
export class ImportRefused extends Error {
  /** of what all files of a batch share, where the fault lies there */
  readonly field: string | null;

  constructor(sentence: string, field: string | null = null) {
    super(sentence);
    this.field = field;
  }
}
