/** What stands between columns, in words. */
export const DELIMITER_WORDS: Readonly<Record<string, string>> = {
  ",": "commas",
  ";": "semicolons",
  "\t": "tabs",
  "|": "upright bars",
  " ": "blanks",
};
