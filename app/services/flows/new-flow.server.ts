import { FlowStep } from "#app/db/entities/flow-step.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { Silicon } from "#app/db/entities/silicon.ts";
import type { FlowValues, StepValues } from "#app/schemas/flow.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { newRecord, saving, type Saved } from "../record.server.ts";
import { findFlow } from "./read-flow.server.ts";
import { addStep, copyStep } from "./steps.server.ts";

/** Adds a flow, with its first steps when there are any, in one transaction. */
export async function createFlow(scope: ActorScope, values: FlowValues, steps: StepValues[] = []): Promise<Saved> {
  requireInProgram(scope, "edit stacks and flows", values.program, "program");
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const { program, name, note, incomingThickness } = values;
      if (await em.findOne(Flow, { program, name })) return { outcome: "name taken" };
      const silicon = await em.findOne(Silicon, { id: values.silicon });
      if (!silicon) throw notFound("silicon wafer");
      const flow = em.create(Flow, { ...newRecord(scope), program, name, note, silicon, incomingThickness });
      for (const [position, step] of steps.entries()) await addStep(em, flow, position, step);
      await em.flush();
      return { outcome: "saved", id: flow.id };
    }),
  );
}

const LONGEST_NAME = 120;

/** 'Name, copy', 'Name, copy 2', … : the first that is free. */
function copyName(name: string, taken: Set<string>): string {
  for (let count = 1; ; count++) {
    const suffix = count === 1 ? ", copy" : `, copy ${count}`;
    const candidate = name.slice(0, LONGEST_NAME - suffix.length) + suffix;
    if (!taken.has(candidate)) return candidate;
  }
}

/** Copies a flow with all its steps into the same program; its assessments stay with the original. */
export async function copyFlow(scope: ActorScope, id: string): Promise<Saved> {
  return saving(() =>
    inScope(scope, async (em): Promise<Saved> => {
      const original = await findFlow(em, scope, id);
      const { program, silicon, note, incomingThickness } = original;
      requireInProgram(scope, "edit stacks and flows", program.id, "flow");
      const names = await em.find(Flow, { program: program.id }, { fields: ["name"] });
      const name = copyName(original.name, new Set(names.map((flow) => flow.name)));
      const copy = em.create(Flow, { ...newRecord(scope), program, name, note, silicon, incomingThickness });
      const steps = await em.find(FlowStep, { flow: original.id }, { orderBy: { position: "asc" } });
      for (const step of steps) await copyStep(em, step, { flow: copy });
      await em.flush();
      return { outcome: "saved", id: copy.id };
    }),
  );
}
