import { readFileSync } from "node:fs";
import type { Page } from "@playwright/test";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";
import { assessTern } from "./assess.ts";

const fixture = (name: string) => ({
  name,
  mimeType: "text/csv",
  buffer: readFileSync(new URL(`../../fixtures/scans/${name}`, import.meta.url)),
});

const unique = (prefix: string) => `${prefix}-${Math.random().toString(36).slice(2, 10)}`;

/** Adds a film of this test alone, so that no other test counts on its stress; returns its address. */
async function addFilm(page: Page, baseURL: string): Promise<string> {
  const answer = await page.request.post("/films/new", {
    headers: { Origin: baseURL },
    maxRedirects: 0,
    form: {
      name: unique("Test nitride"),
      kind: "inorganic",
      "stress.value": "30 MPa",
      "stress.tolerance": "3 MPa",
      "stress.source": "assumed",
      "youngsModulus.value": "160 GPa",
      "youngsModulus.source": "assumed",
      "poissonsRatio.value": "0.25",
      "poissonsRatio.source": "assumed",
      "expansion.value": "2.3 ppm/K",
      "expansion.source": "assumed",
    },
  });
  expect(answer.status()).toBe(302);
  return answer.headers()["location"] ?? "";
}

/** Uploads the fixture pair as a scan of a film; returns its address. */
async function addScan(page: Page, baseURL: string, film: string): Promise<string> {
  await page.goto("/scans/new");
  const program = await page.getByLabel("Program").locator("option", { hasText: "Tern" }).getAttribute("value");
  const answer = await page.request.post("/scans/new", {
    headers: { Origin: baseURL },
    maxRedirects: 0,
    multipart: {
      program: program ?? "",
      label: unique("M"),
      film: film.split("/").at(-1) ?? "",
      orientation: "100",
      filmThickness: "5 um",
      siliconThickness: "725 um",
      diameter: "200 mm",
      edgeExclusion: "5 mm",
      positionUnit: "mm",
      heightUnit: "µm",
      decimalMark: "point",
      before: fixture("monitor-200mm-725um-before-film-seed-7.csv"),
      after: fixture("monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv"),
    },
  });
  expect(answer.status()).toBe(302);
  return answer.headers()["location"] ?? "";
}

// Most begin with a film and a scan of their own.
test.describe.configure({ timeout: 60_000 });

