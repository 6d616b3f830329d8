import type { ReactElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { onPaper } from "#app/lib/paper-tokens.ts";

/** A drawing as a file of its own, as it prints. */
export function svgFile(drawing: ReactElement): string {
  const markup = renderToStaticMarkup(drawing);
  return `<?xml version="1.0" encoding="UTF-8"?>\n${markup.replace(/var\(--([a-z-]+)\)/g, (_, token: string) => onPaper(token))}\n`;
}
