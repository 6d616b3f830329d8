import { Font } from "@react-pdf/renderer";
import { FONT_SUBSETS, FONT_WEIGHTS, fontFile } from "./sheet-fonts.server.ts";

const family = (subset: string) => `Noto Sans ${subset}`;

/** In this order: a character that a subset lacks is taken from the next. */
export const FONT_FAMILIES = FONT_SUBSETS.map(family);

let registered = false;

/** Makes the typeface known to the renderer, once; words are never parted. */
export function registerFonts(): void {
  if (registered) return;
  registered = true;
  for (const subset of FONT_SUBSETS)
    Font.register({
      family: family(subset),
      fonts: FONT_WEIGHTS.map((fontWeight) => ({ src: fontFile(subset, fontWeight, "woff"), fontWeight })),
    });
  Font.registerHyphenationCallback((word) => [word]);
}
