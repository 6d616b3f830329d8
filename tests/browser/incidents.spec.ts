import { readFileSync } from "node:fs";
import sharp from "sharp";
import { assess, ownFlow, press } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test.use({ refusals: true });

const photo = async () => ({
  name: "crack.jpg",
  mimeType: "image/jpeg",
  buffer: await sharp({ create: { width: 600, height: 400, channels: 3, background: "#734" } })
    .withExif({ IFD3: { GPSLatitudeRef: "N", GPSLatitude: "47/1 22/1 33/1" } })
    .jpeg()
    .toBuffer(),
});

test("a technician reports with a tap and a photo on a phone, an engineer follows it up and closes it", async ({
  page,
}) => {
  await signIn(page, "engineer");
  await ownFlow(page);
  await assess(page);
  const assessment = new URL(page.url()).pathname.split("/").at(-1) ?? "";

  await signIn(page, "technician");
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto(`/incidents/new?assessment=${assessment}&step=2&lot=T-0777&wafer=4`);
  await expect(page.getByLabel("Lot", { exact: true })).toHaveValue("T-0777");
  await expectNoAxeFindings(page);
  for (const width of [390, 320]) {
    await page.setViewportSize({ width, height: 844 });
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
  }
  await page.getByLabel("What", { exact: true }).selectOption("edge chip");
  await page.getByLabel("How bad").selectOption("wafer lost");
  const wafer = page.locator("#spot");
  await wafer.scrollIntoViewIfNeeded();
  const box = await wafer.boundingBox();
  if (!box) throw new Error("no picture of the wafer");
  await wafer.click({ position: { x: 0.8 * box.width, y: 0.5 * box.height } });
  await expect(page.getByLabel("Angle from the notch")).toHaveValue("90");
  await wafer.press("ArrowRight");
  await expect(page.getByLabel("Angle from the notch")).toHaveValue("95");
  await page.getByLabel("In your words").fill("Chipped when it was lifted");

  // A wafer was lost, but none is said to be broken: it is told at its field, and what was typed stays.
  await page.getByRole("button", { name: "Report it" }).click();
  await expect(page.getByText("say how many broke or had to be scrapped")).toBeVisible();
  await page.getByLabel("Of these broken or scrapped").fill("1");
  await page.getByLabel("Wafers of the lot that went through").fill("25");
  await page.getByLabel("Photos").setInputFiles(await photo());
  await press(page, "Report it");
  await expect(page).toHaveURL(/\/incidents\/[0-9a-f-]{36}$/);
  const path = new URL(page.url()).pathname;
  await expect(page.getByRole("heading", { level: 1 })).toContainText(/TERN-I\d{3}: edge chip/);
  await expect(page.getByText("1 affected, 1 of them broken or scrapped, of 25")).toBeVisible();
  await expect(page.getByText(/right, 7\d\s*\S*\s*% of the radius at 95°/)).toBeVisible();
  await expectNoAxeFindings(page);
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);

  const picture = page.getByRole("img", { name: /Photo 1 of TERN-I/ });
  await picture.scrollIntoViewIfNeeded();
  await expect.poll(() => picture.evaluate((image: HTMLImageElement) => image.naturalWidth)).toBe(600);
  const source = (await picture.getAttribute("src")) ?? "";
  const kept = await page.request.get(source);
  expect(kept.headers()).toMatchObject({
    "content-type": "image/jpeg",
    "content-security-policy": "default-src 'none'; sandbox",
    "x-content-type-options": "nosniff",
    "cache-control": "private, no-store",
  });
  expect((await sharp(await kept.body()).metadata()).exif).toBeUndefined();
  await expect(page.getByRole("button", { name: "Add the note" })).toHaveCount(0);

  await signIn(page, "engineer");
  await page.setViewportSize({ width: 1280, height: 900 });
  await page.goto(path);
  await page.getByLabel("Note", { exact: true }).fill("Grip set too hard; set anew");
  await page.getByLabel("How it stands then").selectOption("closed");
  await press(page, "Add the note");
  await expect(page.getByText("Grip set too hard; set anew")).toBeVisible();
  await expect(page.getByRole("button", { name: "Add photos" })).toHaveCount(0);
  await expectNoAxeFindings(page);

  await page.goto("/incidents?state=closed&q=T-0777");
  await expect(page.getByRole("table", { name: "Incidents" })).toContainText("edge chip");
  await expectNoAxeFindings(page);
  const [table] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("link", { name: "Save as CSV" }).click(),
  ]);
  expect(readFileSync(await table.path(), "utf8")).toContain("Chipped when it was lifted");
});

test("rates are told with their intervals, on a phone and in the dark", async ({ page }) => {
  await signIn(page, "engineer");
  await page.goto("/incidents");
  await page.getByRole("link", { name: "Rates", exact: true }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Rates of breakage" })).toBeVisible();
  await expect(page.getByRole("region", { name: "Breakage map" })).toBeVisible();
  await expect(page.getByRole("table", { name: "By support" })).toContainText(/\d\s%\s\(/);
  await page.emulateMedia({ colorScheme: "dark" });
  await expectNoAxeFindings(page);
  for (const width of [390, 320]) {
    await page.setViewportSize({ width, height: 844 });
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
  }
  await page.setViewportSize({ width: 1280, height: 900 });
  await page.getByLabel("Program").selectOption({ label: "Fulmar" });
  await page.getByRole("button", { name: "Show" }).click();
  await expect(page).toHaveURL(/program=fulmar/);
  await expect(page.getByRole("main")).toContainText("Nothing is known yet");
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the flow is chosen, the place is typed, and the report goes in", async ({ page }) => {
    await signIn(page, "shift lead");
    await page.goto("/incidents/new");
    await page.getByRole("button", { name: "Go on" }).click();
    await page.getByLabel("What", { exact: true }).selectOption("drop");
    await page.getByLabel("How bad").selectOption("near miss");
    await page.getByLabel("At which step").selectOption({ index: 2 });
    await page.getByLabel("Lot", { exact: true }).fill("T-0778");
    await page.getByLabel("How far out").fill("40");
    await page.getByLabel("Angle from the notch").fill("180");
    await page.getByLabel("In your words").fill("Dropped into the cassette");
    await page.getByRole("button", { name: "Report it" }).click();
    await expect(page.getByText(/opposite the notch, 40/).first()).toBeVisible();
  });
});
