import { readFileSync } from "node:fs";
import type { Locator, Page } from "@playwright/test";
import {
  expect,
  expectNoAxeFindings,
  expectNoAxeFindingsInBothThemes,
  scriptsAtWork,
  signIn,
  test,
} from "./support.ts";

const UUID = /\/stacks\/[0-9a-f-]{36}/;
const WAFER = "Silicon (001), 200 mm, 725 µm";

/** A name of its own for each test's stack, so that none depends on another. */
const nameFor = (what: string) => `Trial ${what} ${Date.now().toString(36)}`;

const answerOf = (page: Page) => page.getByRole("region", { name: "Answer" });
const field = (page: Page, name: string) => page.locator(`[name="${name}"]`);
const save = (page: Page) => page.getByRole("button", { name: "Save stack" });
/** No-break spaces as ordinary ones. */
const plain = async (locator: Locator) => (await locator.innerText()).replaceAll("\u00A0", " ");

/** Adds a film at the top of the device side and fills it in. */
async function addFilm(page: Page, film: string, thickness: string, coverage?: string) {
  await page.getByRole("button", { name: "Add a film on top" }).click();
  await field(page, "layers[0].film").selectOption({ label: film });
  await field(page, "layers[0].thickness.value").fill(thickness);
  if (coverage === undefined) return;
  await field(page, "layers[0].cut").selectOption({ label: "Patterned, both directions alike" });
  await field(page, "layers[0].coverage").fill(coverage);
}

/** A new stack of Tern: 200 µm of silicon under copper. */
async function fillNew(page: Page, name: string) {
  await page.goto("/stacks/new");
  await scriptsAtWork(field(page, "name"));
  await field(page, "name").fill(name);
  await field(page, "program").selectOption({ label: "Tern" });
  await field(page, "silicon").selectOption({ label: WAFER });
  await field(page, "siliconThickness.value").fill("200 um");
  await addFilm(page, "Plated copper A", "5um", "35 %");
  await field(page, "layers[0].stress.value").fill("200 MPa");
}

/** The address changes before the page does: what is typed between is typed into the page that goes. */
async function stored(page: Page) {
  await expect(page).toHaveURL(UUID);
  await expect(page.getByText("Remove this stack")).toBeVisible();
}

async function makeStack(page: Page, what: string): Promise<{ name: string; path: string }> {
  const name = nameFor(what);
  await fillNew(page, name);
  await save(page).click();
  await stored(page);
  return { name, path: new URL(page.url()).pathname };
}

