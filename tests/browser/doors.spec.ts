import { randomUUID } from "node:crypto";
import { request as newRequest, type APIRequestContext } from "@playwright/test";
import type { RouteConfigEntry } from "@react-router/dev/routes";
import routes from "#app/routes.ts";
import { strangeIds, ternIds, WALLED, type DoorIds } from "./door-ids.ts";
import {
  atTheDoor,
  everybody,
  hidden,
  inProgram,
  inSome,
  onSite,
  signedIn,
  VISITORS,
  type Door,
} from "./door-rules.ts";
import { accountOf, expect, test } from "./support.ts";

/**
 * Who may pass each address, by the permission that stands behind it, and what it answers to a GET with nothing but ids (200 where nothing
 * is said). A route without a line here fails the tests, so nobody adds one without saying who may pass.
 */
const DOORS: Record<string, Door> = {
  "/healthz": everybody(),
  "/readyz": everybody(),
  "/sign-in": atTheDoor(),
  "/sign-in/code": everybody(302),
  "/sign-in/set-up": everybody(302),
  "/confirm-address/:secret": everybody(404),
  "/forgotten": everybody(),
  "/set-password/:secret": everybody(404),
  "/unsubscribe/:token": everybody(404),
  "/sign-out": everybody(302),
  "/api/v1/openapi.json": everybody(),
  "/api/v1/*": everybody(404),
  "/api": signedIn(),
  "/s/:token": everybody(404),
  "/sheets/:assessmentId": inProgram("see the work"),
  "/sheets/:assessmentId/draft.pdf": inProgram("see the work"),
  "/floor": inSome("work on the floor"),
  "/floor/lots/:lotId": inProgram("work on the floor"),
  "/floor/lots/:lotId/entries": signedIn(404),
  "/floor/lots/:lotId/steps/:number": inProgram("work on the floor", 302),
  "/floor/hand-overs": inSome("work on the floor"),
  "/floor/hand-overs/new": inSome("work on the floor"),
  "/floor/hand-overs/:handOverId": inProgram("work on the floor"),
  "/": signedIn(),
  "/films": onSite("see the library"),
  "/films/new": onSite("edit films"),
  "/films/films.csv": onSite("see the library"),
  "/films/compare": onSite("see the library"),
  "/films/import": onSite("edit films"),
  "/films/:filmId": onSite("see the library"),
  "/films/:filmId/edit": onSite("edit films"),
  "/films/:filmId/stress.csv": onSite("see the library"),
  "/stacks": inSome("see the work"),
  "/stacks/new": inSome("edit stacks and flows"),
  "/stacks/duplicate": inSome("edit stacks and flows"),
  "/stacks/remove": inSome("edit stacks and flows"),
  "/stacks/compare": inSome("see the work"),
  "/stacks/compare.csv": inSome("see the work", 400),
  "/stacks/compare.svg": inSome("see the work", 400),
  "/stacks/compare/print": inSome("see the work", 400),
  "/stacks/sweep": inSome("see the work"),
  "/stacks/:stackId": inProgram("see the work"),
  "/stacks/:stackId/sweep": inProgram("see the work"),
  "/stacks/:stackId/sweep.csv": inProgram("see the work"),
  "/stacks/:stackId/sweep.svg": inProgram("see the work"),
  "/stacks/:stackId/sweep/print": inProgram("see the work"),
  "/flows": inSome("see the work"),
  "/flows/assess": inSome("run assessments"),
  "/flows/mark": everybody(302),
  "/flows/new": inSome("edit stacks and flows"),
  "/flows/compare": inSome("see the work"),
  "/flows/compare.csv": inSome("see the work", 400),
  "/flows/compare.svg": inSome("see the work", 400),
  "/flows/compare/print": inSome("see the work", 400),
  "/flows/:flowId": inProgram("see the work"),
  "/flows/:flowId/what-if": inProgram("run assessments"),
  "/flows/library/:kind": onSite("see the library"),
  "/flows/library/flows/:templateId": onSite("see the library"),
  "/flows/library/steps/new": onSite("edit the step library"),
  "/flows/library/steps/:templateId": onSite("see the library"),
  "/flows/:flowId/edit": inProgram("edit stacks and flows"),
  "/flows/:flowId/keep": inProgram("edit stacks and flows"),
  "/flows/:flowId/steps/new": inProgram("edit stacks and flows"),
  "/flows/:flowId/steps/:stepId": inProgram("see the work"),
  "/assessments/:assessmentId": inProgram("see the work"),
  "/assessments/:assessmentId/working": inProgram("see the work"),
  "/assessments/:assessmentId/compare": inProgram("see the work"),
  "/assessments/change-request": inSome("see the work"),
  "/assessments/change-request/print": inSome("see the work", 400),
  "/assessments/:assessmentId/lot": inProgram("see the work"),
  "/assessments/:assessmentId/measured": inProgram("see the work"),
  "/assessments/:assessmentId/remedies": inProgram("see the work"),
  "/assessments/:assessmentId/carriers": inProgram("see the work"),
  "/assessments/:assessmentId/carriers.csv": inProgram("see the work"),
  "/assessments/:assessmentId/window": inProgram("see the work"),
  "/assessments/:assessmentId/trial": inProgram("run assessments"),
  "/assessments/:assessmentId/trial/window": inProgram("run assessments"),
  "/assessments/:assessmentId/tried": inProgram("see the work", 400),
  "/carriers": onSite("see the library", 302),
  "/carriers/limits": onSite("see the library"),
  "/carriers/bonding-materials/:materialId/calibrate": onSite("see the library"),
  "/carriers/:kind": onSite("see the library"),
  "/carriers/:kind/new": onSite("edit carriers, bonds and limits"),
  "/carriers/:kind/:recordId": onSite("see the library"),
  "/carriers/:kind/:recordId/edit": onSite("edit carriers, bonds and limits"),
  "/scans": inSome("see the work"),
  "/scans/new": inSome("upload scans"),
  "/scans/import": inSome("upload scans"),
  "/scans/import/file": inSome("upload scans", 404),
  "/scans/undo": inSome("upload scans", 404),
  "/scans/waiting": inSome("see the work"),
  "/scans/waiting/:waferScanId": inProgram("see the work"),
  "/scans/files/:fileId": inProgram("see the work"),
  "/scans/:scanId": inProgram("see the work"),
  "/wafers/:waferId": inProgram("see the work"),
  "/wafers/:waferId/figures.csv": inProgram("see the work"),
  "/wafers/:waferId/profiles.csv": inProgram("see the work"),
  "/instruments": onSite("see the library"),
  "/instruments/:instrumentId": onSite("see the library"),
  "/instruments/:instrumentId/study": onSite("check instruments"),
  "/instruments/:instrumentId/reference": onSite("check instruments"),
  "/scans/:scanId/accept": inProgram("accept stresses"),
  "/predictions": inSome("see the work"),
  "/predictions/points.csv": inSome("see the work"),
  "/lots": inSome("see the work"),
  "/lots/new": inSome("upload scans"),
  "/lots/:lotId": inProgram("see the work"),
  "/import-profiles": onSite("keep import profiles"),
  "/demo": onSite("load and remove the demo"),
  "/tokens": inSome("see released sheets"),
  "/webhooks": inSome("keep webhooks"),
  "/webhooks/receiving": signedIn(),
  "/webhooks/:webhookId": hidden("look after webhooks"),
  "/webhooks/:webhookId/deliveries/:deliveryId": hidden("look after webhooks"),
  "/delegates": inSome("see the work"),
  "/people": onSite("manage people"),
  "/people/new": onSite("manage people"),
  "/people/:personId": onSite("manage people"),
  "/account": signedIn(),
  "/account/codes": signedIn(),
  "/settings": onSite("edit site settings"),
  "/audit": onSite("see the audit trail"),
  "/audit/trail.csv": onSite("see the audit trail"),
  "/audit/seals": onSite("see the audit trail"),
  "/preferences": signedIn(),
  "/preferences/mail": signedIn(),
  "/mail": signedIn(),
  "/mail/outbox": inSome("see the outbox"),
  "/mail/:mailId": signedIn(404),
  "/mail/:mailId/html": signedIn(404),
  "/favourites": signedIn(),
  "/saved-filters": everybody(302),
  "/search": signedIn(),
  "/search/found": signedIn(),
  "/jobs": inSome("see the work"),
  "/changes": signedIn(400),
  "/incidents": inSome("see the work"),
  "/incidents/new": inSome("report incidents"),
  "/incidents/rates": inSome("see the work"),
  "/incidents/incidents.csv": inSome("see the work"),
  "/incidents/:incidentId": inProgram("see the work"),
  "/incidents/:incidentId/photos/:photoId": inProgram("see the work"),
  "/sheets": inSome("see released sheets"),
  "/sheets/drafts": inSome("see the work"),
  "/sheets/revisions/:revisionId": inProgram("see the work", 302),
  "/sheets/revisions/:revisionId/read": signedIn(404),
  "/sheets/revisions/:revisionId/sheet.pdf": inProgram("see the work", 302),
  "/assessments/:assessmentId/review": inProgram("see the work"),
  "/method": signedIn(),
  "/*": signedIn(404),
};

