import type { EntityManager } from "@mikro-orm/postgresql";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { findAssessment } from "../assessments/assessments.server.ts";
import { isOutOfDate } from "../assessments/out-of-date.server.ts";
import { presentFlow } from "../assessments/present-inputs.server.ts";

export type FoundAssessment = Awaited<ReturnType<typeof findAssessment>>;

/** Whether the flow has an assessment after this one. */
export async function hasNewer(
  em: EntityManager,
  { flow, number }: Pick<FoundAssessment, "flow" | "number">,
): Promise<boolean> {
  const [newest] = await em.execute<{ number: number }[]>(
    "select max(number) as number from assessment where flow_id = ? and lot is null",
    [flow.id],
  );
  return (newest?.number ?? 0) > number;
}

/** Whether it would rest on something else now; looked at closely each time, since a release hangs on it. */
export async function restsOnOldInputs(
  em: EntityManager,
  scope: ActorScope,
  { flow, engineVersion, inputHash, input }: FoundAssessment,
): Promise<boolean> {
  const present = await presentFlow(em, scope, flow.id);
  return isOutOfDate({ engineVersion, inputHash, input: input.$ }, present.input);
}
