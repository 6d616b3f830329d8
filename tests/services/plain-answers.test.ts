import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import { KIND_KEYS, type KindSlug } from "#app/lib/library-kinds.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { MONITOR_PARAMETERS } from "#app/db/seeders/demo-monitor.ts";

const database = useDatabase({ demo: true });

const modules = async () => ({
  ...(await import("#app/services/assessments/assessments.server.ts")),
  ...(await import("#app/services/assessments/newest-assessments.server.ts")),
  ...(await import("#app/services/estimates.server.ts")),
  ...(await import("#app/services/flows/flow-page.server.ts")),
  ...(await import("#app/services/flows/flows.server.ts")),
  ...(await import("#app/services/flows/head-choices.server.ts")),
  ...(await import("#app/services/flows/new-flow-page.server.ts")),
  ...(await import("#app/services/flows/step-choices.server.ts")),
  ...(await import("#app/services/flows/step-page.server.ts")),
  ...(await import("#app/services/library/kind-pages.server.ts")),
  ...(await import("#app/services/library/library.server.ts")),
  ...(await import("#app/services/library/use.server.ts")),
  ...(await import("#app/services/limits.server.ts")),
  ...(await import("#app/services/rule-texts.server.ts")),
  ...(await import("#app/services/scan-upload.server.ts")),
  ...(await import("#app/services/scans.server.ts")),
  ...(await import("#app/services/stack-page.server.ts")),
  ...(await import("#app/services/stacks.server.ts")),
  ...(await import("#app/services/today.server.ts")),
});

const views = async () => ({
  ...(await import("#app/lib/assessment-view.ts")),
  ...(await import("#app/lib/assessment-working.ts")),
  ...(await import("#app/lib/sheet-view.ts")),
});

/** Keys that an entity of the ORM carries, and what no answer may ever hold. */
const FORBIDDEN = /^(?:__.*|passwordHash|tokenHash|password)$/;

/** Where an answer is more than objects, arrays, strings, finite numbers, booleans and null; `undefined` is left out of JSON. */
function strangeIn(answer: unknown, at = "answer"): string[] {
  if (answer === null || ["string", "boolean", "undefined"].includes(typeof answer)) return [];
  if (typeof answer === "number") return Number.isFinite(answer) ? [] : [`${at} is ${answer}`];
  if (typeof answer !== "object") return [`${at} is a ${typeof answer}`];
  if (Array.isArray(answer)) return answer.flatMap((item, index) => strangeIn(item, `${at}[${index}]`));
  const prototype: unknown = Object.getPrototypeOf(answer);
  if (prototype !== Object.prototype && prototype !== null)
    return [`${at} is a ${(prototype as { constructor?: { name?: string } }).constructor?.name ?? "stranger"}`];
  return Reflect.ownKeys(answer).flatMap((key) => {
    const here = `${at}.${String(key)}`;
    if (typeof key === "symbol" || FORBIDDEN.test(key)) return [`${here} is there`];
    return strangeIn((answer as Record<string, unknown>)[key], here);
  });
}

const LIST = { query: "", sort: "", descending: false, page: 1, filters: {} };
const NOTHING_ASKED = new URLSearchParams();

let engineer: ActorScope;
let guest: ActorScope;
let ids: Record<"flow" | "step" | "stack" | "film" | "scan" | "assessment", string>;

async function idOf(sql: string, params: unknown[] = []): Promise<string> {
  const [row] = await asOwner<{ id: string }>(database, sql, params);
  if (!row) throw new Error(`no row for: ${sql}`);
  return row.id;
}

const profile = (name: string) => ({
  name,
  bytes: new Uint8Array(readFileSync(new URL(`../../fixtures/scans/${name}`, import.meta.url))),
});

// Loading the server's modules, one assessment and one reading of two profiles take longer than a hook should.
beforeAll(async () => {
  await views();
  const { runAssessment, uploadScan } = await modules();
  engineer = await scopeOfPerson(database, "engineer");
  guest = await scopeOfPerson(database, "guest");
  const flow = await idOf("select id from flow limit 1");
  const film = await idOf("select id from film where name = 'Polymer dielectric A'");
  const assessed = await runAssessment(engineer, flow);
  const scanned = await uploadScan(
    engineer,
    { program: await idOf("select id from program where slug = 'tern'"), label: "M-1", film, ...MONITOR_PARAMETERS },
    {
      before: profile("monitor-200mm-725um-before-film-seed-7.csv"),
      after: profile("monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv"),
    },
  );
  if (assessed.outcome !== "stored" || scanned.outcome !== "stored")
    throw new Error("the demo flow cannot be assessed");
  ids = {
    flow,
    film,
    assessment: assessed.id,
    scan: scanned.id,
    step: await idOf("select id from flow_step where flow_id = ? order by position limit 1", [flow]),
    stack: await idOf("select id from stack limit 1"),
  };
}, 180_000);

const ESTIMATE = {
  wafer: { diameter_m: 0.3, thickness_m: 775e-6, orientation: "100" },
  films: [{ side: "front", thickness_m: 5e-6, stress_Pa: 100e6, youngs_modulus_Pa: 117e9, poissons_ratio: 0.34 }],
  sweep: { from_m: 50e-6, to_m: 775e-6, points: 5 },
  working: true,
};

type Services = Awaited<ReturnType<typeof modules>>;
type Views = Awaited<ReturnType<typeof views>>;
type Ask = (services: Services, scope: ActorScope, views: Views) => unknown;

