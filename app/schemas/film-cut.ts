import { z } from "zod";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { FILM_CUTS } from "#app/lib/film-cut.ts";
import { optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

/** Fields that say how a film is cut. A form without `cut` says it by the coverage alone. */
export const filmCutFields = {
  cut: z.enum(FILM_CUTS, "Choose how the film is cut.").optional(),
  coverage: optionalQuantity(RULES.coverage),
  lineWidth: optionalQuantity(RULES.lineWidth),
  lineDirection: optionalQuantity(RULES.lineDirection),
};

/** What of those fields may not have been understood. */
export interface TypedCut {
  cut?: (typeof FILM_CUTS)[number] | undefined;
  coverage?: number | null | undefined;
  lineWidth?: number | null | undefined;
  lineDirection?: number | null | undefined;
}

type Fail = (path: string[], message: string) => void;

/** Looks at the fields together: lines need all three, and what is typed must have something to belong to. */
export function checkFilmCut({ cut, coverage, lineWidth, lineDirection }: TypedCut, fail: Fail): void {
  const missing = (label: string) => `Type the ${label}. Blank is missing, not zero.`;
  if (cut === "lines") {
    if (coverage === null) fail(["coverage"], missing(RULES.coverage.label));
    if (lineWidth === null) fail(["lineWidth"], missing(RULES.lineWidth.label));
    if (lineDirection === null) fail(["lineDirection"], missing(RULES.lineDirection.label));
    return;
  }
  const only = "Only lines have it: leave it blank, or choose ‘Patterned in lines’.";
  if (typeof lineWidth === "number") fail(["lineWidth"], only);
  if (typeof lineDirection === "number") fail(["lineDirection"], only);
  if (cut === "alike" && coverage === null) fail(["coverage"], missing(RULES.coverage.label));
  if (cut === "whole" && typeof coverage === "number" && coverage < 1)
    fail(["coverage"], "A whole film covers 100 %: choose how it is patterned, or clear this.");
}

/** Lines as they are stored, of fields that have been checked. */
export function linesOf({ cut, lineWidth, lineDirection }: TypedCut): FilmLines | null {
  return cut === "lines" && typeof lineWidth === "number" && typeof lineDirection === "number"
    ? { width: lineWidth, direction: lineDirection }
    : null;
}
