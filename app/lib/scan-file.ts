import { fileSize } from "./file-size.ts";

/** Largest file of an instrument that is taken, bytes and in words: two million rows of position and height have some 40 MB. */
export const LARGEST_FILE = 48 * 1024 * 1024;
export const LARGEST_FILE_WORDS = "48\u00A0MB";
export const SCAN_FILE_LIMIT = { bytes: LARGEST_FILE, words: LARGEST_FILE_WORDS };
/** A larger one is not read on a request but by a job, bytes: this much takes some 50 ms. */
export const LARGEST_ON_REQUEST = 1024 * 1024;

/** What is said of a file beyond that. */
export function tooLargeSentence(name: string, size: number): string {
  return `${name} has ${fileSize(size)}; a file may have up to ${LARGEST_FILE_WORDS}. Export fewer points.`;
}
