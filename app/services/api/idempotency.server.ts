import { createHash, randomUUID } from "node:crypto";
import { UniqueConstraintViolationException } from "@mikro-orm/core";
import { ApiAnswer } from "#app/db/entities/api-answer.ts";
import { canonicalJson } from "#app/lib/canonical-json.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { ApiRefused } from "./refused.server.ts";

const DAY = 24 * 3600e3;
/** One that is at work for longer than this has died with its process. */
const GIVEN_UP = 2 * 60_000;
const KEPT_HEADERS = ["Content-Type", "ETag", "Location"];

interface Sent {
  request: Request;
  scope: ActorScope;
  caller: string;
  operation: string;
  body: unknown;
}

/**
 * Does what a POST asks once for its Idempotency-Key: the same sent again within a day is answered as before, and something else under
 * the same key is refused. Without a key it is simply done.
 */
export async function once(sent: Sent, work: () => Promise<Response>): Promise<Response> {
  const key = sent.request.headers.get("Idempotency-Key");
  if (key === null) return work();
  if (!/^[\x21-\x7e]{1,255}$/.test(key))
    throw new ApiRefused(400, "An Idempotency-Key is 1 to 255 printed characters without spaces.");
  const requestHash = createHash("sha256")
    .update(canonicalJson({ operation: sent.operation, path: new URL(sent.request.url).pathname, body: sent.body }))
    .digest("hex");
  const begun = await begin(sent, key, requestHash);
  if (begun instanceof Response) return begun;
  try {
    const response = await work();
    await keep(sent.scope, begun, response.clone());
    return response;
  } catch (error) {
    // What was refused has done nothing, so the key is free for another try.
    await inScope(sent.scope, (em) => em.nativeDelete(ApiAnswer, { id: begun }));
    throw error;
  }
}

/** Takes the key, or gives the answer that it has already. @returns the id of the row that is to be filled, or the answer */
async function begin({ scope, caller }: Sent, key: string, requestHash: string): Promise<string | Response> {
  const now = Date.now();
  try {
    return await inScope(scope, async (em) => {
      const person = scope.actor.id;
      await em.nativeDelete(ApiAnswer, { person, at: { $lt: new Date(now - DAY) } });
      await em.nativeDelete(ApiAnswer, { person, status: null, at: { $lt: new Date(now - GIVEN_UP) } });
      const known = await em.findOne(ApiAnswer, { caller, key });
      if (known) return again(known, requestHash);
      const id = randomUUID();
      em.create(ApiAnswer, { id, person, caller, key, requestHash, headers: {}, body: "", at: new Date(now) });
      await em.flush();
      return id;
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) throw atWork();
    throw error;
  }
}

const atWork = () =>
  new ApiRefused(409, "The first request with this Idempotency-Key is still at work. Send it again in a moment.");

function again(known: ApiAnswer, requestHash: string): Response {
  if (known.requestHash !== requestHash)
    throw new ApiRefused(
      422,
      "This Idempotency-Key came with another request before. Use a new key for a new request.",
    );
  if (typeof known.status !== "number") throw atWork();
  return new Response(known.body, {
    status: known.status,
    headers: { ...known.headers, "Idempotent-Replayed": "true" },
  });
}

async function keep(scope: ActorScope, id: string, response: Response): Promise<void> {
  const body = await response.text();
  const headers = Object.fromEntries(
    KEPT_HEADERS.flatMap((name) => {
      const value = response.headers.get(name);
      return value === null ? [] : [[name, value]];
    }),
  );
  await inScope(scope, (em) => em.nativeUpdate(ApiAnswer, { id }, { status: response.status, headers, body }));
}
