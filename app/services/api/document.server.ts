import { OpenAPIRegistry, OpenApiGeneratorV31, extendZodWithOpenApi } from "@asteasolutions/zod-to-openapi";
import { z } from "zod";
import { API_SCOPES } from "#app/schemas/api-token.ts";
import type { Operation } from "./operation.server.ts";
import { OPERATIONS } from "./registry.server.ts";

extendZodWithOpenApi(z);

const problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string(),
    errors: z
      .array(
        z.object({ pointer: z.string().describe("JSON pointer (RFC 6901) into what was sent."), detail: z.string() }),
      )
      .optional(),
  })
  .describe("A refusal (RFC 9457).");

const REFUSALS: Record<number, string> = {
  400: "The query, the body or a header could not be read.",
  401: "No token, or one that is not good.",
  403: "The token was not made for this, or its person’s role does not allow it.",
  404: "It is not there, or it is of a program that is not the token’s.",
  409: "It cannot be done as things stand.",
  412: "It was changed after it had been read.",
  413: "The body is too large.",
  415: "The body has the wrong content type.",
  422: "What was sent cannot be used; `errors` points at each fault.",
  428: "`If-Match` is missing.",
  429: "Too many requests; `Retry-After` says how long to wait.",
};

/** The statuses that an operation may refuse with. */
function refusalsOf({ method, params, present }: Operation): number[] {
  return [
    400,
    401,
    403,
    ...(params || method !== "GET" ? [404] : []),
    ...(method === "GET" ? [] : [409, 413, 415, 422]),
    ...(present ? [412, 428] : []),
    429,
  ];
}

const header = (description: string) => ({ description, schema: { type: "string" as const } });
const LIMITS = {
  "X-Request-Id": header("Names the request in the log of the site."),
  "RateLimit-Limit": header("Requests of a minute."),
  "RateLimit-Remaining": header("Requests that are left."),
  "RateLimit-Reset": header("Seconds until all are free again."),
};

function headersOf(operation: Operation) {
  if (operation.method === "PUT") return z.object({ "If-Match": z.string().describe("The ETag that was read.") });
  if (operation.method === "GET") return z.object({ "If-None-Match": z.string().optional() });
  if (!operation.body) return undefined;
  return z.object({
    "Idempotency-Key": z
      .string()
      .optional()
      .describe("The same request sent again with it within 24 hours is answered the same and does nothing."),
  });
}

function register(registry: OpenAPIRegistry, operation: Operation, problemSchema: z.ZodType): void {
  const { id, method, path, scope, group, summary, params, query, body, form, answer, status = 200 } = operation;
  const answers = { [status]: answer, ...operation.otherAnswers, ...(operation.form ? { 200: answer } : {}) };
  const headers = headersOf(operation);
  registry.registerPath({
    operationId: id,
    method: method.toLowerCase() as "get" | "post" | "put",
    path,
    tags: [group],
    summary,
    security: [{ token: [scope] }],
    request: {
      ...(params && { params: params as z.ZodObject }),
      ...(query && { query: query as z.ZodObject }),
      ...(headers && { headers }),
      ...(body && { body: { required: true, content: { "application/json": { schema: body } } } }),
      ...(form && { body: { required: true, content: { "multipart/form-data": { schema: form } } } }),
    },
    responses: {
      ...Object.fromEntries(
        Object.entries(answers).map(([code, schema]) => [
          code,
          {
            description: code === "202" ? "The job that does it." : "Done.",
            headers: { ...LIMITS, ETag: header("Names this state of it.") },
            content: { "application/json": { schema: schema as z.ZodType } },
          },
        ]),
      ),
      ...(method === "GET" && { 304: { description: "It is as `If-None-Match` says." } }),
      ...Object.fromEntries(
        refusalsOf(operation).map((code) => [
          code,
          {
            description: REFUSALS[code] ?? "",
            headers: LIMITS,
            content: { "application/problem+json": { schema: problemSchema } },
          },
        ]),
      ),
    },
  });
}

function make() {
  const registry = new OpenAPIRegistry();
  const problemSchema = registry.register("Problem", problem);
  registry.registerComponent("securitySchemes", "token", {
    type: "http",
    scheme: "bearer",
    description: `A token made under /tokens. ${Object.entries(API_SCOPES)
      .map(([scope, words]) => `\`${scope}\`: ${words}.`)
      .join(" ")}`,
  });
  for (const operation of OPERATIONS) register(registry, operation, problemSchema);
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: "3.1.0",
    info: {
      title: "Planeward",
      version: "1",
      description:
        "Film stacks, flows, assessments, sheets, scans, lots and incidents of a program. Numbers are SI, with the unit in the name. Bow is positive when the centre lies above the reference plane with the device side up; stress is positive in tension. What is answered supports the site’s own procedures and does not take their place.",
    },
    servers: [{ url: "/api/v1" }],
  });
}

let made: ReturnType<typeof make> | undefined;

/** The document of the API, OpenAPI 3.1, made once from the registry. */
export const apiDocument = () => (made ??= make());
