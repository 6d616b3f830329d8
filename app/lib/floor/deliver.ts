import type { QueuedEntry } from "./floor-store.ts";

/** What became of an entry that was sent. Where it waits, `why` says for what. */
export type Delivered =
  { outcome: "stored" } | { outcome: "refused"; sentence: string } | { outcome: "waits"; why: string };

const NO_WAY = "no connection to the server";

/** Sends one entry. The server knows it by its id, so sending it again does no harm. */
export async function deliver({ lot, fields, at }: QueuedEntry): Promise<Delivered> {
  const form = new FormData();
  for (const [name, value] of fields) form.append(name, value);
  form.set("at", at);
  let answer: Response;
  try {
    answer = await fetch(`/floor/lots/${lot}/entries`, { method: "POST", body: form });
  } catch {
    return { outcome: "waits", why: NO_WAY };
  }
  if (answer.redirected || answer.status === 401) return { outcome: "waits", why: "you are signed out: sign in again" };
  if (answer.status >= 500) return { outcome: "waits", why: NO_WAY };
  const said: unknown = await answer.json().catch(() => null);
  if (answer.ok) return { outcome: "stored" };
  return { outcome: "refused", sentence: sentenceOf(said) };
}

function sentenceOf(said: unknown): string {
  if (typeof said === "object" && said !== null && "sentence" in said && typeof said.sentence === "string")
    return said.sentence;
  return "A field of it could not be read. Enter it again.";
}
