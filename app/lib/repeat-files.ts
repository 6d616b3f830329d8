/** Files that a repeatability study takes. */
export const MOST_REPEAT_FILES = 20;

/** Largest of them, bytes and in words: some 100,000 points. */
export const REPEAT_FILE = { bytes: 2 * 1024 * 1024, words: "2\u00A0MB" } as const;
