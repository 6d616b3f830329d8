import type { CrossingWords } from "#app/schemas/comparison.ts";
import type { ComparedCourseLine } from "#app/schemas/flow-comparison.ts";
import { micrometres } from "../assessment-figure.ts";
import { count } from "../count-words.ts";
import type { CourseValue } from "../warp-course.ts";

type Line = Pick<ComparedCourseLine, "letter" | "values">;

/** A place, from 1, at which two flows have changed places since the last one that both have a warp at. */
interface Change {
  place: number;
  leads: "first" | "second";
  first: number;
  second: number;
}

/** Two warps are alike from this share of the larger on, or below this size, m, or where their uncertainties cover what parts them. */
const ALIKE = 1e-6;
const NOTHING = 1e-9;

const PRINTED = 3;

/**
 * Which of two flows warps more at the steps that both have: where they part from being alike, and where they change places. Sizes
 * alone, whichever way the edges lie; a difference that their expanded uncertainties cover tells neither from the other.
 * @returns null when they have no step in common at which both have a warp
 */
export function stepCourse(first: Line["values"], second: Line["values"]) {
  const shared = first.flatMap((value, index) => {
    const other = second[index] ?? null;
    return value && other ? [{ place: index + 1, ...sizes(value, other) }] : [];
  });
  if (shared.length === 0) return null;
  const apart = shared.filter((at) => !alike(at));
  const changes: Change[] = apart.flatMap((at, n) => {
    const before = apart[n - 1];
    const leads = leader(at);
    return before && leader(before) !== leads ? [{ ...at, leads }] : [];
  });
  return { shared, parts: apart[0] ?? null, changes };
}

const sizes = (first: CourseValue, second: CourseValue) => ({
  first: Math.abs(first.warp),
  second: Math.abs(second.warp),
  covered: Math.hypot(first.uncertainty, second.uncertainty),
});
const alike = ({ first, second, covered }: ReturnType<typeof sizes>) =>
  Math.abs(first - second) <= Math.max(NOTHING, ALIKE * Math.max(first, second), covered);
const leader = ({ first, second }: { first: number; second: number }) => (first > second ? "first" : "second");

/** Every two flows in words, and the numbered places of the chart at which they have changed places. */
export function stepCrossings(
  lines: readonly Line[],
  nameOf: (place: number) => string,
): { marks: { x: number; y: number; number: number }[]; words: CrossingWords[] } {
  const marks: { x: number; y: number; number: number }[] = [];
  const words = lines.flatMap((first, n) =>
    lines.slice(n + 1).map((second): CrossingWords => {
      const course = stepCourse(first.values, second.values);
      const numbered = (course?.changes ?? []).map((change, index) => ({
        ...change,
        number: marks.length + index + 1,
      }));
      for (const { place, leads, number } of numbered) {
        const line = leads === "first" ? first : second;
        marks.push({ x: place, y: line.values[place - 1]?.warp ?? 0, number });
      }
      return {
        key: `${first.letter}${second.letter}`,
        numbers: numbered.map(({ number }) => number),
        sentence: courseSentence(first.letter, second.letter, course, nameOf),
      };
    }),
  );
  return { marks, words };
}

function courseSentence(
  first: string,
  second: string,
  course: ReturnType<typeof stepCourse>,
  nameOf: (place: number) => string,
): string {
  const both = `${first} and ${second}`;
  if (!course) return `${both} have no step in common at which both lie with a warp of their own.`;
  const { shared, parts, changes } = course;
  const steps = shared.length === 1 ? "the one step" : `all ${count(shared.length)} steps`;
  if (!parts) return `${both} warp alike at ${steps} that both have, within their uncertainties.`;
  const same = shared[0]?.place === parts.place ? "" : `alike before ${nameOf(parts.place)}; `;
  const at = (change: { place: number; first: number; second: number }) => {
    const most = Math.max(change.first, change.second);
    const least = Math.min(change.first, change.second);
    return `${nameOf(change.place)} (${micrometres(most)} against ${micrometres(least)})`;
  };
  const more = (leads: "first" | "second") => (leads === "first" ? first : second);
  const leads = more(leader(parts));
  if (changes.length === 0)
    return `${both}: ${same}from ${at(parts)} on ${leads} warps more wherever they differ by more than their uncertainties.`;
  const said = changes.slice(0, PRINTED).map((change) => `from ${at(change)} on ${more(change.leads)}`);
  const rest = changes.length - said.length;
  const others = rest > 0 ? `, and ${count(rest)} times more` : "";
  return `${both}: ${same}${leads} warps more from ${at(parts)} on; they change places: ${said.join(", ")}${others}.`;
}
