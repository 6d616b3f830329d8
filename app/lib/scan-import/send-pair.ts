import type { PairAnswer } from "#app/schemas/scan-import.ts";
import type { FilePair } from "./pairs.ts";

const UNSENT: PairAnswer = {
  outcome: "refused",
  which: null,
  reason: "The server could not be reached. Nothing of this pair is kept; import again.",
};

/**
 * Sends a pair with the profiles that it was read by. A server that does not answer is told like a refusal.
 * @param shared what all pairs of the batch have in common, by field
 */
export async function sendPair({ before, after, label }: FilePair, shared: FormData): Promise<PairAnswer> {
  const body = new FormData();
  for (const [field, value] of shared) body.append(field, value);
  body.set("label", label);
  body.set("profileBefore", JSON.stringify(before.profile));
  body.set("profileAfter", JSON.stringify(after.profile));
  body.set("before", before.file);
  body.set("after", after.file);
  let response: Response;
  try {
    response = await fetch("/scans/import/pair", { method: "POST", body });
  } catch {
    return UNSENT;
  }
  if (response.redirected)
    return {
      outcome: "refused",
      which: null,
      reason: "Your session has ended. Sign in again in another tab, then import again.",
    };
  if (!response.ok || !response.headers.get("Content-Type")?.includes("json"))
    return { outcome: "refused", which: null, reason: await sentenceOf(response) };
  return (await response.json()) as PairAnswer;
}

/** The sentence of a refusal by the server, where it gives one. */
async function sentenceOf(response: Response): Promise<string> {
  const body: unknown = await response.json().catch(() => null);
  return typeof body === "object" && body !== null && "sentence" in body && typeof body.sentence === "string"
    ? body.sentence
    : `The server did not take this pair (${response.status}). Nothing of it is kept; import again.`;
}
