import { EngineInputError } from "#app/engine/errors.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";

/** Why a file cannot be read or fitted, for the person who sent it; null when the fault is not the file's. */
export function fileRefusal(error: unknown): string | null {
  if (error instanceof ScanFileError) return error.message;
  if (error instanceof EngineInputError) return `A profile gives no curvature: ${error.field} ${error.reason}.`;
  return null;
}
