const UNITS = "(?:µm|nm|mm|cm|m|°C|K|ppm(?:/K)?|MPa|GPa|Pa|N/m|N|s|min|h|d|%|1/m|/m)";
const VALUE_AND_UNIT = new RegExp(`(\\d) (?=(${UNITS})(?![\\p{L}\\d]))`, "gu");
/** Units that a reader may have in others. */
const REWRITTEN = new Set(["µm", "MPa", "GPa", "°C"]);
const NO_BREAK_SPACE = "\u00a0";
/** Takes no room. Before a no-break space it says that an ordinary one was written there. */
const WRITTEN = "\ufeff";

/**
 * Ties a value to its unit and both sides of ± together, so that neither ever wraps apart from its number. What was written with an
 * ordinary space, such as the name of a step, stays apart from a figure of ours: it is not put into the reader's own units.
 */
export function noBreak(text: string): string {
  return text
    .replace(
      VALUE_AND_UNIT,
      (_, digit: string, unit: string) => `${digit}${REWRITTEN.has(unit) ? WRITTEN : ""}${NO_BREAK_SPACE}`,
    )
    .replace(/ ± /g, `${NO_BREAK_SPACE}±${NO_BREAK_SPACE}`)
    .replace(/(\bstep|\bsteps) (?=\d)/g, `$1${NO_BREAK_SPACE}`);
}

/** The same for a text that nobody reads in units of their own, such as that of a document: nothing but no-break spaces. */
export function tieUnits(text: string): string {
  return noBreak(text).replaceAll(WRITTEN, "");
}
