import type { z } from "zod";
import { estimateSchema, type EstimateFault, type EstimateRequest } from "#app/schemas/estimate.ts";
import { EstimateRefused } from "#app/lib/estimate-answer.ts";

/** A request from outside as the schema understands it. @throws EstimateRefused with a pointer for every fault */
export function readEstimateRequest(body: unknown): EstimateRequest {
  const parsed = estimateSchema.safeParse(body);
  if (parsed.success) return parsed.data;
  throw new EstimateRefused(parsed.error.issues.flatMap(faultsOf));
}

function faultsOf(issue: z.core.$ZodIssue): EstimateFault[] {
  if (issue.code === "unrecognized_keys")
    return issue.keys.map((key) => ({ pointer: pointerTo([...issue.path, key]), detail: "is not known here" }));
  return [{ pointer: pointerTo(issue.path), detail: issue.message }];
}

/** A JSON pointer (RFC 6901). */
function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}
