import type { z } from "zod";
import type { EstimateFault } from "#app/schemas/estimate.ts";

/** What a schema found wrong, each with its place. */
export function schemaFaults(issues: readonly z.core.$ZodIssue[]): EstimateFault[] {
  return issues.flatMap((issue): EstimateFault[] =>
    issue.code === "unrecognized_keys"
      ? issue.keys.map((key) => ({ pointer: pointerTo([...issue.path, key]), detail: "is not known here" }))
      : [{ pointer: pointerTo(issue.path), detail: issue.message }],
  );
}

/** A JSON pointer (RFC 6901). */
function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((part) => `/${String(part).replaceAll("~", "~0").replaceAll("/", "~1")}`).join("");
}
