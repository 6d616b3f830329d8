import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { flowFigures, type FlowFigures } from "#app/lib/flow-comparison/figures.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import { compute } from "../assessments/compute.ts";
import { inputHash } from "../assessments/input-hash.server.ts";

/** What was worked out of a flow, or why it could not be. */
export type FlowAnswer = { figures: FlowFigures; reason: null } | { figures: null; reason: string };

/** Answers that this process keeps: a flow takes some 200 ms to work out, and a comparison asks again at every change of its address. */
const MOST = 24;
const kept = new Map<string, FlowAnswer>();

/** The answer to an input, worked out once. Who may see the flow is checked before its input is put together. */
export function keptFlowAnswer(input: AssessmentInput): FlowAnswer {
  const key = `${ENGINE_VERSION} ${inputHash(input)}`;
  const known = kept.get(key) ?? answerOf(input);
  // The newest stand last.
  kept.delete(key);
  kept.set(key, known);
  const [oldest] = kept.keys();
  if (kept.size > MOST && oldest !== undefined) kept.delete(oldest);
  return known;
}

function answerOf(input: AssessmentInput): FlowAnswer {
  const computed = compute(input);
  if (computed.outcome === "not computable") {
    const { step, reason } = computed;
    return { figures: null, reason: step === null ? reason : `Step ${step}: ${reason}` };
  }
  try {
    return { figures: flowFigures(input.flow, computed.result), reason: null };
  } catch (error) {
    if (error instanceof EngineInputError) return { figures: null, reason: error.message };
    throw error;
  }
}
