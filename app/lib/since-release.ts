import { revisionLetters } from "./assessment-revision.ts";
import { compareResults, sameSlots, type ComparisonRow } from "./result-comparison.ts";
import { stepNumbers } from "./step-numbers.ts";
import type { InputChange } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";

/** What is different from the last released revision, for who checks the next one. */
export interface SinceRelease {
  /** letter of the last released revision */
  letter: string;
  assessmentId: string;
  changes: InputChange[];
  engine: { from: string; to: string } | null;
  /** steps whose finding, support, silicon or warp differs */
  rows: ComparisonRow[];
  before: string[];
  after: string[];
}

interface Half {
  id: string;
  engineVersion: string;
  result: AssessmentResult;
}

/** @param changes what differs in the inputs, as `inputChanges` finds it */
export function sinceRelease(number: number, last: Half, now: Half, changes: InputChange[]): SinceRelease {
  const { rows, before, after } = compareResults(last.result, now.result);
  return {
    letter: revisionLetters(number),
    assessmentId: last.id,
    changes,
    engine: last.engineVersion === now.engineVersion ? null : { from: last.engineVersion, to: now.engineVersion },
    rows: rows.filter(({ differs, difference }) => differs || (difference !== null && difference !== "0")),
    before: before.sentences,
    after: after.sentences,
  };
}

const MOST = 3;
const LONGEST = 160;

/** The same in at most three lines, for paper: what was changed, where it tells, and the answer where that moves. */
export function changesInLines(last: Half, now: Half, changes: readonly InputChange[]): string[] {
  const lines: string[] = [];
  const subjects = [...new Set(changes.map(({ subject, property }) => `${subject}: ${property.toLowerCase()}`))];
  if (subjects.length > 0) lines.push(`Changed: ${listed(subjects)}.`);
  if (last.engineVersion !== now.engineVersion)
    lines.push(`Computed anew with engine ${now.engineVersion}, before ${last.engineVersion}.`);
  const moved = compareResults(sameSlots(last.result, now.result), now.result).rows.filter(({ differs }) => differs);
  const steps = moved.flatMap(({ after }) => (after ? [after.number] : []));
  if (steps.length > 0) lines.push(`Support, silicon or finding differs at step ${stepNumbers(steps)}.`);
  const gone = moved.filter(({ after }) => after === null).length;
  if (gone > 0) lines.push(`${gone === 1 ? "One step is" : `${gone} steps are`} no longer there.`);
  if (lines.length === 0) lines.push("The same steps and support as before.");
  return lines
    .slice(0, MOST)
    .map((line) => (line.length > LONGEST ? `${line.slice(0, LONGEST - 1).trimEnd()}…` : line));
}

/** The first few by name, the rest by their count. */
function listed(words: readonly string[]): string {
  const shown = words.slice(0, 3);
  const rest = words.length - shown.length;
  return `${shown.join(", ")}${rest > 0 ? ` and ${rest} more` : ""}`;
}