/** Every address of the application, as the route table has it. */
function addresses(entries: RouteConfigEntry[], above = ""): string[] {
  return entries.flatMap(({ path, children }) => {
    const here = path ? `${above}/${path}` : above;
    return children ? addresses(children, here) : [here || "/"];
  });
}

/** What an address asks for that shows nothing without it. */
const ASKED: Record<string, string> = {
  "/assessments/:assessmentId/working": "?step=14&shape=released",
  "/unsubscribe/:token": "?kind=digest",
};

/** Ids for an address: the step library has kinds of its own. */
const idsFor = (address: string, ids: DoorIds): DoorIds =>
  address.startsWith("/flows/library")
    ? {
        ...ids,
        kind: "flows",
        templateId: ids[address.includes("/steps/") ? "stepTemplateId" : "flowTemplateId"] ?? "",
      }
    : ids;

/** The address with ids in it. */
const filled = (address: string, ids: DoorIds) => {
  const known = idsFor(address, ids);
  const path = address.replace(
    /:(\w+)|\*/g,
    (parameter, name: string | undefined) => known[name ?? parameter] ?? parameter,
  );
  return path + (ASKED[address] ?? "");
};

async function visitor(role: (typeof VISITORS)[number], baseURL: string | undefined): Promise<APIRequestContext> {
  const context = await newRequest.newContext({ baseURL: baseURL ?? "" });
  if (role === "nobody") return context;
  const { email, password } = accountOf(role);
  const answer = await context.post("/sign-in", { form: { email, password }, maxRedirects: 0 });
  expect(answer.status()).toBe(302);
  return context;
}