test.describe("an engineer", () => {
  test.beforeEach(async ({ page }) => signIn(page, "engineer"));

  test("builds a stack and sees the answer, the figures and the curve move", async ({ page }) => {
    const name = nameFor("main");
    await fillNew(page, name);
    const answer = answerOf(page);
    await expect(answer).toContainText("At 200 µm it");
    const chart = page.getByRole("img", { name: "Warp against silicon thickness, free wafer" }).first();
    await expect(chart).toBeVisible();
    const before = await chart.innerHTML();

    // Computed in the page, and the very words of the server's page for the same stack.
    const sent: string[] = [];
    page.on("request", (request) => sent.push(request.method()));
    const old = await plain(answer);
    await field(page, "layers[0].thickness.value").fill("2um");
    await expect(answer.getByRole("status")).toBeEmpty();
    await expect.poll(() => plain(answer)).not.toBe(old);
    await expect.poll(() => chart.innerHTML()).not.toBe(before);
    expect(sent).toEqual([]);
    const computed = await plain(answer);

    await save(page).click();
    await stored(page);
    await page.reload();
    await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("2um");
    expect(await plain(answer)).toBe(computed);

    await page.goto(`/stacks?q=${encodeURIComponent(name)}`);
    const row = page.getByRole("row", { name });
    await expect(row).toContainText("Tern");
    await expect(row).toContainText("200");
  });

  test("cuts a film in lines, whose direction the answer, the reading and the workings tell", async ({ page }) => {
    await makeStack(page, "lines");
    await field(page, "siliconThickness.value").fill("600 um");
    await field(page, "layers[0].cut").selectOption({ label: "Patterned in lines" });
    const answer = answerOf(page);
    await expect(answer.getByRole("status")).toContainText("waiting for");
    await field(page, "layers[0].lineWidth").fill("-3 um");
    await expect(page.getByText("is outside 10 nm to 50 mm")).toBeVisible();
    await field(page, "layers[0].lineWidth").fill("5 um");
    await field(page, "layers[0].lineDirection").fill("90 deg");
    await expect(answer).toContainText(/across the notch axis, .* across that/);
    await save(page).click();
    await stored(page);
    await expect(field(page, "layers[0].lineDirection")).toHaveValue("90°");
    await expect(page.getByText("lines across the notch").first()).toBeVisible();
    await page.getByText("Film forces", { exact: true }).click();
    await expect(page.getByText(/own axes, turned into x and y/).last()).toBeVisible();
    await expectNoAxeFindings(page);
    await field(page, "layers[0].cut").selectOption({ label: "Whole film" });
    await expect(field(page, "layers[0].lineWidth")).toHaveCount(0);
    await expect(answer).not.toContainText("notch axis");
  });

  test("draws wafers within the tolerances for the share beyond a warp", async ({ page }) => {
    await fillNew(page, nameFor("spread"));
    const spread = page.getByRole("region", { name: "Wafers beyond a warp" });
    await field(page, "siliconThickness.value").fill("600 um");
    await field(page, "siliconThickness.tolerance").fill("20 um");
    // It comes to who goes there.
    await spread.scrollIntoViewIfNeeded();
    await spread.getByLabel("Largest warp").fill("12 parsecs");
    await expect(spread.getByRole("button", { name: "Draw wafers" })).toBeDisabled();
    await spread.getByLabel("Largest warp").fill("2 mm");
    await spread.getByRole("button", { name: "Draw wafers" }).click();
    await expect(spread).toContainText("None of the wafers warp by more than", { timeout: 60_000 });
    await expect(spread).toContainText("standard uncertainty");
  });

  test("sees the bow by Stoney beside the better models, and the calculations on demand", async ({ page }) => {
    await makeStack(page, "models");
    const models = page.getByRole("region", { name: "Bow by three models, 25 °C" });
    await expect(models.getByRole("row")).toHaveCount(4);
    await expect(models.getByRole("row", { name: /Stoney/ })).toContainText("%");
    await page.getByText("Bow by Stoney’s formula", { exact: true }).click();
    const title = "Curvature from a thin film's stress";
    await expect(page.getByRole("heading", { name: title }).first()).toBeVisible();
    // What is typed since has its calculations too.
    const figures = page.getByRole("group", { name: `Figures: ${title}` }).first();
    const before = await figures.innerText();
    await field(page, "siliconThickness.value").fill("180 µm");
    await expect.poll(() => figures.innerText()).not.toBe(before);
    await expect(figures).toContainText("180");
  });

  test("moves, adds and removes films, the focus going along", async ({ page }) => {
    await makeStack(page, "films");
    await addFilm(page, "Polymer dielectric A", "7 µm", "92 %");
    await expect(field(page, "layers[0].coverage")).toBeFocused();
    const names = page.locator("details[id^=layer-] > summary");
    await expect(names).toContainText(["Polymer dielectric A", "Plated copper A"]);
    const down = page.getByRole("button", { name: "Move down: Polymer dielectric A" });
    await down.focus();
    await page.keyboard.press("Enter");
    await expect(names).toContainText(["Plated copper A", "Polymer dielectric A"]);
    await expect(page.getByRole("button", { name: "Move up: Polymer dielectric A" })).toBeEnabled();
    await page.getByRole("button", { name: "Remove film: Polymer dielectric A" }).click();
    await expect(names).toHaveCount(1);
    await expect(field(page, "layers[0].film")).toBeFocused();
    await page.getByRole("link", { name: "Add a film below" }).click();
    await expect(names).toContainText(["Plated copper A", "Film not chosen"]);
    await expect(field(page, "layers[1].film")).toBeFocused();
    await field(page, "layers[1].film").selectOption({ label: "Back-side oxide A (low temperature)" });
    await field(page, "layers[1].thickness.value").fill("500 nm");
    await save(page).click();
    await expect(names).toContainText(["Plated copper A", "Back-side oxide A"]);
    await expect(field(page, "layers[1].side")).toHaveValue("back");
  });

  test("selects a layer in the cut by keyboard", async ({ page }) => {
    await makeStack(page, "cut");
    await addFilm(page, "Polymer dielectric A", "7 µm");
    const cut = page.getByRole("group", { name: "The stack, layer by layer" });
    await cut.getByRole("link", { name: /^Polymer dielectric A/ }).focus();
    await page.keyboard.press("ArrowDown");
    await page.keyboard.press("Enter");
    await expect(field(page, "layers[1].film")).toBeVisible();
    await expect(field(page, "layers[0].film")).toBeHidden();
    await page.keyboard.press("ArrowDown");
    await page.keyboard.press("Enter");
    await expect(field(page, "siliconThickness.value")).toBeFocused();
  });

  test("asks for another temperature and lays another stack over, both in the address", async ({ page }) => {
    const { path } = await makeStack(page, "view");
    await field(page, "siliconThickness.value").fill("210 µm");
    await page.getByLabel("Shape also at").fill("245 C");
    await expect(answerOf(page)).toContainText("At 245 °C, free, it");
    await page.getByLabel("Shape also at").press("Enter");
    await expect(page).toHaveURL(/at=245\+C/);
    await page.getByLabel("Lay over").selectOption({ label: "Tern T-2, one redistribution layer (Tern)" });
    await expect(page).toHaveURL(/at=245\+C.*with=|with=.*at=245\+C/);
    await expect(page.getByText(/Tern T-2, one redistribution layer curls below/)).toBeVisible();
    await expect(field(page, "siliconThickness.value")).toHaveValue("210 µm");

    const file = page.waitForEvent("download");
    await page.getByRole("link", { name: "Figures as CSV" }).click();
    const csv = readFileSync(await (await file).path(), "utf8");
    const lines = csv.trimEnd().split("\r\n");
    expect(lines[0]).toBe("stack,temperature_K,silicon_thickness_um,warp_um,linear_warp_um,regime");
    expect(lines).toHaveLength(361);

    await page.getByLabel("Shape also at").fill("12 parsecs");
    await expect(page.getByText("parsecs is not a unit of temperature")).toBeVisible();
    await page.goto(`${path}?at=-500+C&with=00000000-0000-4000-8000-000000000000`);
    await expect(page.getByText("the lowest temperature is")).toBeVisible();
    await expect(page.getByText("There is no such stack, or it belongs to")).toBeVisible();
  });

  test("is asked before unsaved edits are lost, and may copy and remove", async ({ page }) => {
    const { name, path } = await makeStack(page, "guard");
    await field(page, "siliconThickness.value").fill("190 µm");
    await page.getByRole("link", { name: "Copy" }).click();
    const dialog = page.getByRole("dialog", { name: "Leave without saving?" });
    await dialog.getByRole("button", { name: "Stay here" }).click();
    await expect(field(page, "siliconThickness.value")).toHaveValue("190 µm");
    await page.getByRole("link", { name: "Copy" }).click();
    await dialog.getByRole("button", { name: "Leave without saving" }).click();
    await expect(page).toHaveURL(/\/stacks\/new\?from=/);
    await expect(field(page, "name")).toHaveValue(`Copy of ${name}`);
    await expect(field(page, "siliconThickness.value")).toHaveValue("200 um");
    await save(page).click();
    await expect(page).not.toHaveURL(new RegExp(path));
    await stored(page);
    await page.getByText("Remove this stack").click();
    await page.getByRole("button", { name: "Remove for good" }).click();
    await expect(page).toHaveURL(/\/stacks$/);
    await expect(page.getByRole("link", { name: `Copy of ${name}` })).toHaveCount(0);
  });

  test("keeps what was typed before the scripts came", async ({ page }) => {
    const { path } = await makeStack(page, "early");
    let come = () => {};
    const held = new Promise<void>((resolve) => (come = resolve));
    await page.route("**/assets/entry.client-*.js", async (route) => {
      await held;
      await route.continue();
    });
    await page.goto(path, { waitUntil: "commit" });
    await field(page, "siliconThickness.value").fill("150 µm");
    await field(page, "layers[0].cut").selectOption({ label: "Patterned in lines" });
    await expect(answerOf(page)).toContainText("At 200 µm it");
    come();
    await expect(field(page, "layers[0].lineWidth")).toBeVisible();
    await field(page, "layers[0].cut").selectOption({ label: "Whole film" });
    await expect(answerOf(page)).toContainText("At 150 µm it");
    await page.getByRole("link", { name: "Copy" }).click();
    await expect(page.getByRole("dialog", { name: "Leave without saving?" })).toBeVisible();
  });

  test("filters by program, and finds nothing in plain words", async ({ page }) => {
    await page.goto("/stacks?program=petrel");
    await expect(page.getByRole("link", { name: "Petrel P-3, back-side metal" })).toBeVisible();
    await expect(page.getByRole("link", { name: "Tern T-2, one redistribution layer" })).toHaveCount(0);
    await page.goto("/stacks?q=%25_nothing");
    await expect(page.getByRole("heading", { name: "No stack fits" })).toBeVisible();
    await page.goto("/stacks?sort=thickness");
    const [first, second] = (await page.locator("tbody td:nth-child(5)").allInnerTexts()).map(Number);
    expect(first ?? NaN).toBeLessThanOrEqual(second ?? NaN);
  });

  test("meets nothing that axe finds", async ({ page }) => {
    await page.goto("/stacks");
    await expectNoAxeFindingsInBothThemes(page);
    await page.getByRole("link", { name: "Tern T-2, one redistribution layer" }).click();
    await expect(answerOf(page)).toContainText("Safe to lift bare");
    await expectNoAxeFindingsInBothThemes(page);
    await page.goto("/stacks/new");
    await expectNoAxeFindingsInBothThemes(page);
  });
});

