import type { Finding } from "#app/engine/rules/finding.ts";
import { outcomeRank, type Outcome } from "#app/engine/vocabulary.ts";
import { legQuery } from "./leg-query.ts";
import { figureText } from "./assessment-figure.ts";

/** A figure of a finding as text; `working` is the path of the calculation behind it, null where it was read. */
export interface FigureView {
  label: string;
  value: string;
  working: string | null;
}

/** A finding without its workings, as a page shows it. */
export interface FindingView {
  /** its place among all findings of the assessment, which addresses name */
  index: number;
  rule: number;
  title: string;
  step: number;
  outcome: Outcome;
  reason: string;
  figures: FigureView[];
  limit: string | null;
  remedy: string | null;
}

/** Where in the stored assessments something stands. */
export interface ResultPlace {
  assessmentId: string;
  /** number of the leg, of a flow that parts by slot */
  leg: number | null;
}

/** Address of the working behind a figure of a finding. */
export function figureWorkingPath({ assessmentId, leg }: ResultPlace, finding: number, figure: number): string {
  return `/assessments/${assessmentId}/working?finding=${finding}&figure=${figure}${legQuery("&", leg)}`;
}

/** A finding as a page shows it. */
export function findingView(place: ResultPlace, finding: Finding, index: number): FindingView {
  const { rule, title, step, outcome, reason, figures, limit, remedy } = finding;
  return {
    index,
    rule,
    title,
    step,
    outcome,
    reason,
    figures: figures.map((figure, at) => ({
      label: figure.label,
      value: figureText(figure),
      working: figure.working ? figureWorkingPath(place, index, at) : null,
    })),
    limit: limit && `${limit.label}: ${figureText(limit)} (${limit.source})`,
    remedy,
  };
}

/** Worst first; rules keep their order otherwise. */
export function bySeverity(a: Pick<Finding, "outcome">, b: Pick<Finding, "outcome">): number {
  return outcomeRank(b.outcome) - outcomeRank(a.outcome);
}

/** What a rule is about, in the few words that a table's cell has room for. */
const SUBJECTS: Record<number, string> = {
  1: "thickness",
  2: "warp",
  3: "curling",
  4: "holding flat",
  5: "sag",
  6: "bonding material",
  7: "carrier",
  8: "debond",
  9: "cover and variation",
  10: "edge",
  11: "film heat",
  12: "order",
  13: "stress source",
  14: "validity",
  15: "incoming",
  16: "tape",
  17: "clocks",
  18: "contact",
};

/** A finding in a table's cell: 'rule 2, 86 % of limit'. */
export function findingNote({ rule, title, limit, figures }: Finding): string {
  const share = rule === 2 && limit && figures[0] ? (100 * figures[0].value) / limit.value : null;
  const subject = share === null ? (SUBJECTS[rule] ?? title.toLowerCase()) : `${Math.round(share)}\u00A0% of limit`;
  return `rule\u00A0${rule}, ${subject}`;
}
