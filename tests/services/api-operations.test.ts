import { randomUUID } from "node:crypto";
import fc from "fast-check";
import { beforeAll, describe, expect, test } from "vitest";
import type { Operation } from "#app/services/api/operation.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { answerChecker, ask, tokenOf, type Sent } from "./api-client.ts";
import { OPERATION_RULES } from "./api-rules.ts";
import { newLot, releaseFirstFlow } from "./lot-on-sheet.ts";

process.env["API_REQUESTS_PER_MINUTE"] = "90000";
const database = useDatabase({ demo: true });
const LONG = { timeout: 120_000 };

let good = "";
let foreign = "";
let powerless = "";
let check: Awaited<ReturnType<typeof answerChecker>>;
let operations: readonly Operation[] = [];
const ids: Record<string, string> = {};

const idOf = async (sql: string) => (await asOwner<{ id: string }>(database, sql))[0]?.id ?? "";
const TERN = "(select id from program where slug = 'tern')";

beforeAll(async () => {
  operations = (await import("#app/services/api/registry.server.ts")).OPERATIONS;
  check = await answerChecker();
  good = await tokenOf(database, "process-owner", "tern");
  foreign = await tokenOf(database, "process-owner", "petrel");
  powerless = await tokenOf(database, "process-owner", "tern", ["estimates:run"]);
  ids["revision_id"] = await releaseFirstFlow(database, "tern");
  ids["lot_id"] = await newLot(database, "API-1", "tern");
  ids["stack_id"] = await idOf(`select id from stack where program_id = ${TERN} limit 1`);
  ids["flow_id"] = await idOf(`select id from flow where program_id = ${TERN} limit 1`);
  ids["assessment_id"] = await idOf(
    `select assessment_id as id from sheet_revision where id = '${ids["revision_id"]}'`,
  );
  ids["film_id"] = await idOf("select id from film limit 1");
  ids["silicon_id"] = await idOf("select id from silicon limit 1");
  await order();
}, 120_000);

const FILM = { side: "front", thickness_m: 5e-6, stress_Pa: 1e8, youngs_modulus_Pa: 117e9, poissons_ratio: 0.34 };
const stack = (name: string, more: object = {}) => ({
  name,
  program: "tern",
  silicon_id: ids["silicon_id"],
  silicon_thickness_m: 1e-4,
  films: [
    { side: "front", film_id: ids["film_id"], thickness_m: 1e-6 },
    { side: "front", film_id: ids["film_id"], thickness_m: 2e-6, stress_Pa: 5e7, coverage: 0.5 },
    { side: "back", film_id: ids["film_id"], thickness_m: 3e-6 },
  ],
  ...more,
});
const incident = (more: object = {}) => ({
  assessment_id: ids["assessment_id"],
  step: 3,
  lot: "API-1",
  wafer: "4",
  kind: "chip",
  severity: "near miss",
  place: { radius: 0.9, azimuth_rad: 1.2 },
  wafers_affected: 1,
  wafers_broken: 0,
  words: "Seen at unloading",
  occurred_at: "2026-11-20T22:15:00.000Z",
  ...more,
});

/** A profile as an instrument writes it. */
function upload(): FormData {
  const form = new FormData();
  const rows = Array.from({ length: 60 }, (_, index) => `${index * 5};${((index - 30) ** 2 / 100).toFixed(4)}`);
  form.set("file", new File([`x [mm];z [um]\n${rows.join("\n")}\n`], "profile.csv", { type: "text/csv" }));
  form.set("program", "tern");
  return form;
}

/** What each operation that takes something is sent. */
const BODIES: Record<string, () => Sent> = {
  estimate: () => ({ body: { wafer: { diameter_m: 0.3, thickness_m: 775e-6, orientation: "100" }, films: [FILM] } }),
  createStack: () => ({ body: stack(`By the API ${randomUUID()}`) }),
  changeStack: () => ({ body: stack(`Changed ${randomUUID()}`), headers: { "If-Match": ids["etag"] ?? "" } }),
  uploadScan: () => ({ raw: upload() }),
  createLot: () => ({
    body: { program: "tern", name: `L-${randomUUID().slice(0, 8)}`, wafers: [{ slot: 1, name: "W1" }] },
  }),
  assignSheet: () => ({ body: { revision_id: ids["revision_id"], from_step: 1 } }),
  recordObservation: () => ({
    body: { id: randomUUID(), revision_id: ids["revision_id"], step: 1, text: "Edge looks dull", wafers: 2 },
  }),
  reportIncident: () => ({ body: incident() }),
};

