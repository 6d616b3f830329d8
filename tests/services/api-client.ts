import { Ajv2020 } from "ajv/dist/2020.js";
import addFormats from "ajv-formats";
import type { ApiScope } from "#app/schemas/api-token.ts";
import { API_SCOPE_NAMES } from "#app/schemas/api-token.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import type { TestDatabase } from "#tests/db/test-database.ts";

export interface Sent {
  token?: string | null;
  body?: unknown;
  headers?: Record<string, string>;
  raw?: BodyInit;
}

/** A token of a demo account for a program. */
export async function tokenOf(
  database: TestDatabase,
  account: string,
  slug: string,
  scopes: readonly ApiScope[] = API_SCOPE_NAMES,
): Promise<string> {
  const { makeToken } = await import("#app/services/api/tokens.server.ts");
  const scope = await scopeOfPerson(database, account);
  const program = scope.actor.memberships.find(({ programSlug }) => programSlug === slug)?.programId ?? "";
  const made = await makeToken(scope, { intent: "make", name: slug, program, scopes: [...scopes], days: 1 });
  if ("refused" in made) throw new Error(made.refused);
  return made.token;
}

/** Asks the API as the server does, from the token on. */
export async function ask(method: string, path: string, { token, body, headers, raw }: Sent = {}): Promise<Response> {
  const { answerApi } = await import("#app/services/api/answer.server.ts");
  const { bearerOf } = await import("#app/services/api/token-actor.server.ts");
  const bearer = token ? await bearerOf(token, "test") : null;
  const request = new Request(`http://planeward.example/api/v1${path}`, {
    method,
    headers: { ...(body !== undefined && { "Content-Type": "application/json" }), ...headers },
    ...(body !== undefined && { body: JSON.stringify(body) }),
    ...(raw !== undefined && { body: raw }),
  });
  const scope = bearer && { actor: bearer.actor, requestId: "test", onlyProgram: bearer.programId };
  return answerApi({ request, scope, bearer });
}

const escaped = (part: string) => part.replaceAll("~", "~0").replaceAll("/", "~1");

/** Holds answers against the document of the API. @returns what is wrong with one, or null */
export async function answerChecker() {
  const { apiDocument } = await import("#app/services/api/document.server.ts");
  const ajv = new Ajv2020({ strict: false, allErrors: true });
  (addFormats as unknown as (to: Ajv2020) => void)(ajv);
  const document = JSON.parse(JSON.stringify(apiDocument())) as object;
  ajv.addSchema(document, "api");
  return async (path: string, method: string, response: Response): Promise<string | null> => {
    const type = (response.headers.get("Content-Type") ?? "").split(";")[0] ?? "";
    const at = ["paths", path, method.toLowerCase(), "responses", String(response.status)];
    if (response.status === 304) return null;
    const place = [...at, "content", type, "schema"].map(escaped).join("/");
    const validate = ajv.getSchema(`api#/${place}`);
    if (!validate) return `${method} ${path}: the document has no ${response.status} of ${type}`;
    const body: unknown = await response.clone().json();
    return validate(body) ? null : `${method} ${path} ${response.status}: ${ajv.errorsText(validate.errors)}`;
  };
}
