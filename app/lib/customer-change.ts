import type { TitleBlockFields } from "#app/components/drawings/TitleBlock.tsx";
import type { Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import type { InputChange } from "#app/schemas/assessment-changes.ts";
import type { ChangeReach, ChangeSubject, TouchedFlow } from "#app/schemas/change-request.ts";
import type { AnswerSummary, ComparedStep, ComparisonRow } from "./result-comparison.ts";
import { movementSentence } from "./out-of-date-words.ts";
import { SITE_NAME } from "./site.ts";
import { stepsInWords } from "./step-numbers.ts";

/** A verdict as a customer may see it: shares of a limit, never the limit. */
export interface CustomerAnswer {
  outcome: Outcome;
  where: string | null;
  tightest: string | null;
}

interface CustomerStep {
  outcome: Outcome;
  support: SupportClass;
}

export interface CustomerFlow {
  id: string;
  name: string;
  /** what becomes of it in the flow's inputs; nothing of what is the site's own */
  inputs: { key: string; what: string; before: string; after: string }[];
  /** why it cannot be computed with the change; null when it can */
  reason: string | null;
  before: CustomerAnswer | null;
  after: CustomerAnswer | null;
  steps: { key: string; step: string; before: CustomerStep | null; after: CustomerStep | null }[];
  moreSteps: number;
}

/** A change as one page for the customer of a program. */
export interface CustomerChange {
  question: string;
  flows: CustomerFlow[];
  more: number;
  cautions: string;
  titleBlock: TitleBlockFields;
}

/** What one page holds. */
const FLOWS = 4;
const STEPS = 6;
const INPUTS = 3;

/** A change for one program's customer. Values of limits and of tools are the site's own and are left out of the question. */
export function customerChange(
  { touched, more }: ChangeReach,
  {
    question,
    kind,
    program,
    preparedBy,
    date,
  }: {
    question: string;
    kind: ChangeSubject["kind"];
    program: string;
    preparedBy: string;
    date: string;
  },
): CustomerChange {
  return {
    question: isOwn(kind) ? "A handling limit of the site changes" : question,
    flows: touched.slice(0, FLOWS).map((flow) => customerFlow(flow, kind)),
    more: more + Math.max(0, touched.length - FLOWS),
    cautions:
      "Estimates support, never replace, qualified process engineering and the site’s own procedures and safety rules.",
    titleBlock: {
      owner: SITE_NAME,
      documentType: "Change request",
      title: `Program ${program}`,
      prepared: preparedBy,
      checked: "not yet",
      released: "not yet",
      number: "–",
      revision: "–",
      status: "Draft",
      date,
      language: "en",
      page: "1 of 1",
    },
  };
}

function customerFlow({ id, name, movement, changes }: TouchedFlow, kind: ChangeSubject["kind"]): CustomerFlow {
  const inputs = isOwn(kind) ? [] : changes.slice(0, INPUTS).map(customerInput);
  if (movement.outcome === "not computable")
    return { id, name, inputs, reason: movementSentence(movement), before: null, after: null, steps: [], moreSteps: 0 };
  const { before, after, moved } = movement;
  return {
    id,
    name,
    inputs,
    reason: null,
    before: customerAnswer(before),
    after: customerAnswer(after),
    steps: moved.slice(0, STEPS).map(customerStep),
    moreSteps: Math.max(0, moved.length - STEPS),
  };
}

/** Limits and what tools take are the site's own. */
const isOwn = (kind: ChangeSubject["kind"]) => kind === "limit" || kind === "equipment";

const customerInput = ({ subject, property, from, to, steps }: InputChange): CustomerFlow["inputs"][number] => ({
  key: `${subject} ${property} ${steps.join(" ")}`,
  what: `${subject}, ${property.charAt(0).toLowerCase()}${property.slice(1)}${steps.length > 0 ? `, ${stepsInWords(steps)}` : ""}`,
  before: from,
  after: to,
});

const customerAnswer = ({ outcome, where, tightest }: AnswerSummary): CustomerAnswer => ({
  outcome,
  where,
  tightest: tightest && `step ${tightest.step}, ${tightest.title}: share ${tightest.share}`,
});

function customerStep({ before, after }: ComparisonRow): CustomerFlow["steps"][number] {
  const step = after ?? before;
  const side = (each: ComparedStep | null) => each && { outcome: each.outcome, support: each.required };
  return {
    key: `${before?.number} ${after?.number}`,
    step: `Step ${step?.number ?? ""}, ${step?.title ?? ""}`,
    before: side(before),
    after: side(after),
  };
}
