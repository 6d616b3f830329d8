import { createHash } from "node:crypto";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";

/** SHA-256 of everything that an assessment rests on: an equal hash is an equal answer of the same engine. */
export function inputHash(input: { flow: FlowInput; limits: SiteLimits }): string {
  return createHash("sha256").update(JSON.stringify(input)).digest("hex");
}
