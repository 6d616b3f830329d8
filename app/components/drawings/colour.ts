/** Tokens of app.css that a drawing may use. */
export type ColourToken =
  | "surface"
  | "raised"
  | "ink"
  | "quiet"
  | "copper"
  | "silicon"
  | "clear"
  | "caution"
  | "need"
  | "stop"
  | "line"
  | "edge"
  | "wash"
  | "siwash";

/** Value of a fill or stroke attribute: always a token, so that dark, paper and forced colours follow by themselves. */
export function colour(token: ColourToken): string {
  return `var(--${token})`;
}
