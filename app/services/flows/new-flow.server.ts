import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Flow } from "#app/db/entities/flow.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import type { FlowPlan } from "#app/schemas/flow-plan.ts";
import type { FlowValues, StepValues } from "#app/schemas/flow.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { newRecord, saving, type Saved } from "../record.server.ts";
import { readPlan, writePlan } from "./plan.server.ts";
import { findFlow } from "./read-flow.server.ts";
import { addFirstRevision } from "./revisions.server.ts";

/** The steps that a new flow begins with, and the words for that. */
export interface FirstSteps {
  steps: StepValues[];
  words: string;
}

/** Adds a flow, with its first steps when there are any, in one transaction. */
export async function createFlow(
  scope: ActorScope,
  values: FlowValues,
  { steps, words }: FirstSteps = { steps: [], words: "Began empty" },
): Promise<Saved> {
  requireInProgram(scope, "edit stacks and flows", values.program, "program");
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const { program, ...head } = values;
      if (await em.findOne(Flow, { program, name: head.name })) return { outcome: "name taken" };
      const silicon = await em.findOne(Silicon, { id: values.silicon });
      if (!silicon) throw notFound("silicon wafer");
      const flow = em.create(Flow, { ...newRecord(scope), ...head, program, silicon });
      const plan: FlowPlan = {
        ...head,
        steps: steps.map((step) => ({ ...step, id: randomUUID() })),
      };
      await writePlan(em, flow, { plan: { ...plan, steps: [] }, steps: new Map(), films: new Map() }, plan);
      addFirstRevision(em, scope, flow, plan, words);
      await em.flush();
      return { outcome: "saved", id: flow.id };
    }),
  );
}

const LONGEST_NAME = 120;

/** 'Name, copy', 'Name, copy 2', … : the first that is free. The copy of a copy is the next copy of the original. */
function copyName(original: string, taken: Set<string>): string {
  const name = original.replace(/, copy( \d+)?$/, "");
  for (let count = 1; ; count++) {
    const suffix = count === 1 ? ", copy" : `, copy ${count}`;
    const candidate = name.slice(0, LONGEST_NAME - suffix.length) + suffix;
    if (!taken.has(candidate)) return candidate;
  }
}

/** People who copy the same flow at the same moment, at most. */
const ATTEMPTS = 5;

/** What a copy has otherwise than its original, with the words for its history. */
export type CopyChange = (em: EntityManager, plan: FlowPlan) => Promise<{ plan: FlowPlan; words: string }>;

/** Copies a flow with all its steps into the same program, changed if so wished; its assessments stay with the original. */
export async function copyFlow(scope: ActorScope, id: string, change: CopyChange | null = null): Promise<Saved> {
  let saved = await copyOnce(scope, id, change);
  // Somebody who copied it in the same moment has taken the name: the next one is free.
  for (let attempt = 1; attempt < ATTEMPTS && saved.outcome === "name taken"; attempt++)
    saved = await copyOnce(scope, id, change);
  return saved;
}

async function copyOnce(scope: ActorScope, id: string, change: CopyChange | null): Promise<Saved> {
  const { head, first } = await inScope(scope, async (em) => {
    const original = await findFlow(em, scope, id);
    const names = await em.find(Flow, { program: original.program.id }, { fields: ["name"] });
    const { plan } = await readPlan(em, original);
    const changed = change && (await change(em, plan));
    const { steps, ...rest } = changed?.plan ?? plan;
    const name = copyName(original.name, new Set(names.map((flow) => flow.name)));
    return {
      head: { ...rest, program: original.program.id, name },
      first: { steps, words: `Copied from ${original.name}${changed ? `. ${changed.words}` : ""}` },
    };
  });
  return createFlow(scope, head, first);
}
