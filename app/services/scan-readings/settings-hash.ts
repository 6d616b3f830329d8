import { createHash } from "node:crypto";
import type { ReadingSettings } from "#app/schemas/scan-reading.ts";

/** What tells two ways of reading a file apart, whatever the order in which they were written down: SHA-256, hex. */
export function settingsHash(settings: ReadingSettings): string {
  return createHash("sha256").update(JSON.stringify(settings, sorted)).digest("hex");
}

function sorted(_key: string, value: unknown): unknown {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).toSorted(([one], [other]) => (one < other ? -1 : 1)));
}
