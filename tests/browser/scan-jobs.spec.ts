import { readFileSync } from "node:fs";
import type { APIRequestContext } from "@playwright/test";
import { longProfile } from "./long-profile.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const PATH = "/api/v1/scans";
const monitor = readFileSync(
  new URL("../../fixtures/scans/monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv", import.meta.url),
  "utf8",
);
const csv = (name: string, text: string) => ({ name, mimeType: "text/csv", buffer: Buffer.from(text) });
/** Bytes that no other test has sent. */
const own = (name: string) => csv(name, `${monitor}\n# ${name}\n`);

const post = (
  request: APIRequestContext,
  file: ReturnType<typeof csv>,
  fields: Record<string, string> = {},
  accept = "application/json",
) => request.post(PATH, { multipart: { program: "tern", file, ...fields }, headers: { Accept: accept } });

interface ReadScan {
  id: string;
  import_profile: object;
  profiles: { x_m: number[]; z_m: number[]; fit: { curvature_per_m: number } }[];
}

test.describe("a technician's program", () => {
  test.beforeEach(async ({ page }) => signIn(page, "technician"));

  test("sends a file once or twice and gets the same answer", async ({ page }) => {
    const file = own("twice.csv");
    const first = await post(page.request, file, { edge_exclusion_m: "0.005" });
    expect(first.status()).toBe(201);
    const body = (await first.json()) as ReadScan;
    expect(body.profiles[0]?.fit.curvature_per_m).not.toBe(0);
    const second = await post(page.request, file, { edge_exclusion_m: "0.005" });
    expect(second.status()).toBe(200);
    expect(await second.json()).toEqual(body);
    const got = await page.request.get(first.headers()["location"] ?? "");
    expect(await got.json()).toEqual(body);
  });

  test("reads back the CSV and the import profile that it got, without a change", async ({ page }) => {
    const file = own("back.csv");
    const body = (await (await post(page.request, file)).json()) as ReadScan;
    const asCsv = await post(page.request, file, {}, "text/csv");
    expect(asCsv.status()).toBe(200);
    expect(asCsv.headers()["content-type"]).toBe("text/csv; charset=utf-8");
    const again = (await (await post(page.request, csv("again.csv", await asCsv.text()))).json()) as ReadScan;
    expect(again.profiles.map(({ x_m, z_m, fit }) => ({ x_m, z_m, fit }))).toEqual(
      body.profiles.map(({ x_m, z_m, fit }) => ({ x_m, z_m, fit })),
    );
    const answered = await post(page.request, file, { import_profile: JSON.stringify(body.import_profile) });
    expect(answered.status()).toBe(201);
    expect(((await answered.json()) as ReadScan).profiles).toEqual(body.profiles);
  });

  test.describe("", () => {
    test.use({ refusals: true });

    test("is told what is wrong, and nothing is stored", async ({ page }) => {
      const { request } = page;
      const refused = async (answer: Awaited<ReturnType<typeof post>>, status: number, says: RegExp) => {
        expect(answer.status()).toBe(status);
        expect(answer.headers()["content-type"]).toBe("application/problem+json");
        expect(await answer.text()).toMatch(says);
      };
      await refused(await post(request, csv("words.csv", "only\nwords\nhere\n")), 422, /words\.csv/);
      await refused(await post(request, own("a.csv"), { import_profile: "{" }), 422, /import profile as JSON/);
      await refused(await post(request, own("a.csv"), { import_profile: '{"decimalMark":"dot"}' }), 422, /decimalMark/);
      await refused(await post(request, own("a.csv"), { edge_exclusion_m: "5 mm" }), 422, /number of metres/);
      await refused(await post(request, own("a.csv"), { program: "heron" }), 404, /no program/);
      await refused(await request.post(PATH, { multipart: { program: "tern" } }), 422, /in the field/);
      await refused(await request.post(PATH, { data: { program: "tern" } }), 415, /multipart/);
      expect((await post(request, own("a.csv"))).status()).toBe(201);
    });
  });

  test("leaves a large file to a job, goes elsewhere, and comes back to it", async ({ page }) => {
    test.setTimeout(90_000);
    const [first, second] = [longProfile("long-one.csv", 1_000_000), longProfile("long-two.csv", 1_000_000)];
    const answer = await post(page.request, first);
    expect(answer.status()).toBe(202);
    const again = await post(page.request, first);
    expect([200, 202]).toContain(again.status());
    expect((await post(page.request, second)).status()).toBe(202);

    await page.goto("/jobs");
    const [one, two] = ["long-one.csv", "long-two.csv"].map((name) =>
      page.getByRole("listitem").filter({ hasText: name }),
    );
    await two?.getByRole("button", { name: "Stop" }).click();
    await expect(two ?? page.locator("none")).toContainText("Stopped");
    await page.getByRole("link", { name: "Scans" }).first().click();
    await expect(page.getByRole("heading", { name: "Scans", level: 1 })).toBeVisible();
    await page.getByRole("link", { name: "Work under way" }).click();
    await expect(one ?? page.locator("none")).toContainText("One read.", { timeout: 60_000 });
    await expectNoAxeFindings(page);

    const job = (await (await page.request.get(answer.headers()["location"] ?? "")).json()) as {
      state: string;
      files: { scan: string }[];
    };
    expect(job.state).toBe("done");
    const read = (await (await page.request.get(job.files[0]?.scan ?? "")).json()) as ReadScan;
    expect(read.profiles[0]?.fit.curvature_per_m).toBeCloseTo(0.007, 9);

    await two?.getByRole("button", { name: "Start again" }).click();
    await expect(two ?? page.locator("none")).toContainText("One read.", { timeout: 60_000 });
  });
});

test.describe("others", () => {
  test.use({ refusals: true });

  test("a guest and somebody who has not signed in send nothing", async ({ page, request }) => {
    await signIn(page, "guest");
    expect((await post(page.request, own("guest.csv"))).status()).toBe(404);
    expect((await post(request, own("nobody.csv"))).status()).toBe(401);
  });
});
