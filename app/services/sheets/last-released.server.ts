import type { EntityManager } from "@mikro-orm/postgresql";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import type { InputChange } from "#app/schemas/assessment-changes.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import type { FoundAssessment } from "./still-newest.server.ts";

/** The revision of a sheet that was released last, whatever became of it since, beside an assessment that may follow it. */
export interface LastReleased {
  id: string;
  number: number;
  before: FoundAssessment;
  changes: InputChange[];
}

/** @returns null where nothing else of the sheet was ever released */
export async function lastReleased(
  em: EntityManager,
  scope: ActorScope,
  sheetId: string,
  now: FoundAssessment,
): Promise<LastReleased | null> {
  const [last] = await em.find(
    SheetRevision,
    { sheet: sheetId, number: { $ne: null }, assessment: { $ne: now.id } },
    { orderBy: { number: "desc" }, limit: 1 },
  );
  if (!last?.number) return null;
  const before = await findAssessment(em, scope, last.assessment.id);
  return { id: last.id, number: last.number, before, changes: inputChanges(before.input.$, now.input.$) };
}
