import { estimateSchema, type EstimateRequest } from "#app/schemas/estimate.ts";
import { EstimateRefused } from "#app/lib/estimate-answer.ts";
import { schemaFaults } from "#app/lib/schema-faults.ts";

/** A request from outside as the schema understands it. @throws EstimateRefused with a pointer for every fault */
export function readEstimateRequest(body: unknown): EstimateRequest {
  const parsed = estimateSchema.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new EstimateRefused(schemaFaults(parsed.error.issues));
}
