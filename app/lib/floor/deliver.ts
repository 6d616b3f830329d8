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
  const said: unknown = await answer.json().catch(() => null);
  return read(said) ?? { outcome: "waits", why: NO_WAY };
}

/** What the server says became of it; null for an answer of something in between, such as the page of a network that wants a sign-in. */
function read(said: unknown): Delivered | null {
  if (typeof said !== "object" || said === null) return null;
  if ("outcome" in said && said.outcome === "stored") return { outcome: "stored" };
  if (!("sentence" in said)) return null;
  const { sentence } = said;
  return {
    outcome: "refused",
    sentence: typeof sentence === "string" ? sentence : "A field of it could not be read. Enter it again.",
  };
}
