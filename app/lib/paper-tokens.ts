/** What the tokens of a drawing are on paper, for files that have no style sheet to take them from. */
const PAPER_TOKENS: Record<string, string> = {
  surface: "#ffffff",
  raised: "#ffffff",
  quiet: "#3a3a3a",
  line: "#b5b5b5",
  edge: "#666666",
  wash: "#efefef",
  siwash: "#e4e4e4",
  "bow-device-weight": "0.6",
  "bow-carrier-weight": "0.6",
  "bow-carrier-fill": "#ffffff",
};
const INK = "#000000";

/** A token's value on paper; all colours that are not named are ink. */
export function onPaper(token: string): string {
  return PAPER_TOKENS[token] ?? INK;
}
