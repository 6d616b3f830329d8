import type { ReactElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";

/** Colours of paper for the tokens of a drawing: a file has no style sheet to take them from. */
const PAPER: Record<string, string> = {
  raised: "#ffffff",
  surface: "#ffffff",
  quiet: "#3a3a3a",
  line: "#b5b5b5",
  edge: "#666666",
  wash: "#efefef",
  siwash: "#e4e4e4",
};
const INK = "#000000";

/** A drawing as a file of its own, as it prints. */
export function svgFile(drawing: ReactElement): string {
  const markup = renderToStaticMarkup(drawing);
  return `<?xml version="1.0" encoding="UTF-8"?>\n${markup.replace(/var\(--([a-z]+)\)/g, (_, token: string) => PAPER[token] ?? INK)}\n`;
}
