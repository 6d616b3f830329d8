import type { EntityManager } from "@mikro-orm/postgresql";
import type { SheetSource } from "#app/lib/sheet/sheet-document-of.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { assessmentDetail, findAssessment } from "../assessments/assessments.server.ts";

/**
 * What the sheets of an assessment are made of, inside a running transaction: one, or one for each leg of a flow that parts by slot.
 * @throws a response of 404 for who may not see the work of its program
 */
export async function sheetSourceOf(
  em: EntityManager,
  scope: ActorScope,
  assessmentId: string | undefined,
): Promise<SheetSource[]> {
  const { result, ...head } = await assessmentDetail(em, scope, assessmentId);
  const { input } = await findAssessment(em, scope, assessmentId);
  const legs = result.legs ?? [];
  const source = { head, result, input: input.$ };
  return legs.length === 0 ? [{ ...source, leg: null }] : legs.map((_, index) => ({ ...source, leg: index + 1 }));
}