const placed = ({ path }: Operation) => path.replaceAll(/\{(\w+)\}/g, (_, name: string) => ids[name] ?? "");
const send = (operation: Operation, token: string | null) =>
  ask(operation.method, placed(operation), { ...BODIES[operation.id]?.(), token });

/** Makes what later operations need, by the API itself. */
async function order(): Promise<void> {
  const { body } = BODIES["assignSheet"]?.() ?? {};
  const assigned = await ask("POST", `/lots/${ids["lot_id"]}/sheet`, { token: good, body });
  if (assigned.status !== 200) throw new Error(await assigned.text());
  const reported = await ask("POST", "/incidents", { token: good, body: incident() });
  ids["incident_id"] = ((await reported.json()) as { id: string }).id;
  const read = await ask("POST", "/scans", { token: good, raw: upload() });
  if (read.status !== 201) throw new Error(await read.text());
  ids["reading_id"] = ((await read.json()) as { id: string }).id;
  const { actor } = await scopeOfPerson(database, "process-owner");
  ids["job_id"] = randomUUID();
  const columns = await asOwner<{ name: string; type: string }>(
    database,
    "select column_name as name, data_type as type from information_schema.columns where table_name = 'job' and is_nullable = 'NO'",
  );
  const known: Record<string, string> = {
    id: `'${ids["job_id"]}'`,
    program_id: TERN,
    created_by_id: `'${actor.id}'`,
    state: "'done'",
    kind: "'read scan files'",
  };
  const value = ({ name, type }: { name: string; type: string }) =>
    known[name] ??
    (type.startsWith("timestamp")
      ? "now()"
      : type === "jsonb"
        ? "'{}'"
        : /int|double/.test(type)
          ? "0"
          : type === "boolean"
            ? "false"
            : "''");
  await asOwner(
    database,
    `insert into job (${columns.map(({ name }) => `"${name}"`).join(", ")}) values (${columns.map(value).join(", ")})`,
  );
}

