import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";

const require = createRequire(import.meta.url);

/** The subsets that the sheet is set in; a character that one lacks is taken from the next. */
export const FONT_SUBSETS = ["latin", "latin-ext", "greek"] as const;
export const FONT_WEIGHTS = [400, 600] as const;
type Subset = (typeof FONT_SUBSETS)[number];
type Weight = (typeof FONT_WEIGHTS)[number];

/** Path of a file of the typeface. */
export function fontFile(subset: Subset, weight: Weight, kind: "woff" | "woff2"): string {
  return require.resolve(`@fontsource/noto-sans/files/noto-sans-${subset}-${weight}-normal.${kind}`);
}

/** The rules of a style sheet that bring the typeface with them. */
export async function fontRules(): Promise<string> {
  const rules = FONT_WEIGHTS.flatMap((weight) => FONT_SUBSETS.map((subset) => fontRule(subset, weight)));
  return (await Promise.all(rules)).join("\n");
}

/** Which characters a browser takes from a subset, as the typeface's own style sheets say. */
const RANGES: Record<Subset, string> = {
  latin:
    "U+0000-00FF,U+0131,U+0152-0153,U+02BB-02BC,U+02C6,U+02DA,U+02DC,U+0304,U+0308,U+0329,U+2000-206F,U+20AC,U+2122,U+2191,U+2193,U+2212,U+2215,U+FEFF,U+FFFD",
  "latin-ext":
    "U+0100-02BA,U+02BD-02C5,U+02C7-02CC,U+02CE-02D7,U+02DD-02FF,U+0304,U+0308,U+0329,U+1D00-1DBF,U+1E00-1E9F,U+1EF2-1EFF,U+2020,U+20A0-20AB,U+20AD-20C0,U+2113,U+2C60-2C7F,U+A720-A7FF",
  greek: "U+0370-0377,U+037A-037F,U+0384-038A,U+038C,U+038E-03A1,U+03A3-03FF",
};

async function fontRule(subset: Subset, weight: Weight): Promise<string> {
  const bytes = await readFile(fontFile(subset, weight, "woff2"));
  const address = `data:font/woff2;base64,${bytes.toString("base64")}`;
  return `@font-face{font-family:"Noto Sans";font-weight:${weight};font-style:normal;src:url(${address}) format("woff2");unicode-range:${RANGES[subset]}}`;
}

/** The styles of the sheet, the same that its page in the browser has. */
export function sheetStyles(): Promise<string> {
  return readFile(require.resolve("#app/components/sheet/sheet-paper.css"), "utf8");
}
