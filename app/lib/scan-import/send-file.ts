import type { FileAnswer } from "#app/schemas/scan-import.ts";
import type { BatchFile } from "./batch.ts";
import { kindOf, takenLines } from "./place-words.ts";
import { waitForJob } from "./wait-for-job.ts";

/** What the screen learns of a file in the end. */
export type Answered = Exclude<FileAnswer, { outcome: "job" }>;

const refused = (reason: string): Answered => ({ outcome: "refused", reason });

/**
 * Sends a file with the profile that it was read by and what it is of. A server that does not answer is told like a refusal.
 * @param shared what all files of the batch have in common, by field
 * @param tell is told how far the reading of a large one is, bytes
 */
export async function sendFile(
  file: BatchFile,
  shared: FormData,
  tell: (done: number, of: number) => void,
): Promise<Answered> {
  const body = new FormData();
  for (const [field, value] of shared) body.append(field, value);
  body.set("profile", JSON.stringify(file.profile));
  body.set("instrument", file.instrument ?? "");
  const kind = kindOf(file);
  // Every row of a summary names its wafer or its slot; what the file's name proposes for it is no wafer.
  const named = kind === "summary" ? (["lot"] as const) : (["wafer", "lot", "slot"] as const);
  for (const field of named) body.set(field, file.of[field]);
  if (kind === "profiles") {
    body.set("side", file.of.side);
    body.set("lines", JSON.stringify((takenLines(file) ?? []).map(({ profile, degrees }) => [profile, degrees])));
  }
  body.set("file", file.file);
  let response: Response;
  try {
    response = await fetch("/scans/import/file", { method: "POST", body });
  } catch {
    return refused("The server could not be reached. Nothing of this file is kept; import again.");
  }
  if (response.redirected) return refused("Your session has ended. Sign in again in another tab, then import again.");
  if (!response.ok || !response.headers.get("Content-Type")?.includes("json"))
    return refused(await sentenceOf(response));
  const answer = (await response.json()) as FileAnswer;
  if (answer.outcome !== "job") return answer;
  tell(0, file.file.size);
  return waitForJob(answer.job, tell);
}

/** The sentence of a refusal by the server, where it gives one. */
async function sentenceOf(response: Response): Promise<string> {
  const body: unknown = await response.json().catch(() => null);
  return typeof body === "object" && body !== null && "sentence" in body && typeof body.sentence === "string"
    ? body.sentence
    : `The server did not take this file (${response.status}). Nothing of it is kept; import again.`;
}
