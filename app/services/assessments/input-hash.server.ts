import { createHash } from "node:crypto";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";

/** SHA-256 of everything that an assessment rests on: an equal hash is an equal answer of the same engine. */
export function inputHash(input: AssessmentInput): string {
  return createHash("sha256").update(JSON.stringify(input)).digest("hex");
}
