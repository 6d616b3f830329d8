import { EQUATIONS, type Equation } from "#app/engine/equations.ts";
import { citation, SOURCES, type SourceId } from "#app/engine/sources.ts";
import type { Working } from "#app/engine/working.ts";
import { shortCitation } from "./short-citation.ts";

/**
 * A calculation with the words of its equation, as a screen shows it. Made on the server: the equations and the bibliography
 * together weigh more than a page.
 */
export interface ShownWorking extends Working {
  title: string;
  formula: string;
  /** note, range and caution in one paragraph */
  remark: string;
  sources: string[];
  from?: ShownWorking[];
}

/** Adds to a calculation, and to those that it rests on, what stands in the equations and in the bibliography. */
export function shownWorking(working: Working): ShownWorking {
  const { title, formula, range, caution, sources }: Equation = EQUATIONS[working.equation];
  return {
    equation: working.equation,
    title,
    formula,
    remark: [working.note, range, caution].filter(Boolean).join(" "),
    sources: sources.map(shortCitation),
    inputs: working.inputs.map(withSourceInWords),
    result: withSourceInWords(working.result),
    ...(working.note !== undefined && { note: working.note }),
    ...(working.from && { from: working.from.map(shownWorking) }),
  };
}

/** A line's source is a key of the bibliography, or the provenance of an input in words. */
function withSourceInWords(line: Working["result"]): Working["result"] {
  const { source } = line;
  return source !== undefined && source in SOURCES ? { ...line, source: citation(source as SourceId) } : line;
}
