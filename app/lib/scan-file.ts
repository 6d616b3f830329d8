import { fileSize } from "./file-size.ts";

/** Largest profile that is taken, bytes and in words. */
export const LARGEST_FILE = 8 * 1024 * 1024;
export const LARGEST_FILE_WORDS = "8\u00A0MB";

/** What is said of a file beyond that. */
export function tooLargeSentence(name: string, size: number): string {
  return `${name} has ${fileSize(size)}; a file may have up to ${LARGEST_FILE_WORDS}. Export fewer points.`;
}
