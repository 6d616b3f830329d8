import type { Fault } from "./reading.ts";

/** A file that cannot be read, with the sentence for the person who chose it and the places in the file. */
export class ScanFileError extends Error {
  readonly faults: Fault[];

  constructor(sentence: string, faults: Fault[] = []) {
    super(sentence);
    this.faults = faults;
  }
}
