import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { quantityText } from "./form-values.ts";
import { readQuantity, type QuantityRule, type ReadQuantity } from "./read-quantity.ts";

/** How a film covers the wafer: all of it, a pattern that bends both directions alike, or parallel lines. */
export const FILM_CUTS = ["whole", "alike", "lines"] as const;
export type FilmCut = (typeof FILM_CUTS)[number];

export const FILM_CUT_NAMES: Record<FilmCut, string> = {
  whole: "Whole film",
  alike: "Patterned, both directions alike",
  lines: "Patterned in lines",
};

/** How a film is cut, as stored: the share of the area that it covers, and its lines where it has a direction. */
export interface CutFilm {
  coverage: number;
  lines?: FilmLines | null;
}

/** The same as the text of its form fields. */
export interface FilmCutText {
  cut: string;
  coverage: string;
  lineWidth: string;
  lineDirection: string;
}

/** A film that is not cut, or one that is taken off. */
export const WHOLE: FilmCutText = { cut: "whole", coverage: "", lineWidth: "", lineDirection: "" };

const cutOf = ({ coverage, lines }: CutFilm): FilmCut => (lines ? "lines" : coverage < 1 ? "alike" : "whole");

export function filmCutText(film: CutFilm): FilmCutText {
  const cut = cutOf(film);
  if (cut === "whole") return WHOLE;
  return {
    cut,
    coverage: quantityText(film.coverage, "fraction", "%"),
    lineWidth: quantityText(film.lines?.width, "length", "µm"),
    lineDirection: quantityText(film.lines?.direction, "angle", "°"),
  };
}

/** Direction of lines in words; x, 0°, is the notch axis, seen from the device side. */
export function directionWords(direction: number): string {
  const degrees = Math.round((direction * 180e9) / Math.PI) / 1e9;
  if (degrees % 180 === 0) return "along the notch axis";
  if (degrees % 90 === 0) return "across the notch axis";
  return `at ${formatQuantity(direction, "angle", { unit: "°", significant: 3, trim: true })} to the notch axis`;
}

/** How a film is cut: '35 %', '35 % in lines 10 µm wide, across the notch axis'; null for a whole film. */
export function filmCutWords({ coverage, lines }: CutFilm): string | null {
  const share = formatQuantity(coverage, "fraction", { unit: "%" });
  if (!lines) return coverage < 1 ? share : null;
  const width = formatQuantity(lines.width, "length", { significant: 3, trim: true });
  return `${share} in lines ${width} wide, ${directionWords(lines.direction)}`;
}

/** Parts of a cut that can be wrong by themselves. */
type CutPart = "coverage" | "lineWidth" | "lineDirection";

const PARTS: Record<CutPart, QuantityRule> = {
  coverage: RULES.coverage,
  lineWidth: RULES.lineWidth,
  lineDirection: RULES.lineDirection,
};

/** What the fields say, null where something is missing or wrong: `fault` has been told of each such part. */
export function readFilmCut(text: FilmCutText, fault: (part: CutPart, read: ReadQuantity) => void): CutFilm | null {
  if (text.cut === "whole") return { coverage: 1, lines: null };
  const read = (part: CutPart) => {
    const answer = readQuantity(text[part], PARTS[part]);
    if (answer.ok) return answer.value;
    fault(part, answer);
    return null;
  };
  const coverage = read("coverage");
  if (text.cut !== "lines") return coverage === null ? null : { coverage, lines: null };
  const [width, direction] = [read("lineWidth"), read("lineDirection")];
  return coverage === null || width === null || direction === null ? null : { coverage, lines: { width, direction } };
}