let own: DoorIds = {};
let strange: DoorIds = {};

test.beforeAll(async ({ baseURL }) => {
  test.setTimeout(120_000);
  const engineer = await visitor("engineer", baseURL);
  own = await ternIds(engineer);
  strange = await strangeIds(own);
  await engineer.dispose();
});

test("every route has its line in the table of doors", () => {
  expect(addresses(routes).toSorted()).toEqual(Object.keys(DOORS).toSorted());
});

/** Requests at a time: the server answers others while one waits for the database. */
const AT_ONCE = 4;

async function answers(context: APIRequestContext, ids: DoorIds, asked: readonly string[]) {
  const found: Record<string, string> = {};
  const left = [...asked];
  const ask = async () => {
    for (let address = left.shift(); address !== undefined; address = left.shift())
      found[address] = String((await context.get(filled(address, ids), { maxRedirects: 0 })).status());
  };
  await Promise.all(Array.from({ length: AT_ONCE }, ask));
  return found;
}

for (const role of VISITORS)
  test.describe(`${role} at the door`, () => {
    // Some hundred and fifty pages.
    test.setTimeout(180_000);

    test("gets what the permissions say of each address of their own program", async ({ baseURL }) => {
      const context = await visitor(role, baseURL);
      const expected = Object.fromEntries(
        Object.entries(DOORS).map(([address, door]) => [address, String(door(role))]),
      );
      expect(await answers(context, own, Object.keys(DOORS))).toEqual(expected);
      await context.dispose();
    });

    test("gets nothing of a program that is not their own, and no word that it exists", async ({ baseURL }) => {
      const context = await visitor(role, baseURL);
      const asked = Object.keys(DOORS).filter((address) => WALLED.some((name) => address.includes(`:${name}`)));
      const refused = role === "nobody" ? "302" : "404";
      const expected = Object.fromEntries(asked.map((address) => [address, refused]));
      expect(await answers(context, strange, asked)).toEqual(expected);
      const { stepId = "" } = strange;
      const step = "/flows/:flowId/steps/:stepId";
      expect(await answers(context, { ...own, stepId }, [step])).toEqual({ [step]: refused });
      await context.dispose();
    });
  });

