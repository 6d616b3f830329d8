import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { Analysed } from "./analyse-scans.server.ts";
import { sha256 } from "../scan-files.server.ts";

/** Answers that this process keeps: a wafer takes some 200 ms to work out, and is looked at again. */
const MOST = 60;
const kept = new Map<string, Analysed>();

/**
 * The answer to these inputs, worked out once. Everything that it depends on is in `inputs`, so that a new study, another azimuth or a
 * changed film is another question; what somebody may see is checked before they are put together.
 */
export async function keptAnalysis(inputs: unknown, work: () => Promise<Analysed>): Promise<Analysed> {
  const key = sha256(JSON.stringify([ENGINE_VERSION, inputs]));
  const known = kept.get(key) ?? (await work());
  // The newest stand last.
  kept.delete(key);
  kept.set(key, known);
  const [oldest] = kept.keys();
  if (kept.size > MOST && oldest !== undefined) kept.delete(oldest);
  return known;
}