test.describe("a film's history", () => {
  test("begins with a scan that an engineer accepts from its page", async ({ page, baseURL }) => {
    await signIn(page, "engineer");
    const film = await addFilm(page, baseURL ?? "");
    const scan = await addScan(page, baseURL ?? "", film);
    await page.goto(scan);
    await page.getByRole("link", { name: "Accept into the history" }).click();
    await expect(page.getByText("What becomes of the value in use")).toBeVisible();
    await page.getByLabel("Why this value may stand for the film").fill("Standard monitor");
    await page.getByLabel("Instrument").fill("Laser profiler 2");
    await page.getByRole("button", { name: "Accept into the history" }).click();
    await expect(page).toHaveURL(/\/films\/.*#history/);
    await expect(page.getByText(/^Mean of the accepted values: \+3\d\.\d+/)).toBeVisible();
    await expect(page.getByText("Laser profiler 2").first()).toBeVisible();
    expect(await (await page.request.get(scan)).text()).toContain("Accepted into the history of");
  });

  test.describe("with a value", () => {
    test.use({ refusals: true });

    test("puts its mean into use by a press, and keeps the last value that it rests on", async ({ page, baseURL }) => {
      await signIn(page, "engineer");
      const film = await addFilm(page, baseURL ?? "");
      const added = await page.request.post(film, {
        headers: { Origin: baseURL ?? "" },
        maxRedirects: 0,
        form: {
          intent: "add",
          version: "1",
          value: "31 MPa",
          uncertainty: "1.2 MPa",
          measuredAt: "2026-11-20",
          source: "Report",
          reason: "Routine",
        },
      });
      expect(added.status()).toBe(302);
      await page.goto(film);
      await expect(page.getByText(/limits come from five on/)).toBeVisible();
      await page.getByRole("button", { name: "Use the accepted value" }).click();
      await expect(page.getByText(/^In use: the mean of the accepted values/)).toBeVisible();
      await expect(page.getByRole("region", { name: "Stresses in use", exact: true }).getByRole("row")).toHaveCount(3);
      await page.locator("summary", { hasText: "Set aside" }).click();
      await page.getByLabel("Why it does not count").fill("Dirty chuck");
      await page.getByRole("button", { name: /^Set aside: value of/ }).click();
      await expect(page.getByRole("alert")).toContainText("last one that counts");
      await expectNoAxeFindings(page);
    });
  });

  test("is read by a technician, who is told who may accept", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans?q=M-0388");
    await page.getByRole("link", { name: "M-0388" }).click();
    await page.waitForURL(/\/scans\/[0-9a-f-]{36}$/);
    await expect(page.getByText("An engineer or process owner of the program may accept it.")).toBeVisible();
    await expect(page.getByRole("link", { name: "Accept into the history" })).toHaveCount(0);
    await page.getByRole("link", { name: "Polymer dielectric A" }).click();
    await page.waitForURL(/\/films\//);
    await expect(page.getByRole("heading", { name: "Stress history" })).toBeVisible();
    await expect(page.getByText("Add a value measured elsewhere")).toHaveCount(0);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("a scan is accepted, and what is missing is said at its field", async ({ page, baseURL }) => {
    await signIn(page, "engineer");
    const film = await addFilm(page, baseURL ?? "");
    const scan = await addScan(page, baseURL ?? "", film);
    await page.goto(`${scan}/accept`);
    await page.getByRole("button", { name: "Accept into the history" }).click();
    await expect(page.getByText("Say why this value may stand for the film.")).toBeVisible();
    await page.getByLabel("Why this value may stand for the film").fill("Standard monitor");
    await page.getByLabel("From now on the film uses the mean").check();
    await page.getByRole("button", { name: "Accept into the history" }).click();
    await expect(page.getByText(/^In use: the mean of the accepted values/)).toBeVisible();
    await page.goto(`${scan}/accept`);
    await expect(page.getByText(/was accepted into the film’s history already/)).toBeVisible();
  });
});

test("bows after a step are recorded beside what is predicted, and stand in the comparison", async ({ page }) => {
  await signIn(page, "engineer");
  await assessTern(page);
  await page.getByRole("link", { name: "Measured", exact: true }).click();
  const lot = unique("K");
  await page.getByLabel("Measured after").selectOption({ index: 1 });
  await page.getByLabel("Wafers one by one").fill("slot, bow\n1, -60\n2, -62");
  await page.getByLabel("Lot", { exact: true }).fill(lot);
  await page.getByLabel("Measured on").fill("2026-11-20");
  await page.getByLabel("Measured", { exact: true }).selectOption("device");
  await page.getByLabel("Weight of the wafer").selectOption("compensated");
  await page.getByRole("button", { name: "Record" }).click();
  await expect(page.getByRole("row").filter({ hasText: `${lot}, slot 2` })).toBeVisible();
  await expectNoAxeFindings(page);

  const csv = await page.request.get(`/predictions/points.csv?of=bow&q=${lot}`);
  expect((await csv.text()).trim().split("\r\n")).toHaveLength(3);
});

test("predicted and measured stresses stand in a parity plot that is read by keyboard", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/predictions?of=stress");
  const reader = page.getByLabel("Read point by point");
  await reader.focus();
  await page.keyboard.press("End");
  await expect(reader).toHaveAttribute("aria-valuetext", /predicted .* measured /);
  await expect(page.getByRole("img", { name: /^Measured over predicted stress/ }).first()).toBeVisible();
  await expect(page.getByRole("region", { name: "Points" }).getByRole("row").nth(1)).toBeVisible();
  await expectNoAxeFindings(page);
});
