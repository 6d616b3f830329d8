import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { FlowRevision } from "#app/db/entities/flow-revision.ts";
import type { Flow } from "#app/db/entities/flow.ts";
import { historyPosition } from "#app/lib/flow-history.ts";
import type { FlowHistory, FlowPlan, RevisionKind, StepPlan } from "#app/schemas/flow-plan.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const LINES_SHOWN = 30;

type Line = Pick<FlowRevision, "number" | "kind" | "words" | "flowVersion" | "createdAt" | "createdBy">;

const LINE = ["number", "kind", "words", "flowVersion", "createdAt", "createdBy.name"] as const;

/** The changes of a flow without their plans, oldest first. */
async function linesOf(em: EntityManager, flowId: string): Promise<Line[]> {
  return em.find(
    FlowRevision,
    { flow: flowId },
    { fields: LINE, populate: ["createdBy"], orderBy: { number: "asc" } },
  ) as Promise<Line[]>;
}

const lowerFirst = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);

/** What can be taken back and done again, and the newest changes. */
export async function flowHistory(em: EntityManager, flowId: string): Promise<FlowHistory> {
  const lines = await linesOf(em, flowId);
  const { now, before, after } = historyPosition(lines);
  const wordsOf = (number: number | null) => {
    const line = lines.find((each) => each.number === number);
    return line ? lowerFirst(line.words) : null;
  };
  return {
    undo: before === null ? null : wordsOf(now),
    redo: wordsOf(after),
    lines: lines
      .slice(-LINES_SHOWN)
      .toReversed()
      .map(({ number, kind, words, createdAt, createdBy }) => ({
        number,
        kind,
        words,
        by: createdBy?.name ?? "Planeward",
        at: createdAt.toISOString(),
      })),
  };
}

/** What was done to a flow after the version that somebody had opened, in order. */
export async function changesSince(em: EntityManager, flowId: string, version: number): Promise<string[]> {
  const since = await em.find(
    FlowRevision,
    { flow: flowId, flowVersion: { $gt: version } },
    { fields: ["words"], orderBy: { number: "asc" } },
  );
  return since.map(({ words }) => words);
}

interface NewRevision {
  kind: RevisionKind;
  words: string;
  /** the flow as it was: noted first when this is the first change since revisions are kept */
  before: FlowPlan;
  /** null where an earlier plan is put back */
  plan: FlowPlan | null;
}

/** Notes a change, in the flush that makes it. The flow's version moves on by one with that flush. */
export async function addRevision(
  em: EntityManager,
  scope: ActorScope,
  flow: Flow,
  revision: NewRevision,
): Promise<void> {
  const [newest] = await em.find(
    FlowRevision,
    { flow: flow.id },
    { fields: ["number"], orderBy: { number: "desc" }, limit: 1 },
  );
  const base = { program: flow.program, flow };
  if (!newest)
    em.create(FlowRevision, {
      ...base,
      id: randomUUID(),
      number: 1,
      kind: "start",
      words: "As it was",
      flowVersion: flow.version,
      plan: revision.before,
      createdAt: flow.updatedAt,
      createdBy: flow.updatedBy ?? null,
    });
  em.create(FlowRevision, {
    ...base,
    id: randomUUID(),
    number: (newest?.number ?? 1) + 1,
    kind: revision.kind,
    words: revision.words,
    flowVersion: flow.version + 1,
    plan: revision.plan,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
}

/** Notes how a new flow begins, in the flush that makes it. */
export function addFirstRevision(
  em: EntityManager,
  scope: ActorScope,
  flow: Flow,
  plan: FlowPlan,
  words: string,
): void {
  em.create(FlowRevision, {
    id: randomUUID(),
    program: flow.program,
    flow,
    number: 1,
    kind: "start",
    words,
    flowVersion: 1,
    plan,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
}

/** The plan of one revision; null where there is none of that number, or it only put an earlier one back. */
export async function planOfRevision(em: EntityManager, flowId: string, number: number): Promise<FlowPlan | null> {
  const revision = await em.findOne(FlowRevision, { flow: flowId, number });
  return revision?.plan ?? null;
}

/** Which plan undo or redo would put back, with the words of the change that it concerns; null when there is nothing. */
export async function stepInHistory(
  em: EntityManager,
  flowId: string,
  direction: "undo" | "redo",
): Promise<{ plan: FlowPlan; words: string } | null> {
  const lines = await linesOf(em, flowId);
  const { now, before, after } = historyPosition(lines);
  const target = direction === "undo" ? before : after;
  const concerned = lines.find(({ number }) => number === (direction === "undo" ? now : after));
  const plan = target === null ? null : await planOfRevision(em, flowId, target);
  if (!plan || !concerned) return null;
  const words = lowerFirst(concerned.words);
  return { plan, words: direction === "undo" ? `Took back: ${words}` : `Did again: ${words}` };
}

/** A step that has been removed, as it last stood in the flow, with its place (from 0). */
export async function removedStep(
  em: EntityManager,
  flowId: string,
  stepId: string,
): Promise<{ step: StepPlan; position: number } | null> {
  const [last] = await em.find(
    FlowRevision,
    { flow: flowId, plan: { $contains: { steps: [{ id: stepId }] } } },
    { orderBy: { number: "desc" }, limit: 1 },
  );
  const steps = last?.plan?.steps ?? [];
  const position = steps.findIndex(({ id }) => id === stepId);
  const step = steps[position];
  return step ? { step, position } : null;
}
