import type { AssessedStep, JudgedFlow } from "./judge.ts";
import type { FlowInput } from "./model.ts";
import { inSentence } from "../in-sentence.ts";
import { slotsInWords } from "./legs.ts";
import { supportRank, type SupportClass } from "../vocabulary.ts";

/** Steps in a row that need the same support, by number. */
export interface SupportSpan {
  support: SupportClass;
  from: number;
  to: number;
}

/** The support needed along the flow, neighbours with the same need joined; steps that the wafer skips are none. */
export function supportSpans(steps: AssessedStep[]): SupportSpan[] {
  const spans: SupportSpan[] = [];
  for (const { state, required } of steps) {
    if (state.step.skipped) continue;
    const last = spans.at(-1);
    const support = required ?? "none fits";
    if (last && last.support === support) last.to = state.number;
    else spans.push({ support, from: state.number, to: state.number });
  }
  return spans;
}

/** The step that comes nearest to, or farthest beyond, its tool's warp limit. */
export function tightestStep({ findings }: Pick<JudgedFlow, "findings">) {
  const warps = findings.filter(({ rule, limit, figures }) => rule === 2 && limit && figures[0]);
  const use = (finding: (typeof warps)[number]) =>
    (finding.figures[0]?.value ?? 0) / (finding.limit?.value ?? Infinity);
  return warps.reduce<(typeof warps)[number] | null>(
    (most, next) => (!most || use(next) > use(most) ? next : most),
    null,
  );
}

/**
 * The answer in plain words: one sentence on support, one on what decides. The first is what a technician needs, the second
 * what an engineer asks next. Of a leg of a flow that parts by slot it names the slots; of the flow itself it is that of
 * the worst leg, with the verdicts of the others last.
 */
export function answerSentences(flow: FlowInput, assessment: JudgedFlow): string[] {
  const slots = assessment.slots ?? flow.leg?.slots;
  const [first = "", ...rest] = sentencesOf(flow, assessment);
  if (!slots) return [first, ...rest];
  const others = (assessment.legs ?? []).filter((leg) => leg.slots !== slots);
  const verdicts = others.map((leg) => `${slotsInWords(leg.slots)}: ${leg.verdict.outcome}`);
  return [
    `${sentence(slotsInWords(slots))}: ${inSentence(first)}`,
    ...rest,
    ...(verdicts.length > 0 ? [finish("", sentence(verdicts.join("; ")))] : []),
  ];
}

function sentencesOf(flow: FlowInput, assessment: JudgedFlow): string[] {
  const { verdict, findings } = assessment;
  const blocking = findings.find(
    ({ outcome, step, rule }) => outcome === verdict.outcome && step === verdict.step && rule === verdict.rule,
  );
  const support = supportSentence(flow, assessment);
  if (verdict.outcome === "clear" || verdict.outcome === "caution") {
    const tightest = tightestSentence(assessment);
    const cautions = cautionSentence(assessment);
    return [support, tightest, cautions].filter((sentence) => sentence !== null);
  }
  return blocking
    ? [support, `Step ${blocking.step}, ${flow.steps[blocking.step - 1]?.title ?? ""}: ${blocking.reason}`]
    : [support];
}

function supportSentence(flow: FlowInput, { steps, verdict }: JudgedFlow): string {
  const spans = supportSpans(steps).filter(({ support }) => support !== "bare");
  const planned = verdict.outcome === "clear" || verdict.outcome === "caution";
  const opening =
    verdict.outcome === "clear" ? "Clear as planned: " : verdict.outcome === "caution" ? "Runs with cautions: " : "";
  if (spans.length === 0) return finish(opening, planned ? "no step needs support" : "No step needs support");
  const parts = spans.map(({ support, from, to }) => {
    const title = inSentence(flow.steps[from - 1]?.title ?? "");
    return from === to
      ? `${support} at step ${from}, ${title}`
      : `${support} from step ${from}, ${title}, to step ${to}`;
  });
  const strongest = spans.some(({ support }) => supportRank(support) >= supportRank("none fits"));
  return finish(opening, opening || strongest ? parts.join("; ") : `Needs ${parts.join("; ")}`);
}

const sentence = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

const finish = (opening: string, rest: string) => `${opening}${rest}.`;

/** Which steps have to be signed. */
function cautionSentence({ findings }: JudgedFlow): string | null {
  const steps = [...new Set(findings.filter(({ outcome }) => outcome === "caution").map(({ step }) => step))];
  if (steps.length === 0) return null;
  const last = steps.at(-1);
  return steps.length === 1
    ? `Caution at step ${last}.`
    : `Cautions at steps ${steps.slice(0, -1).join(", ")} and ${last}.`;
}

function tightestSentence(assessment: JudgedFlow): string | null {
  const tightest = tightestStep(assessment);
  if (!tightest) return null;
  return `Tightest: step ${tightest.step}, ${inSentence(tightest.reason)}`;
}