test.describe("bad input", () => {
  test.use({ refusals: true });
  test.beforeEach(async ({ page }) => signIn(page, "engineer"));

  test("is told at its field while it is typed, and the panel waits for it", async ({ page }) => {
    await makeStack(page, "bad");
    const thickness = field(page, "siliconThickness.value");
    const answer = answerOf(page);
    for (const [typed, message] of [
      ["12 parsecs", "parsecs is not a unit of length used here"],
      ["-5 µm", "−5 µm is outside 1 µm to 2 mm."],
      ["0", "0 what? Type 0 µm or 0 nm."],
      ["1,234 µm", "can be read as"],
    ] as const) {
      await thickness.fill(typed);
      await expect(page.getByText(message)).toBeVisible();
      await expect(answer.getByRole("status")).toContainText("waiting for remaining silicon");
      await expect(answer).toContainText("At 200 µm it");
    }
    await thickness.fill("");
    await page.getByRole("link", { name: "remaining silicon" }).click();
    await expect(thickness).toBeFocused();
    await thickness.fill("300 µm");
    await expect(answer).toContainText("At 300 µm it");
    await expect(answer.getByRole("status")).toBeEmpty();
  });

  test("of another film opens that film from the panel", async ({ page }) => {
    await makeStack(page, "other");
    await addFilm(page, "Polymer dielectric A", "7 µm");
    await page.locator("#layer-1 > summary").click();
    await field(page, "layers[1].thickness.value").fill("");
    await page.locator("#layer-0 > summary").click();
    await page.getByRole("link", { name: "thickness of Plated copper A" }).click();
    await expect(field(page, "layers[1].thickness.value")).toBeFocused();
  });

  test("is refused by the server with everything typed kept", async ({ page }) => {
    await page.goto("/stacks/new");
    await field(page, "name").fill("Half a stack");
    await addFilm(page, "Plated copper A", "12 parsecs");
    await save(page).click();
    await expect(page.getByRole("alert")).toContainText("Nothing is saved yet");
    for (const message of ["Choose a program.", "Choose the silicon.", "Type the silicon thickness.", "parsecs is not"])
      await expect(page.getByText(message)).toBeVisible();
    await expect(field(page, "name")).toHaveValue("Half a stack");
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("12 parsecs");
  });

  test("of a name that is taken in the program is told at the name", async ({ page }) => {
    const { name } = await makeStack(page, "taken");
    await fillNew(page, name);
    await save(page).click();
    await expect(page.getByText("There is already a stack of that name.")).toBeVisible();
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("5um");
  });

  test("outside the range of the trade only warns", async ({ page }) => {
    await makeStack(page, "warn");
    await field(page, "layers[0].stress.value").fill("-2500 MPa");
    await expect(page.getByText("Stress outside −2000 to +1500 MPa")).toBeVisible();
    await field(page, "layers[0].thickness.value").fill("30 µm");
    await expect(page.getByText("Thicker than a tenth of the silicon")).toBeVisible();
    const saved = page.waitForResponse((response) => response.request().method() === "POST");
    await save(page).click();
    await saved;
    await expect(page.getByRole("alert")).toHaveCount(0);
    await page.reload();
    await expect(field(page, "layers[0].stress.value")).toHaveValue("-2500 MPa");
  });

  test("from a stack that somebody else has saved meanwhile is not lost", async ({ page, browser }) => {
    const { path } = await makeStack(page, "conflict");
    const context = await browser.newContext();
    const other = await context.newPage();
    await signIn(other, "process owner");
    await other.goto(path);
    await field(other, "siliconThickness.value").fill("180 µm");
    await save(other).click();
    await expect(other.getByText(/Last changed .*Mikael Lindqvist/)).toBeVisible();
    await field(page, "siliconThickness.value").fill("170 µm");
    await save(page).click();
    await expect(page.getByRole("alert")).toContainText("Mikael Lindqvist saved this stack");
    await expect(field(page, "siliconThickness.value")).toHaveValue("170 µm");
    await save(page).click();
    await expect(page.getByRole("alert")).toHaveCount(0);
    await page.reload();
    await expect(field(page, "siliconThickness.value")).toHaveValue("170 µm");
    await context.close();
  });

  test("in an address names nothing", async ({ page }) => {
    for (const path of ["/stacks/nonsense", "/stacks/00000000-0000-4000-8000-000000000000", "/stacks/new?from=x"]) {
      const response = await page.goto(path);
      expect(response?.status()).toBe(404);
      await expect(page.getByText("There is no such stack")).toBeVisible();
    }
    for (const search of ["?sort=-nonsense&page=-3", "?program=no-such&page=99999999", "?q=%00"])
      expect((await page.goto(`/stacks${search}`))?.status()).toBe(200);
  });

  test("that no form of ours sends is refused, not stumbled over", async ({ page }) => {
    const { path } = await makeStack(page, "hostile");
    const send = async (options: Parameters<typeof page.request.post>[1]) =>
      (await page.request.post(path, options)).status();
    expect(await send({ form: { __intent__: "not json" } })).toBe(400);
    expect(
      await send({ form: { __intent__: '{"type":"remove","payload":{"name":"name","index":0}}', name: "x" } }),
    ).toBe(400);
    expect(await send({ form: { name: "nul\u0000nul" } })).toBe(400);
    expect(await send({ data: { name: "x" } })).toBe(400);
    expect((await page.goto(path))?.status()).toBe(200);
  });

  test("where the engine cannot be loaded asks the server, and keeps the old figures while that cannot be reached", async ({
    page,
  }) => {
    const { path } = await makeStack(page, "offline");
    await page.route("**/assets/live-panel-*.js", (route) => route.fulfill({ status: 404 }));
    await page.route("**/api/v1/estimates", (route) => route.fulfill({ status: 401, body: "{}" }));
    await page.goto(path);
    await field(page, "siliconThickness.value").fill("150 µm");
    const status = answerOf(page).getByRole("status");
    await expect(status).toContainText("You are signed out.");
    await expect(answerOf(page)).toContainText("At 200 µm it");
    await page.unroute("**/api/v1/estimates");
    await status.getByRole("button", { name: "Try again" }).click();
    await expect(answerOf(page)).toContainText("At 150 µm it");
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("a stack is built, worked out, saved and removed", async ({ page }) => {
    await signIn(page, "engineer");
    const name = nameFor("plain");
    await page.goto("/stacks/new");
    await field(page, "name").fill(name);
    await field(page, "program").selectOption({ label: "Tern" });
    await field(page, "silicon").selectOption({ label: WAFER });
    await field(page, "siliconThickness.value").fill("150 um");
    await addFilm(page, "Plated copper A", "5 um");
    await addFilm(page, "Polymer dielectric A", "12 parsecs");
    await page.getByRole("button", { name: "Work it out without saving" }).click();
    await expect(answerOf(page)).toContainText("Waiting for thickness of Polymer dielectric A");
    await field(page, "layers[0].thickness.value").fill("7 um");
    await field(page, "at").fill("200 C");
    await page.getByRole("button", { name: "Work it out without saving" }).click();
    await expect(answerOf(page)).toContainText("At 150 µm it");
    await expect(answerOf(page)).toContainText("At 200 °C, free, it");
    await expect(page.getByRole("img", { name: "Warp against silicon thickness, free wafer" }).first()).toBeVisible();
    await page.getByRole("button", { name: "Move down: Polymer dielectric A" }).click();
    await expect(field(page, "layers[1].thickness.value")).toHaveValue("7 um");
    await save(page).click();
    await expect(page).toHaveURL(UUID);
    const films = ["Plated copper A", "Polymer dielectric A"];
    await expect(page.locator("details[id^=layer-] > summary")).toContainText(films);
    await field(page, "siliconThickness.value").fill("");
    await save(page).click();
    await expect(page.getByRole("alert")).toContainText("One field needs a look");
    await expect(page.getByText("Type the silicon thickness.")).toBeVisible();
    await page.getByText("Remove this stack").click();
    await page.getByRole("button", { name: "Remove for good" }).click();
    await expect(page).toHaveURL(/\/stacks$/);
    await expect(page.getByRole("link", { name })).toHaveCount(0);
  });
});
