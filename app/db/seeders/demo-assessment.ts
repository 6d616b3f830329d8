import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { inputHash } from "#app/services/assessments/input-hash.server.ts";
import { resultOf } from "#app/services/assessments/result-of.ts";
import { flowInputOf } from "#app/services/flows/flow-inputs.ts";
import { flowContents } from "#app/services/flows/read-flow.server.ts";
import { Assessment } from "../entities/assessment.ts";
import { Flow } from "../entities/flow.ts";
import type { Person } from "../entities/person.ts";

/** The first assessment of the Tern flow, as the person would have run it with the limits that a site starts with. */
export async function addDemoAssessment(em: EntityManager, person: Person): Promise<void> {
  const flow = await em.findOneOrFail(
    Flow,
    { program: { slug: "tern" } },
    { populate: ["program", "silicon", "updatedBy"] },
  );
  const [content] = await flowContents(em, [flow]);
  if (!content) return;
  const input = { flow: flowInputOf(content), limits: defaultLimits() };
  const result = resultOf(input.flow, input.limits, assessFlow(input.flow, input.limits));
  em.create(Assessment, {
    id: randomUUID(),
    program: flow.program.id,
    flow: flow.id,
    number: 1,
    documentNumber: 1,
    flowName: flow.name,
    engineVersion: ENGINE_VERSION,
    inputHash: inputHash(input),
    input,
    result,
    outcome: result.verdict.outcome,
    createdAt: new Date(),
    createdBy: person,
  });
}
