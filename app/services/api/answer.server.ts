import { createHash } from "node:crypto";
import { EstimateRefused } from "#app/lib/estimate-answer.ts";
import { canonicalJson } from "#app/lib/canonical-json.ts";
import { schemaFaults } from "#app/lib/schema-faults.ts";
import { JsonBodyRefused, readJsonBody } from "#app/server/json-body.server.ts";
import { log } from "#app/server/log.server.ts";
import { problemJson, type ProblemStatus } from "#app/server/problem-json.server.ts";
import { refusedSentence, refusedStatus } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { once } from "./idempotency.server.ts";
import type { Asked, Given, Operation } from "./operation.server.ts";
import { rateOf } from "./rate-limit.server.ts";
import { ApiRefused } from "./refused.server.ts";
import { operationsAt } from "./registry.server.ts";
import type { TokenBearer } from "./token-actor.server.ts";

/** A stack of sixty films with every property is some 20 kB. */
const LARGEST_BODY = 256 * 1024;

export interface ApiRequest {
  request: Request;
  scope: ActorScope | null;
  bearer: TokenBearer | null;
}

/** Answers a request of the API, whatever it asks and whatever becomes of it. */
export async function answerApi(asked: ApiRequest): Promise<Response> {
  const limits: Record<string, string> = {};
  const response = await answerWithin(asked, limits).catch((error: unknown) => refusalOf(error, asked));
  for (const [name, value] of Object.entries(limits)) response.headers.set(name, value);
  if (!response.headers.has("Cache-Control")) response.headers.set("Cache-Control", "no-store");
  return response;
}

async function answerWithin({ request, scope, bearer }: ApiRequest, limits: Record<string, string>): Promise<Response> {
  const found = operationsAt(new URL(request.url).pathname.slice("/api/v1".length));
  if (!found) throw new ApiRefused(404, "There is no such address. See /api for those that there are.");
  const method = request.method === "HEAD" ? "GET" : request.method;
  const operation = found.operations.find((each) => each.method === method);
  if (!operation) {
    const allowed = found.operations.map((each) => each.method);
    throw new ApiRefused(405, `Send a ${allowed.join(" or ")}.`, undefined, { Allow: allowed.join(", ") });
  }
  if (!scope)
    throw new ApiRefused(401, "Send a token as “Authorization: Bearer …”, or sign in.", undefined, {
      "WWW-Authenticate": 'Bearer realm="Planeward"',
    });
  Object.assign(limits, await rateOf(bearer?.tokenId ?? scope.actor.id));
  if (bearer && !bearer.scopes.includes(operation.scope))
    throw new ApiRefused(403, `The token was not made for this: it needs ${operation.scope}.`, undefined, {
      "WWW-Authenticate": `Bearer realm="Planeward", error="insufficient_scope", scope="${operation.scope}"`,
    });
  const ready = await read(operation, { request, scope, params: found.params });
  const work = async () => respond(operation, request, await operation.handle(ready));
  if (operation.method !== "POST" || !operation.body) return work();
  return once(
    { request, scope, caller: bearer?.tokenId ?? scope.actor.id, body: ready.body, operation: operation.id },
    work,
  );
}

/** Holds what was sent against the operation's schemas, and a change against what it is meant to change. */
async function read(
  { params: paramsSchema, query, body: bodySchema, present }: Operation,
  { request, scope, params: sent }: { request: Request; scope: ActorScope; params: Record<string, string> },
): Promise<Asked<unknown, unknown, unknown>> {
  const params = paramsSchema?.parse(sent);
  const search = [...new URL(request.url).searchParams];
  const asked = query?.safeParse(Object.fromEntries(search));
  if (asked && !asked.success)
    throw new ApiRefused(400, "Something in the query is wrong.", schemaFaults(asked.error.issues));
  if (present) await holdTo(request, () => present({ scope, params }));
  const json = bodySchema && (await readJsonBody(request, LARGEST_BODY));
  const body = bodySchema?.safeParse(json);
  if (body && !body.success) {
    const errors = schemaFaults(body.error.issues);
    throw new ApiRefused(
      422,
      errors.length === 1 ? "One thing in the request is wrong." : `${errors.length} things in the request are wrong.`,
      errors,
    );
  }
  return { scope, request, params, query: asked?.data, body: body?.data };
}

/** Refuses a change of what has changed since it was read, or of which nobody said how it was read. */
async function holdTo(request: Request, present: () => Promise<unknown>): Promise<void> {
  const now = etagOf(await present());
  const match = request.headers.get("If-Match");
  if (match === null)
    throw new ApiRefused(428, "Send the ETag that you read as If-Match, so that nobody’s change is lost.");
  if (!tagsOf(match).includes(now))
    throw new ApiRefused(412, "It was changed after you had read it. Read it again, and send its new ETag.");
}

const etagOf = (answer: unknown) =>
  `"${createHash("sha256").update(canonicalJson(answer)).digest("base64url").slice(0, 22)}"`;
const tagsOf = (header: string) => header.split(",").map((tag) => tag.trim().replace(/^W\//, ""));

function respond({ status = 200, method }: Operation, request: Request, given: Given<unknown> | Response): Response {
  if (given instanceof Response) return given;
  const etag = etagOf(given.answer);
  const headers = { ETag: etag, "Cache-Control": "private, no-cache", ...given.headers };
  const known = request.headers.get("If-None-Match");
  if (method === "GET" && known !== null && (known.trim() === "*" || tagsOf(known).includes(etag)))
    return new Response(null, { status: 304, headers });
  return Response.json(given.answer, { status: given.status ?? status, headers });
}

/** What was thrown as `application/problem+json`; what nobody foresaw is logged, and says nothing of itself. */
function refusalOf(error: unknown, { scope }: ApiRequest): Response {
  if (error instanceof ApiRefused)
    return problemJson(error.status, error.message, {
      ...(error.errors && { errors: error.errors }),
      ...(error.headers && { headers: error.headers }),
    });
  // What is left of the body is not read, so the connection can't carry another request.
  if (error instanceof JsonBodyRefused)
    return problemJson(error.status, error.message, { headers: { Connection: "close" } });
  if (error instanceof EstimateRefused)
    return problemJson(
      422,
      error.faults.length === 1
        ? "One thing in the request is wrong."
        : `${error.faults.length} things in the request are wrong.`,
      { errors: error.faults },
    );
  const detail = refusedSentence(error);
  const status = refusedStatus(error);
  if (detail !== null && status !== null) return problemJson(status as ProblemStatus, detail);
  log.error({ err: error, requestId: scope?.requestId }, "a request of the API failed");
  return problemJson(500, "Something went wrong on our side. It has been written down; try again in a while.");
}
