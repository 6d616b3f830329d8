import { randomUUID } from "node:crypto";
import { setImmediate } from "node:timers/promises";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { waferAnswer } from "#app/lib/lot-answers.ts";
import { expectedShare, type ExpectedShare } from "#app/lib/lot-expected.ts";
import { bowOnReceipt, withLot } from "#app/lib/lot-input.ts";
import { lotFault } from "#app/lib/lot-words.ts";
import { answerSummary, movementOf, type AnswerSummary } from "#app/lib/result-comparison.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentInput, Movement } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { LotInput, LotRecord } from "#app/schemas/lot.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { findAssessment, nextNumbers } from "./assessments.server.ts";
import { compute, type NotComputable } from "./compute.ts";
import { inputHash } from "./input-hash.server.ts";
import { isOutOfDate } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";

/** What the page of a lot starts from: the assessment, and what its flow expects of what comes in. */
export interface LotPage {
  id: string;
  number: number;
  documentNumber: number;
  program: { name: string; slug: string };
  flow: { id: string; name: string };
  outOfDate: boolean;
  mayKeep: boolean;
  before: AnswerSummary;
  /** of any lot, from the tolerances alone; null where nothing can be said */
  expected: ExpectedShare | null;
  /** standard bow and thickness that it was assessed for, m; the bow null where there is none to tell */
  assessedFor: { bow: number | null; thickness: number };
  /** the flow has a limit for the warp that a lot comes in with */
  asksWarp: boolean;
}

type Found = Awaited<ReturnType<typeof findAssessment>>;

/** The assessment of a flow, which a lot can be tried on; refused for one that is of a lot already. */
async function findOfFlow(em: EntityManager, scope: ActorScope, id: string | undefined): Promise<Found> {
  const assessment = await findAssessment(em, scope, id);
  if (assessment.lot)
    throw problem(409, "This assessment is of one lot already. Try another lot on the assessment that it is of.");
  return assessment;
}

/** The page for trying a lot; refused to whom the program's work is not open. */
export async function lotPage(scope: ActorScope, assessmentId: string | undefined): Promise<LotPage> {
  return inScope(scope, async (em) => {
    const assessment = await findOfFlow(em, scope, assessmentId);
    const { id, number, documentNumber, program, flow, flowName, engineVersion, inputHash: hash } = assessment;
    const input = assessment.input.$;
    const present = await presentFlow(em, scope, flow.id);
    return {
      id,
      number,
      documentNumber,
      program: { name: program.name, slug: program.slug },
      flow: { id: flow.id, name: flowName },
      outOfDate: isOutOfDate({ engineVersion, inputHash: hash, input }, present.input),
      mayKeep: mayInProgram(scope.actor, "run assessments", program.id),
      before: answerSummary(assessment.result),
      expected: expectedShare(input.flow, assessment.result),
      assessedFor: { bow: bowOf(input), thickness: input.flow.wafer.thickness.value },
      asksWarp: Boolean(input.flow.gate?.warp),
    };
  });
}

function bowOf(input: AssessmentInput): number | null {
  try {
    return bowOnReceipt(input);
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

/** A lot tried on an assessment; nothing of it is stored. */
export interface LotTrial {
  outcome: "computed";
  lot: LotInput;
  summary: AnswerSummary;
  movement: Movement;
  answers: LotRecord["answers"];
}

/** Why there is nothing: a figure of the lot that no flow comes of, or what cannot be computed with it. */
export type LotRefused = NotComputable | { outcome: "refused"; field: "bow" | "thickness" | "wafers"; reason: string };

interface Assessed {
  outcome: "computed";
  input: AssessmentInput;
  result: AssessmentResult;
  answers: LotRecord["answers"];
}

/** The engine's answer for a lot: the flow with its mean figures, then each wafer by itself. */
async function assessLot(input: AssessmentInput, lot: LotInput): Promise<Assessed | LotRefused> {
  let own: AssessmentInput;
  try {
    own = withLot(input, lot);
  } catch (error) {
    if (error instanceof EngineInputError) return { outcome: "refused", ...lotFault(error, lot) };
    throw error;
  }
  const computed = compute(own);
  if (computed.outcome === "not computable") return computed;
  const answers: LotRecord["answers"] = [];
  for (const wafer of lot.wafers) {
    // Others are served between two wafers.
    await setImmediate();
    answers.push(waferAnswer(input, lot, wafer));
  }
  return { outcome: "computed", input: own, result: computed.result, answers };
}

/** The stored answer of the flow, or what this engine makes of its input where another one made it. */
function beforeOf({ engineVersion, result, input }: Found): AssessmentResult {
  if (engineVersion === ENGINE_VERSION) return result;
  const computed = compute(input.$);
  return computed.outcome === "computed" ? computed.result : result;
}

/** The steps that are judged differently: another thickness that comes in is no such change. */
function judgedAnew(movement: Movement): Movement {
  if (movement.outcome !== "computed") return movement;
  const moved = movement.moved.filter(
    ({ before, after }) =>
      before?.outcome !== after?.outcome || before?.required !== after?.required || before?.heldBy !== after?.heldBy,
  );
  return { ...movement, moved };
}

/** Assesses a lot with its own figures on everything else that the assessment rests on, and stores nothing. */
export async function tryLot(
  scope: ActorScope,
  assessmentId: string | undefined,
  lot: LotInput,
): Promise<LotTrial | LotRefused> {
  const found = await inScope(scope, (em) => findOfFlow(em, scope, assessmentId));
  const assessed = await assessLot(found.input.$, lot);
  if (assessed.outcome !== "computed") return assessed;
  return {
    outcome: "computed",
    lot,
    summary: answerSummary(assessed.result),
    movement: judgedAnew(movementOf(beforeOf(found), assessed.result)),
    answers: assessed.answers,
  };
}

/** Stores a lot's assessment, for ever: it is of the flow's assessment and no revision. Returns its id. */
export async function keepLot(
  scope: ActorScope,
  assessmentId: string | undefined,
  lot: LotInput,
): Promise<{ outcome: "stored"; id: string } | LotRefused> {
  return inScope(scope, async (em) => {
    const of = await findOfFlow(em, scope, assessmentId);
    const { flow, program } = of;
    requireInProgram(scope, "run assessments", program.id, "assessment");
    const assessed = await assessLot(of.input.$, lot);
    if (assessed.outcome !== "computed") return assessed;
    const { input, result, answers } = assessed;
    const { documentNumber } = await nextNumbers(em, { id: flow.id, program });
    const created = em.create(Assessment, {
      id: randomUUID(),
      program: program.id,
      flow: flow.id,
      number: of.number,
      lotNumber: (await em.count(Assessment, { flow: flow.id, lotNumber: { $gt: 0 } })) + 1,
      documentNumber,
      flowName: of.flowName,
      engineVersion: ENGINE_VERSION,
      inputHash: inputHash(input),
      input,
      result,
      lot: { ...lot, of: { id: of.id, number: of.number, documentNumber: of.documentNumber }, answers },
      outcome: result.verdict.outcome,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored", id: created.id };
  });
}
