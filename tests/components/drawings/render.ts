import type { ReactNode } from "react";
import { renderToStaticMarkup } from "react-dom/server";

/** Markup of a part as the server sends it. */
export function render(node: ReactNode): string {
  return renderToStaticMarkup(node);
}

/** All values of an attribute, in document order. */
export function attributes(markup: string, name: string): string[] {
  return [...markup.matchAll(new RegExp(` ${name}="([^"]*)"`, "g"))].map((match) => match[1] ?? "");
}

/** The text that a reader sees, tags taken out. */
export function words(markup: string): string {
  return markup
    .replace(/<[^>]+>/g, " ")
    .replace(/&#x27;/g, "'")
    .replace(/&amp;/g, "&")
    .replace(/\s+/g, " ")
    .trim();
}