const kinds = Object.keys(KIND_KEYS) as KindSlug[];
const firstOf = (slug: KindSlug) => idOf(`select id from "${TABLES[slug]}" order by name limit 1`);
const TABLES: Record<KindSlug, string> = {
  carriers: "carrier",
  "bonding-materials": "bonding_material",
  tapes: "tape",
  silicon: "silicon",
  tools: "equipment",
};

const ANSWERS: [what: string, ask: Ask][] = [
  ["films", ({ listLibraryAt }, scope) => listLibraryAt(scope, "film", NOTHING_ASKED)],
  ["all films", ({ allOfLibrary }, scope) => allOfLibrary(scope, "film")],
  ["a film", ({ getLibraryRecord }, scope) => getLibraryRecord(scope, "film", ids.film)],
  ...kinds.map((slug): [string, Ask] => [slug, ({ listKind }, scope) => listKind(scope, slug, NOTHING_ASKED)]),
  ...kinds.map((slug): [string, Ask] => [
    `one of ${slug}`,
    async ({ getKindPage }, scope) => getKindPage(scope, slug, await firstOf(slug), NOTHING_ASKED),
  ]),
  ["limits", ({ listLimits }, scope) => listLimits(scope)],
  ["stacks", ({ listStacks }, scope) => listStacks(scope, LIST)],
  ["a stack", ({ stackPage }, scope) => stackPage(scope, ids.stack, NOTHING_ASKED)],
  ["a copy of a stack", ({ newStackPage }, scope) => newStackPage(scope, new URLSearchParams({ from: ids.stack }))],
  ["flows", ({ listFlows }, scope) => listFlows(scope, LIST)],
  ["a flow", ({ flowPage }, scope) => flowPage(scope, ids.flow)],
  ["a flow, whole", ({ getFlow }, scope) => getFlow(scope, ids.flow)],
  ["a flow's head", ({ headChoices }, scope) => headChoices(scope)],
  ["a new flow", ({ newFlowPage }, scope) => newFlowPage(scope, new URLSearchParams({ stack: ids.stack }))],
  ["a step", ({ stepPage }, scope) => stepPage(scope, { flowId: ids.flow, stepId: ids.step })],
  ["a new step", ({ newStepPage }, scope) => newStepPage(scope, { flowId: ids.flow, search: NOTHING_ASKED })],
  ["assessments", ({ listNewestAssessments }, scope) => listNewestAssessments(scope, LIST)],
  ["an assessment", ({ getAssessment }, scope) => getAssessment(scope, ids.assessment)],
  [
    "an assessment's page",
    async ({ getAssessment }, scope, { assessmentView }) => {
      const { result, ...head } = await getAssessment(scope, ids.assessment);
      return assessmentView(head, result, "14");
    },
  ],
  [
    "a working",
    async ({ getAssessment }, scope, { figureAskedFor }) => {
      const { result } = await getAssessment(scope, ids.assessment);
      return figureAskedFor(result, new URLSearchParams({ step: "14", shape: "released" })) ?? expect.fail("no figure");
    },
  ],
  [
    "a sheet",
    async ({ getAssessment }, scope, { sheetView }) => {
      const { result, ...head } = await getAssessment(scope, ids.assessment);
      return sheetView(head, result);
    },
  ],
  ["scans", ({ listScans }, scope) => listScans(scope, LIST)],
  ["a scan", ({ getScan }, scope) => getScan(scope, ids.scan)],
  ["an estimate", ({ estimate }, scope) => estimate(scope, ESTIMATE)],
];

/** What everybody may ask for, with less in it for a guest. */
const FOR_ALL: [what: string, ask: Ask][] = [
  ["today", ({ todayView }, scope) => todayView(scope)],
  ["a film's use", ({ whereUsed }, scope) => whereUsed(scope, "film", ids.film)],
  ["the rules in words", ({ ruleTexts }, scope) => ruleTexts(scope)],
];

const asked = async (ask: Ask, scope: ActorScope) => ask(await modules(), scope, await views());

describe("what an engineer is answered is plain", () => {
  test.each([...ANSWERS, ...FOR_ALL])("%s", { timeout: 60_000 }, async (_, ask) => {
    const answer = await asked(ask, engineer);
    expect(strangeIn(answer)).toEqual([]);
    expect(JSON.stringify(answer).length).toBeGreaterThan(20);
  });
});

describe("a guest", () => {
  test.each(FOR_ALL)("is answered plainly: %s", { timeout: 60_000 }, async (_, ask) => {
    expect(strangeIn(await asked(ask, guest))).toEqual([]);
  });

  test.each(ANSWERS)("is refused %s", { timeout: 60_000 }, async (_, ask) => {
    const refused: unknown = await asked(ask, guest).then(
      () => null,
      (refusal: unknown) => refusal,
    );
    const status = (refused as { init?: { status?: number } } | null)?.init?.status ?? "an answer";
    expect([403, 404]).toContain(status);
  });
});

test("an entity is told from a plain answer", async () => {
  const { Film } = await import("#app/db/entities/film.ts");
  const [film] = await database.owner.em.fork().find(Film, {}, { limit: 1 });
  expect(strangeIn({ film })).not.toEqual([]);
  expect(strangeIn({ when: new Date(0) })).toEqual(["answer.when is a Date"]);
  expect(strangeIn({ deep: [{ passwordHash: "x" }] })).toEqual(["answer.deep[0].passwordHash is there"]);
  expect(strangeIn({ call: () => 1, amount: Number.NaN })).toHaveLength(2);
});
