import type { Page } from "@playwright/test";
import { assessTern } from "./assess.ts";
import { accountOf, expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** 25 wafers between -20 and -164 µm, the last two far out. */
const WAFERS = [
  "slot;bow;thickness",
  ...Array.from({ length: 23 }, (_, index) => `${index + 1};-${20 + index * 2},5;725,${index % 10}`),
  "24;-600;724",
  "25;-650;724",
].join("\n");

const ownName = () => `L-${crypto.randomUUID().slice(0, 8)}`;

async function openLot(page: Page): Promise<string> {
  await signIn(page, "engineer");
  const path = await assessTern(page);
  await page.getByRole("link", { name: "This lot" }).click();
  await expect(page).toHaveURL(`${path}/lot`);
  await expect(page.getByRole("heading", { level: 1, name: "This lot" })).toBeVisible();
  return path;
}

const tryIt = (page: Page) => page.getByRole("button", { name: "Try this lot" }).click();

test("an engineer tries a lot by its mean, then wafer by wafer, and keeps it", async ({ page }) => {
  const lot = ownName();
  const path = await openLot(page);
  await page.getByLabel("Lot", { exact: true }).fill(lot);
  await page.getByLabel("Mean bow").fill("-40 µm");
  await page.getByLabel("Edges").selectOption("none");
  await page.getByLabel("Wafer marks").selectOption("matches");
  await tryIt(page);
  await expect(page.getByRole("heading", { level: 1, name: `Lot ${lot}` })).toBeVisible();
  await expect(page.getByRole("region", { name: "Answer" })).toContainText("Bow in−40");
  await expect(page.getByRole("region", { name: "As assessed" })).toContainText("Tightest: from");

  await page.getByLabel("Mean bow").fill("");
  await page.getByLabel("Wafers one by one").fill(WAFERS);
  await tryIt(page);
  await expect(page.getByRole("heading", { name: /^2 of 25 wafers miss .* slots 24 and 25\./ })).toBeVisible();
  const table = page.getByRole("table", { name: "Wafers by slot" });
  await expect(table.getByRole("row")).toHaveCount(26);
  await expect(table.getByRole("row").last()).toContainText("Do not run");
  await expect(page.getByLabel("Wafers one by one")).toHaveValue(WAFERS);
  await expectNoAxeFindings(page);

  await page.getByRole("button", { name: /^Keep as/ }).click();
  await expect(page.getByRole("heading", { name: `Of lot ${lot} alone, and no revision of the flow` })).toBeVisible();
  const kept = new URL(page.url()).pathname;
  expect(kept).not.toBe(path);
  const block = page.getByRole("region", { name: "Title block" });
  await expect(block).toContainText(`, lot ${lot}`);
  await expect(block).toContainText("Revisionnone");
  await expect(page.getByRole("button", { name: "Run again" })).toHaveCount(0);
  await expectNoAxeFindings(page);

  await page.getByRole("link", { name: "Print the sheet" }).first().click();
  await expect(page.getByRole("main")).toContainText(`Lot ${lot}Wafers`);

  await page.goto(path);
  await page.getByRole("navigation", { name: "Path" }).getByRole("link").last().click();
  const lots = page.getByRole("region", { name: "Lots with their own figures" });
  await expect(lots.getByRole("link", { name: `Lot ${lot}` })).toHaveAttribute("href", kept);
  await expect(page.getByRole("link", { name: /^Open assessment/ })).not.toHaveAttribute("href", kept);
});

test("a file takes the place of the list", async ({ page }) => {
  await openLot(page);
  await page.getByLabel("Lot", { exact: true }).fill(ownName());
  const file = { name: "lot.csv", mimeType: "text/csv", buffer: Buffer.from("1,-20,725\n2,-30,726\n") };
  await page.getByLabel("Or a file with such lines").setInputFiles(file);
  await tryIt(page);
  await expect(page.getByRole("heading", { name: /of 2 wafers/ })).toBeVisible();
  await expect(page.getByLabel("Wafers one by one")).toHaveValue("1,-20,725\n2,-30,726\n");
});

test.describe("what cannot be read", () => {
  test.use({ refusals: true });

  test("is said at its field and row, and nothing typed is lost", async ({ page }) => {
    await openLot(page);
    await tryIt(page);
    await expect(page.getByText("Name the lot, as it stands on its box.")).toBeVisible();
    await page.getByLabel("Lot", { exact: true }).fill("K-17");
    await tryIt(page);
    await expect(page.getByText("Type the mean bow, or list the wafers.")).toBeVisible();
    await page.getByLabel("Mean bow").fill("12 parsecs");
    await page.getByLabel("Mean thickness").fill("-725 µm");
    await page.getByLabel("Wafers one by one").fill("1,-20,725\n1,,725\n3,-20,x");
    await tryIt(page);
    for (const said of [/^Row 2: the bow is missing/, /^Row 3: thickness/])
      await expect(page.getByText(said)).toBeVisible();
    await expect(page.getByLabel("Mean bow")).toHaveValue("12 parsecs");
    await expect(page.getByLabel("Wafers one by one")).toHaveValue("1,-20,725\n1,,725\n3,-20,x");
    await expectNoAxeFindings(page);

    await page.getByLabel("Mean bow").fill("20 mm");
    await page.getByLabel("Mean thickness").fill("");
    await page.getByLabel("Wafers one by one").fill("");
    await tryIt(page);
    await expect(page.getByText(/^This bow /)).toBeVisible();
  });
});

test("a technician tries a lot and is not offered to keep it; the server refuses both who may not", async ({
  page,
  browser,
  baseURL,
}) => {
  const path = await openLot(page);
  const form = { intent: "keep", name: "K-17", bow: "-40 µm" };
  const asRole = async (role: "technician" | "guest") => {
    const context = await browser.newContext({ baseURL: baseURL ?? "" });
    const { email, password } = accountOf(role);
    await context.request.post("/sign-in", { form: { email, password }, maxRedirects: 0 });
    return context;
  };
  const technician = await asRole("technician");
  const own = await technician.newPage();
  await own.goto(`${path}/lot`);
  await own.getByLabel("Lot", { exact: true }).fill("K-17");
  await own.getByLabel("Mean bow").fill("-40 µm");
  await tryIt(own);
  await expect(own.getByRole("heading", { level: 1, name: "Lot K-17" })).toBeVisible();
  await expect(own.getByRole("button", { name: /^Keep/ })).toHaveCount(0);
  expect((await technician.request.post(`${path}/lot`, { multipart: form, maxRedirects: 0 })).status()).toBe(403);
  await technician.close();
  const guest = await asRole("guest");
  expect((await guest.request.post(`${path}/lot`, { multipart: form, maxRedirects: 0 })).status()).toBe(404);
  await guest.close();
});

test("the form works without scripts", async ({ page, browser, baseURL }) => {
  const path = await openLot(page);
  const context = await browser.newContext({
    baseURL: baseURL ?? "",
    javaScriptEnabled: false,
    storageState: await page.context().storageState(),
  });
  const plain = await context.newPage();
  await plain.goto(`${path}/lot`);
  await plain.getByLabel("Lot", { exact: true }).fill("K-18");
  await plain.getByLabel("Wafers one by one").fill("1,-20,725\n2,oops,725");
  await tryIt(plain);
  await expect(plain.getByText(/^Row 2: bow/)).toBeVisible();
  await expect(plain.getByLabel("Lot", { exact: true })).toHaveValue("K-18");
  await plain.getByLabel("Wafers one by one").fill("1,-20,725\n2,-30,725");
  await tryIt(plain);
  await expect(plain.getByRole("heading", { name: /of 2 wafers/ })).toBeVisible();
  await expect(plain.getByLabel("Lot", { exact: true })).toHaveValue("K-18");
  await plain.getByRole("button", { name: /^Keep as/ }).click();
  await expect(plain.getByRole("heading", { name: /^Of lot K-18 alone/ })).toBeVisible();
  await context.close();
});