describe("every operation", () => {
  test("answers who may as the document says", LONG, async () => {
    const wrong: string[] = [];
    for (const operation of operations) {
      if (operation.id === "changeStack")
        ids["etag"] = (await ask("GET", placed(operation), { token: good })).headers.get("ETag") ?? "";
      // A lot goes back to another revision only for a reason, and is on this one already.
      const expected = operation.id === "assignSheet" ? [422] : [200, 201];
      const response = await send(operation, good);
      if (!expected.includes(response.status))
        wrong.push(`${operation.id} ${response.status}: ${await response.clone().text()}`);
      const fault = await check(operation.path, operation.method, response);
      if (fault) wrong.push(fault);
      expect(response.headers.get("RateLimit-Remaining"), operation.id).toMatch(/^\d+$/);
    }
    expect(wrong).toEqual([]);
  });

  test("refuses who has no token, one of another program or one that was not made for it", LONG, async () => {
    const wrong: string[] = [];
    for (const operation of operations) {
      const held = async (token: string | null, statuses: number[]) => {
        const response = await send(operation, token);
        if (!statuses.includes(response.status))
          wrong.push(
            `${operation.id} ${response.status}, not ${statuses.join(" or ")}: ${await response.clone().text()}`,
          );
        const fault = await check(operation.path, operation.method, response);
        if (fault) wrong.push(fault);
        return response;
      };
      await held(null, [401]);
      if (operation.scope !== "estimates:run") {
        const refused = await held(powerless, [403]);
        expect(refused.headers.get("WWW-Authenticate"), operation.id).toContain(operation.scope);
      }
      // What the site shares is open to the staff of every program.
      const shared = ["estimate", "listFilms", "getFilm", "listSilicon"].includes(operation.id);
      const walled = /\{/.test(operation.path) ? [404] : operation.method === "GET" ? [200] : [404, 422];
      const response = await held(foreign, shared ? [200] : walled);
      if (operation.method === "GET" && operation.path.startsWith("/") && !shared && response.status === 200)
        expect(await response.clone().text(), operation.id).not.toContain('"tern"');
    }
    expect(wrong).toEqual([]);
  });
});

describe("every operation has its rule", () => {
  test("by its name", () => {
    expect(Object.keys(OPERATION_RULES).toSorted()).toEqual(operations.map(({ id }) => id).toSorted());
  });

  test.each(["guest", "technician", "engineer", "process-owner", "shift-lead", "administrator"])(
    "which answers a token of a %s as the permissions say",
    LONG,
    async (account) => {
      const token = await tokenOf(database, account, "tern");
      const { bearerOf } = await import("#app/services/api/token-actor.server.ts");
      const bearer = await bearerOf(token, "test");
      if (!bearer) throw new Error("the token is not good");
      const answered: Record<string, number> = {};
      const expected: Record<string, number> = {};
      for (const operation of operations) {
        if (operation.id === "changeStack")
          ids["etag"] = (await ask("GET", placed(operation), { token: good })).headers.get("ETag") ?? "";
        answered[operation.id] = (await send(operation, token)).status;
        expected[operation.id] = OPERATION_RULES[operation.id]?.(bearer.actor, bearer.programId) ?? 0;
      }
      expect(answered).toEqual(expected);
    },
  );
});

test("what was sent comes back as it was sent", LONG, async () => {
  const body = stack("Round trip", { note: "there and back", silicon_thickness_tolerance_m: 2e-6 });
  const made = await ask("POST", "/stacks", { token: good, body });
  const answer = (await made.json()) as Record<string, never> & {
    id: string;
    silicon_thickness_m: object;
    films: {
      side: string;
      thickness_m: { value: number };
      own_stress_Pa: { value: number } | null;
      coverage: number;
    }[];
  };
  expect(answer).toMatchObject({ name: "Round trip", note: "there and back", program: "tern" });
  expect(answer.silicon_thickness_m).toEqual({ value: 1e-4, tolerance: 2e-6, source: "assumed" });
  expect(
    answer.films.map((film) => [film.side, film.thickness_m.value, film.own_stress_Pa?.value ?? null, film.coverage]),
  ).toEqual([
    ["front", 1e-6, null, 1],
    ["front", 2e-6, 5e7, 0.5],
    ["back", 3e-6, null, 1],
  ]);
  const again = await ask("GET", made.headers.get("Location")?.replace("/api/v1", "") ?? "", { token: good });
  expect(await again.json()).toEqual(answer);
});

test("a record that is unchanged is not sent again, and one that changed is not overwritten", LONG, async () => {
  const path = `/stacks/${ids["stack_id"]}`;
  const read = await ask("GET", path, { token: good });
  const etag = read.headers.get("ETag") ?? "";
  expect((await ask("GET", path, { token: good, headers: { "If-None-Match": etag } })).status).toBe(304);
  const change = (headers: Record<string, string>) =>
    ask("PUT", path, { token: good, body: stack(`Once ${randomUUID()}`), headers });
  expect((await change({})).status).toBe(428);
  expect((await change({ "If-Match": etag })).status).toBe(200);
  expect((await change({ "If-Match": etag })).status).toBe(412);
  expect((await ask("GET", path, { token: good, headers: { "If-None-Match": etag } })).status).toBe(200);
});

test("pages follow each other without gap or repeat, whatever is added meanwhile", LONG, async () => {
  for (let index = 0; index < 5; index++) await ask("POST", "/stacks", { token: good, body: stack(`Page ${index}`) });
  interface Page {
    data: { id: string }[];
    next_cursor: string | null;
  }
  const page = async (query: string) => (await (await ask("GET", `/stacks${query}`, { token: good })).json()) as Page;
  const all = (await page("?limit=100")).data.map(({ id }) => id);
  const seen: string[] = [];
  let cursor: string | null = "";
  while (cursor !== null) {
    const next: Page = await page(`?limit=2${cursor && `&cursor=${cursor}`}`);
    seen.push(...next.data.map(({ id }) => id));
    cursor = next.next_cursor;
    if (seen.length === 2) await ask("POST", "/stacks", { token: good, body: stack("Added meanwhile") });
  }
  expect(seen).toEqual(all);
  for (const query of ["?cursor=nonsense", "?limit=0", "?limit=101", "?colour=red"])
    expect((await ask("GET", `/stacks${query}`, { token: good })).status, query).toBe(400);
});

test("a POST that is sent again with its key is done once", LONG, async () => {
  const headers = { "Idempotency-Key": randomUUID() };
  const body = incident({ words: "Only once" });
  const first = await ask("POST", "/incidents", { token: good, body, headers });
  const second = await ask("POST", "/incidents", { token: good, body, headers });
  expect([first.status, second.status]).toEqual([201, 201]);
  expect(await second.text()).toBe(await first.text());
  expect(second.headers.get("Location")).toBe(first.headers.get("Location"));
  const [count] = await asOwner<{ n: number }>(
    database,
    "select count(*)::int as n from incident where words = 'Only once'",
  );
  expect(count?.n).toBe(1);
  const other = await ask("POST", "/incidents", { token: good, body: incident({ words: "Another" }), headers });
  expect(other.status).toBe(422);

  const key = { "Idempotency-Key": randomUUID() };
  expect((await ask("POST", "/incidents", { token: good, body: incident({ step: 190 }), headers: key })).status).toBe(
    422,
  );
  const mended = await ask("POST", "/incidents", { token: good, body: incident({ words: "Mended" }), headers: key });
  expect(mended.status).toBe(201);

  const together = { "Idempotency-Key": randomUUID() };
  const name = `Together ${randomUUID()}`;
  const both = await Promise.all(
    [1, 2].map(() => ask("POST", "/stacks", { token: good, body: stack(name), headers: together })),
  );
  expect(both.map(({ status }) => status).filter((status) => ![201, 409].includes(status))).toEqual([]);
  expect(await asOwner(database, "select 1 from stack where name = ?", [name])).toHaveLength(1);
});

test("faults are pointed at", async () => {
  const sent = stack("Faulty", { silicon_thickness_m: "thin", colour: "red", films: [{ side: "top" }] });
  const refused = await ask("POST", "/stacks", { token: good, body: sent });
  expect(refused.status).toBe(422);
  expect(refused.headers.get("Content-Type")).toBe("application/problem+json");
  const { errors } = (await refused.json()) as { errors: { pointer: string }[] };
  expect(errors.map(({ pointer }) => pointer)).toEqual(
    expect.arrayContaining(["/silicon_thickness_m", "/colour", "/films/0/side", "/films/0/film_id"]),
  );
});

test("nothing that is sent makes the server fail", { timeout: 600_000 }, async () => {
  const runs = Number(process.env["API_FUZZ_RUNS"] ?? 150);
  const text = fc.oneof(
    fc.string({ maxLength: 60 }),
    fc.constantFrom("\0", "'", "%00", "tern", "1e999", "../..", "{}"),
  );
  await fc.assert(
    fc.asyncProperty(
      fc.constantFrom(...operations),
      fc.oneof(text, fc.uuid(), fc.constant("")),
      fc.dictionary(fc.constantFrom("limit", "cursor", "program", "state", "flow_id", "lot_id", "x"), text, {
        maxKeys: 3,
      }),
      fc.dictionary(
        fc.constantFrom("name", "program", "films", "text", "id", "step", "wafer", "note"),
        fc.jsonValue(),
        { maxKeys: 4 },
      ),
      fc.boolean(),
      async (operation, id, query, changed, whole) => {
        const path = operation.path.replaceAll(/\{(\w+)\}/g, (_, name: string) =>
          id === "" ? (ids[name] ?? "") : encodeURIComponent(id),
        );
        const { body: usual } = BODIES[operation.id]?.() ?? {};
        const body = whole ? { ...(usual as object | undefined), ...changed } : changed;
        const response = await ask(operation.method, `${path}?${new URLSearchParams(query).toString()}`, {
          token: good,
          ...(operation.method !== "GET" && { body }),
        });
        expect(response.status, `${operation.id} ${JSON.stringify({ id, query, body })}`).toBeLessThan(500);
      },
    ),
    { numRuns: runs },
  );
});