/** What queries of our addresses are called, each with what might get into a statement, a pattern or a page. */
const HOSTILE = Object.fromEntries(
  `q sort page program state kind event outcome fits instrument list format actor person subject action from to of by leg step shape at
   lot x y part do place rule job film with demo imported paper wafer side back`
    .split(/\s+/)
    .map((name) => [name, `${name}' or '1'='1'; select pg_sleep(20);--\u0000%_\\"><script>{{7*7}}`]),
);

const AS_IT_CAME = '"><script>{{7*7}}';

test("nothing that an address is given makes the server fail, or opens what is shut", async ({ baseURL }) => {
  test.setTimeout(180_000);
  const query = new URLSearchParams(HOSTILE).toString();
  for (const role of ["process owner", "administrator"] as const) {
    const context = await visitor(role, baseURL);
    const wrong: string[] = [];
    const left = Object.keys(DOORS).filter(
      (address) => role === "process owner" || DOORS[address]?.("technician") === 403,
    );
    const ask = async () => {
      for (let address = left.shift(); address !== undefined; address = left.shift()) {
        const path = filled(address, own).split("?")[0] ?? "";
        const answer = await context.get(`${path}?${query}`, { maxRedirects: 0 });
        const usual = DOORS[address]?.(role) ?? 0;
        const opened = usual >= 400 && answer.status() < 300;
        if (answer.status() >= 500 || opened) wrong.push(`${address} ${answer.status()}`);
        else if (/html/.test(answer.headers()["content-type"] ?? "") && (await answer.text()).includes(AS_IT_CAME))
          wrong.push(`${address} writes it as it came`);
      }
    };
    await Promise.all(Array.from({ length: AT_ONCE }, ask));
    expect(wrong, role).toEqual([]);
    await context.dispose();
  }
});

test("what is not there and what is of another program are told apart by nothing", async ({ baseURL }) => {
  const context = await visitor("engineer", baseURL);
  const nowhere = Object.fromEntries(
    Object.entries(own).map(([name, id]) => [name, WALLED.includes(name) ? randomUUID() : id]),
  );
  const said = async (address: string, ids: DoorIds) => {
    const text = await (await context.get(filled(address, ids), { maxRedirects: 0 })).text();
    return (/There is no such [^<"\\]*/.exec(text) ?? [text])[0];
  };
  for (const address of Object.keys(DOORS).filter((known) => WALLED.some((name) => known.includes(`:${name}`))))
    expect(await said(address, strange), address).toBe(await said(address, nowhere));
  await context.dispose();
});
