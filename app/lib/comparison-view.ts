import type { AssessmentName, ComparedAssessment, ComparisonOffer } from "#app/schemas/assessment-comparison.ts";
import type { InputChange } from "#app/schemas/assessment-changes.ts";
import { alignSteps } from "./align.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { revisionLetters } from "./assessment-revision.ts";
import { movementSentence } from "./out-of-date-words.ts";
import { compareResults, movementOf, sameSlots, type AnswerSummary, type ComparisonRow } from "./result-comparison.ts";
import { warpCourse, type CourseStep, type CourseValue } from "./warp-course.ts";

/** An assessment that may be compared with. */
export interface ComparisonOption {
  id: string;
  label: string;
}

/** One half of a comparison: what it is called, and its answer. */
export interface ComparisonHalf extends AnswerSummary {
  id: string;
  /** short, for heads: 'Revision A', or the flow's name */
  name: string;
  /** 'TERN-A003, 2026-12-01' */
  document: string;
}

/** Both courses on one axis. */
export interface ComparedCourse {
  places: { tick: string; name: string }[];
  before: (CourseValue | null)[];
  after: (CourseValue | null)[];
  limits: CourseStep["limits"][];
  rolled: number[];
}

export interface ComparisonView {
  asked: { id: string; flow: { id: string; name: string }; name: string };
  sameFlow: ComparisonOption[];
  otherFlows: ComparisonOption[];
  chosen: {
    /** id of the one that was chosen */
    with: string;
    before: ComparisonHalf;
    after: ComparisonHalf;
    sentence: string;
    changes: InputChange[];
    engine: { from: string; to: string } | null;
    rows: ComparisonRow[];
    course: ComparedCourse;
  } | null;
}

/** Two assessments side by side, for their page. */
export function comparisonView({ asked, program, sameFlow, otherFlows, chosen }: ComparisonOffer): ComparisonView {
  const option = (each: AssessmentName): ComparisonOption => ({
    id: each.id,
    label: `${each.flow.id === asked.flow.id ? "" : `${each.flow.name}, `}${revision(each)}, ${each.createdAt.slice(0, 10)}, ${each.outcome}`,
  });
  return {
    asked: { id: asked.id, flow: asked.flow, name: revision(asked) },
    sameFlow: sameFlow.map(option),
    otherFlows: otherFlows.map(option),
    chosen: chosen && chosenView(chosen, asked.id, program.slug),
  };
}

const revision = ({ number }: AssessmentName) => `revision ${revisionLetters(number)}`;

function chosenView(
  { before, after, changes }: NonNullable<ComparisonOffer["chosen"]>,
  askedId: string,
  slug: string,
): NonNullable<ComparisonView["chosen"]> {
  const results = compareResults(before.result, after.result);
  const earlier = { ...before, result: sameSlots(before.result, after.result) };
  const sameFlow = before.flow.id === after.flow.id;
  const half = (each: ComparedAssessment, answer: AnswerSummary): ComparisonHalf => ({
    ...answer,
    id: each.id,
    name: sameFlow ? `Revision ${revisionLetters(each.number)}` : each.flow.name,
    document: `${recordNumber("assessment", slug, each.documentNumber)}, ${sameFlow ? "" : `${revision(each)}, `}${each.createdAt.slice(0, 10)}`,
  });
  return {
    with: before.id === askedId ? after.id : before.id,
    before: half(before, results.before),
    after: half(after, results.after),
    sentence: movementSentence(movementOf(before.result, after.result)),
    changes,
    engine:
      before.engineVersion === after.engineVersion ? null : { from: before.engineVersion, to: after.engineVersion },
    rows: results.rows,
    course: comparedCourse(earlier, after),
  };
}

/** Both courses, a place for each step of either; where both have the step, the limits are those of the later one. */
function comparedCourse(before: ComparedAssessment, after: ComparedAssessment): ComparedCourse {
  const [courseBefore, courseAfter] = [byNumber(before), byNumber(after)];
  const pairs = alignSteps(before.result.steps, after.result.steps).map((pair) => ({
    before: (pair.before && courseBefore.get(pair.before.number)) ?? null,
    after: (pair.after && courseAfter.get(pair.after.number)) ?? null,
  }));
  return {
    places: pairs.map((pair) => {
      const step = pair.after ?? pair.before;
      return { tick: `${step?.number ?? ""}`, name: `${step?.number ?? ""}, ${step?.title ?? ""}` };
    }),
    before: pairs.map((pair) => pair.before?.room ?? null),
    after: pairs.map((pair) => pair.after?.room ?? null),
    limits: pairs.map((pair) => (pair.after ?? pair.before)?.limits ?? { up: null, down: null }),
    rolled: pairs.flatMap((pair, index) => (pair.before?.rolled || pair.after?.rolled ? [index + 1] : [])),
  };
}

const byNumber = ({ result }: ComparedAssessment) => new Map(warpCourse(result).map((step) => [step.number, step]));
