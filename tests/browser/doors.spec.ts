import { request as newRequest, type APIRequestContext } from "@playwright/test";
import type { RouteConfigEntry } from "@react-router/dev/routes";
import routes from "#app/routes.ts";
import { strangeIds, ternIds, WALLED, type DoorIds } from "./door-ids.ts";
import { accountOf, expect, test, type Role } from "./support.ts";

const VISITORS = [
  "nobody",
  "guest",
  "technician",
  "engineer",
  "process owner",
  "shift lead",
  "administrator",
] as const satisfies ("nobody" | Role)[];

/**
 * What every address answers to a GET, in the order of the visitors, with ids of a program that all of them belong to. A route
 * without a line here fails the tests, so nobody adds one without saying who may pass.
 */
const DOORS: Record<string, string> = {
  "/healthz": "200 200 200 200 200 200 200",
  "/readyz": "200 200 200 200 200 200 200",
  "/sign-in": "200 302 302 302 302 302 302",
  "/sign-in/code": "302 302 302 302 302 302 302",
  "/sign-in/set-up": "302 302 302 302 302 302 302",
  "/confirm-address/:secret": "404 404 404 404 404 404 404",
  "/forgotten": "200 200 200 200 200 200 200",
  "/set-password/:secret": "404 404 404 404 404 404 404",
  "/unsubscribe/:token": "404 404 404 404 404 404 404",
  "/sign-out": "302 302 302 302 302 302 302",
  "/api/v1/openapi.json": "200 200 200 200 200 200 200",
  "/api/v1/*": "404 404 404 404 404 404 404",
  "/api": "302 200 200 200 200 200 200",
  "/s/:token": "404 404 404 404 404 404 404",
  "/sheets/:assessmentId": "302 404 200 200 200 200 404",
  "/sheets/:assessmentId/draft.pdf": "302 404 200 200 200 200 404",
  "/floor": "302 403 200 200 200 200 403",
  "/floor/lots/:lotId": "302 404 200 200 200 200 404",
  "/floor/lots/:lotId/entries": "302 404 404 404 404 404 404",
  "/floor/lots/:lotId/steps/:number": "302 404 302 302 302 302 404",
  "/floor/hand-overs": "302 403 200 200 200 200 403",
  "/floor/hand-overs/new": "302 403 200 200 200 200 403",
  "/floor/hand-overs/:handOverId": "302 404 200 200 200 200 404",
  "/": "302 200 200 200 200 200 200",
  "/films": "302 403 200 200 200 200 200",
  "/films/new": "302 403 403 200 200 403 403",
  "/films/films.csv": "302 403 200 200 200 200 200",
  "/films/compare": "302 403 200 200 200 200 200",
  "/films/import": "302 403 403 200 200 403 403",
  "/films/:filmId": "302 403 200 200 200 200 200",
  "/films/:filmId/edit": "302 403 403 200 200 403 403",
  "/films/:filmId/stress.csv": "302 403 200 200 200 200 200",
  "/stacks": "302 403 200 200 200 200 403",
  "/stacks/new": "302 403 403 200 200 403 403",
  "/stacks/duplicate": "302 403 403 200 200 403 403",
  "/stacks/remove": "302 403 403 200 200 403 403",
  "/stacks/compare": "302 403 200 200 200 200 403",
  "/stacks/compare.csv": "302 403 400 400 400 400 403",
  "/stacks/compare.svg": "302 403 400 400 400 400 403",
  "/stacks/compare/print": "302 403 400 400 400 400 403",
  "/stacks/sweep": "302 403 200 200 200 200 403",
  "/stacks/:stackId": "302 404 200 200 200 200 404",
  "/stacks/:stackId/sweep": "302 404 200 200 200 200 404",
  "/stacks/:stackId/sweep.csv": "302 404 200 200 200 200 404",
  "/stacks/:stackId/sweep.svg": "302 404 200 200 200 200 404",
  "/stacks/:stackId/sweep/print": "302 404 200 200 200 200 404",
  "/flows": "302 403 200 200 200 200 403",
  "/flows/assess": "302 403 403 200 200 403 403",
  "/flows/mark": "302 302 302 302 302 302 302",
  "/flows/new": "302 403 403 200 200 403 403",
  "/flows/compare": "302 403 200 200 200 200 403",
  "/flows/compare.csv": "302 403 400 400 400 400 403",
  "/flows/compare.svg": "302 403 400 400 400 400 403",
  "/flows/compare/print": "302 403 400 400 400 400 403",
  "/flows/:flowId": "302 404 200 200 200 200 404",
  "/flows/:flowId/what-if": "302 404 403 200 200 403 404",
  "/flows/library/:kind": "302 403 200 200 200 200 200",
  "/flows/library/flows/:templateId": "302 403 200 200 200 200 200",
  "/flows/library/steps/new": "302 403 403 200 200 403 403",
  "/flows/library/steps/:templateId": "302 403 200 200 200 200 200",
  "/flows/:flowId/edit": "302 404 403 200 200 403 404",
  "/flows/:flowId/keep": "302 404 403 200 200 403 404",
  "/flows/:flowId/steps/new": "302 404 403 200 200 403 404",
  "/flows/:flowId/steps/:stepId": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/working": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/compare": "302 404 200 200 200 200 404",
  "/assessments/change-request": "302 403 200 200 200 200 403",
  "/assessments/change-request/print": "302 403 400 400 400 400 403",
  "/assessments/:assessmentId/lot": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/measured": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/remedies": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/carriers": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/carriers.csv": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/window": "302 404 200 200 200 200 404",
  "/assessments/:assessmentId/trial": "302 404 403 200 200 403 404",
  "/assessments/:assessmentId/trial/window": "302 404 403 200 200 403 404",
  "/assessments/:assessmentId/tried": "302 404 400 400 400 400 404",
  "/carriers": "302 403 302 302 302 302 302",
  "/carriers/limits": "302 403 200 200 200 200 200",
  "/carriers/bonding-materials/:materialId/calibrate": "302 403 200 200 200 200 200",
  "/carriers/:kind": "302 403 200 200 200 200 200",
  "/carriers/:kind/new": "302 403 403 403 200 403 200",
  "/carriers/:kind/:recordId": "302 403 200 200 200 200 200",
  "/carriers/:kind/:recordId/edit": "302 403 403 403 200 403 200",
  "/scans": "302 403 200 200 200 200 403",
  "/scans/new": "302 403 200 200 200 200 403",
  "/scans/import": "302 403 200 200 200 200 403",
  "/scans/import/file": "302 403 404 404 404 404 403",
  "/scans/undo": "302 403 404 404 404 404 403",
  "/scans/waiting": "302 403 200 200 200 200 403",
  "/scans/waiting/:waferScanId": "302 404 200 200 200 200 404",
  "/scans/files/:fileId": "302 404 200 200 200 200 404",
  "/scans/:scanId": "302 404 200 200 200 200 404",
  "/wafers/:waferId": "302 404 200 200 200 200 404",
  "/wafers/:waferId/figures.csv": "302 404 200 200 200 200 404",
  "/wafers/:waferId/profiles.csv": "302 404 200 200 200 200 404",
  "/instruments": "302 403 200 200 200 200 200",
  "/instruments/:instrumentId": "302 403 200 200 200 200 200",
  "/instruments/:instrumentId/study": "302 403 200 200 200 200 403",
  "/instruments/:instrumentId/reference": "302 403 200 200 200 200 403",
  "/scans/:scanId/accept": "302 404 403 200 200 403 404",
  "/predictions": "302 403 200 200 200 200 403",
  "/predictions/points.csv": "302 403 200 200 200 200 403",
  "/lots": "302 403 200 200 200 200 403",
  "/lots/new": "302 403 200 200 200 200 403",
  "/lots/:lotId": "302 404 200 200 200 200 404",
  "/import-profiles": "302 403 200 200 200 200 403",
  "/demo": "302 403 403 403 200 403 403",
  "/tokens": "302 200 200 200 200 200 200",
  "/delegates": "302 403 200 200 200 200 403",
  "/people": "302 403 403 403 403 403 200",
  "/people/new": "302 403 403 403 403 403 200",
  "/people/:personId": "302 403 403 403 403 403 200",
  "/account": "302 200 200 200 200 200 200",
  "/account/codes": "302 200 200 200 200 200 200",
  "/settings": "302 403 403 403 403 403 200",
  "/audit": "302 403 403 403 403 403 200",
  "/audit/trail.csv": "302 403 403 403 403 403 200",
  "/audit/seals": "302 403 403 403 403 403 200",
  "/preferences": "302 200 200 200 200 200 200",
  "/preferences/mail": "302 200 200 200 200 200 200",
  "/mail": "302 200 200 200 200 200 200",
  "/mail/outbox": "302 403 403 403 200 403 200",
  "/mail/:mailId": "302 404 404 404 404 404 404",
  "/mail/:mailId/html": "302 404 404 404 404 404 404",
  "/favourites": "302 200 200 200 200 200 200",
  "/saved-filters": "302 302 302 302 302 302 302",
  "/search": "302 200 200 200 200 200 200",
  "/search/found": "302 200 200 200 200 200 200",
  "/jobs": "302 403 200 200 200 200 403",
  "/incidents": "302 403 200 200 200 200 403",
  "/incidents/new": "302 403 200 200 200 200 403",
  "/incidents/rates": "302 403 200 200 200 200 403",
  "/incidents/incidents.csv": "302 403 200 200 200 200 403",
  "/incidents/:incidentId": "302 404 200 200 200 200 404",
  "/incidents/:incidentId/photos/:photoId": "302 404 200 200 200 200 404",
  "/sheets": "302 200 200 200 200 200 200",
  "/sheets/drafts": "302 403 200 200 200 200 403",
  "/sheets/revisions/:revisionId": "302 404 302 302 302 302 404",
  "/sheets/revisions/:revisionId/read": "302 404 404 404 404 404 404",
  "/sheets/revisions/:revisionId/sheet.pdf": "302 404 302 302 302 302 404",
  "/assessments/:assessmentId/review": "302 404 200 200 200 200 404",
  "/method": "302 200 200 200 200 200 200",
  "/*": "302 404 404 404 404 404 404",
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

for (const [column, role] of VISITORS.entries())
  test.describe(`${role} at the door`, () => {
    // Some sixty pages one after the other.
    test.setTimeout(180_000);

    const answers = async (context: APIRequestContext, ids: DoorIds, asked: readonly string[]) => {
      const found: Record<string, string> = {};
      for (const address of asked)
        found[address] = String((await context.get(filled(address, ids), { maxRedirects: 0 })).status());
      return found;
    };

    test("gets what the table says of each address of their own program", async ({ baseURL }) => {
      const context = await visitor(role, baseURL);
      const asked = Object.keys(DOORS);
      const expected = Object.fromEntries(asked.map((address) => [address, DOORS[address]?.split(" ")[column]]));
      expect(await answers(context, own, asked)).toEqual(expected);
      await context.dispose();
    });

    test("gets nothing of a program that is not their own, and no word that it exists", async ({ baseURL }) => {
      const context = await visitor(role, baseURL);
      const asked = Object.keys(DOORS).filter((address) => WALLED.some((name) => address.includes(`:${name}`)));
      const refused = (address: string) => (role !== "nobody" ? "404" : address.startsWith("/api/") ? "401" : "302");
      const expected = Object.fromEntries(asked.map((address) => [address, refused(address)]));
      expect(await answers(context, strange, asked)).toEqual(expected);
      const { stepId = "" } = strange;
      const step = "/flows/:flowId/steps/:stepId";
      expect(await answers(context, { ...own, stepId }, [step])).toEqual({ [step]: expected[step] });
      await context.dispose();
    });
  });
