import type { Browser, Page } from "@playwright/test";
import { toDataURL } from "qrcode";
import sharp from "sharp";
import { assess, ownFlow, press } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const TABLET = { width: 1024, height: 768 };
const PHONE = { width: 390, height: 844 };

const overflow = (page: Page) =>
  page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);

/** A released sheet of a flow of its own, and a lot of three wafers on it, made as people make them. */
async function lotOnSheet(page: Page, name: string): Promise<string> {
  await signIn(page, "engineer");
  await ownFlow(page);
  await assess(page);
  await page.getByRole("link", { name: "Review", exact: true }).click();
  await expect(page).toHaveURL(/\/review$/);
  const review = new URL(page.url()).pathname;
  await press(page, "Ask for a review");
  await expect(page.getByText("asked for a review at")).toBeVisible();
  await signIn(page, "process owner");
  await page.goto(review);
  await page.getByRole("checkbox").check();
  await press(page, "Release the sheet");
  await page.getByRole("link", { name: "Open the sheet" }).click();
  await expect(page).toHaveURL(/\/sheets\/revisions\//);
  await expect(page.getByText("Current: this is the revision in force.")).toBeVisible();
  const title = (await page.getByRole("heading", { level: 1 }).textContent()) ?? "";

  await signIn(page, "engineer");
  await page.goto("/lots/new");
  await page.getByLabel("Program").selectOption({ label: "Tern" });
  await page.getByLabel("Lot", { exact: true }).fill(name);
  await page.getByLabel(/^Wafers/).fill("1, W01\n2, W02\n3, W03");
  await press(page, "Make them");
  await expect(page.getByRole("heading", { level: 1, name: `Lot ${name}` })).toBeVisible();
  await page.getByText("Put it on a sheet").click();
  const choice = page.getByLabel("Released revision").locator("option", { hasText: title });
  await page.getByLabel("Released revision").selectOption((await choice.getAttribute("value")) ?? "");
  await press(page, "Put the lot on it");
  await expect(page.getByRole("link", { name: title })).toBeVisible();
  return new URL(page.url()).pathname;
}

const photo = () =>
  sharp({ create: { width: 800, height: 600, channels: 3, background: { r: 90, g: 90, b: 90 } } })
    .png()
    .toBuffer();

async function newPage(browser: Browser, viewport: { width: number; height: number }): Promise<Page> {
  return (await browser.newContext({ viewport, serviceWorkers: "block" })).newPage();
}

test("a lot goes onto a sheet, is found with a scanner, acknowledged, worked, stopped and cleared", async ({
  page,
  browser,
}) => {
  test.slow();
  const name = `F-${Date.now().toString(36)}`;
  const desk = await lotOnSheet(page, name);
  await expectNoAxeFindings(page);

  const floor = await newPage(browser, TABLET);
  await signIn(floor, "technician");
  await floor.goto("/floor");
  await expectNoAxeFindings(floor);
  // A hand-held scanner types and presses enter; the field has the focus by itself.
  await floor.keyboard.type(name.toLowerCase());
  await floor.keyboard.press("Enter");
  await expect(floor.getByRole("heading", { level: 1, name: `Lot ${name}` })).toBeVisible();
  await expectNoAxeFindings(floor);
  const lot = new URL(floor.url()).pathname;

  await floor.goto(`${lot}/steps/1`);
  await expect(floor.getByRole("link", { name: /^Read the sheet first/ })).toBeVisible();
  await floor.getByRole("link", { name: /^Read the sheet first/ }).click();
  await floor.getByRole("button", { name: /^I have read/ }).click();
  await floor.getByRole("link", { name: /^Go to step 1,/ }).click();
  await expect(floor).toHaveURL(/\/steps\/1$/);
  await expectNoAxeFindings(floor);
  const start = floor.getByRole("button", { name: /^Start this step/ });
  for (const button of [start, floor.getByRole("link", { name: /^Stop this step/ })])
    expect((await button.boundingBox())?.height).toBeGreaterThanOrEqual(104);
  await start.click();
  await floor.getByRole("button", { name: /^Step done/ }).click();
  await expect(floor).toHaveURL(/\/steps\/2$/);

  await floor.getByRole("link", { name: /^Record a reading/ }).click();
  await press(floor, "Save the reading");
  await expect(floor.getByText("Type the reading. Blank is missing, not zero.")).toBeVisible();
  await floor.getByLabel("Reading with its unit").fill("-41 um");
  await floor.getByLabel("It lay on").selectOption("three pins");
  await floor.getByLabel("Its own weight was").selectOption("taken out");
  await expectNoAxeFindings(floor);
  await press(floor, "Save the reading");
  await expect(floor.getByRole("link", { name: /^Record a reading/ })).toContainText(/bow −41\s*\S*µm/);

  await floor.getByRole("link", { name: /^Stop this step/ }).click();
  await floor.getByLabel("Cause").selectOption("tool trouble");
  await floor.getByLabel("What happened").fill("The chuck leaks");
  await press(floor, "Stop it for every lot");
  await expect(floor.getByRole("alert")).toContainText("is stopped for every lot: tool trouble");
  await expect(floor.getByRole("button", { name: /^Start this step/ })).toHaveCount(0);
  await expectNoAxeFindings(floor);

  await signIn(page, "shift lead");
  await page.goto(desk);
  await page.getByText("Clear this stop").click();
  await page.getByLabel("What was done about it").fill("Seal changed");
  await press(page, "Clear it");
  await expect(page.getByText("Nothing holds the lot")).toBeVisible();
  await page.getByText("Hold this lot").click();
  await page.getByLabel("Cause").selectOption("waits for people or a tool");
  await page.getByLabel("What happened").fill("The grinder is down");
  await press(page, "Hold the lot");
  await expect(page.getByText(`Lot ${name} is held`)).toBeVisible();
  await floor.reload();
  await expect(floor.getByRole("alert")).toContainText(`Lot ${name} is held`);

  await signIn(page, "engineer");
  await page.goto(desk);
  await page.getByText("Say where wafers stand").click();
  await page.getByLabel("3: W03").check();
  await press(page, "Save where they stand");
  await expect(page.getByRole("row", { name: /W03/ })).toContainText("broken");
  await floor.goto(lot);
  await expect(floor.getByText("2 of 3 wafers in line")).toBeVisible();
});

test("a screen of the floor fits a phone, and a dark one", async ({ page, browser }) => {
  test.slow();
  await lotOnSheet(page, `P-${Date.now().toString(36)}`);
  const lot = new URL(page.url()).pathname;
  const phone = await newPage(browser, PHONE);
  await signIn(phone, "technician");
  await phone.emulateMedia({ colorScheme: "dark" });
  for (const path of ["/floor", `/floor${lot}`, `/floor${lot}/steps/16`, `/floor${lot}/steps/16?do=measure`]) {
    await phone.goto(path);
    for (const width of [390, 320]) {
      await phone.setViewportSize({ width, height: 844 });
      expect(await overflow(phone), `${path} at ${width}`).toBe(0);
    }
    await expectNoAxeFindings(phone);
  }
});

test("a code is read with the camera, which only the floor may use; a camera that is refused says so", async ({
  page,
}) => {
  await signIn(page, "technician");
  const name = `C-${Date.now().toString(36)}`;
  await page.goto("/lots/new");
  await page.getByLabel("Program").selectOption({ label: "Tern" });
  await page.getByLabel("Lot", { exact: true }).fill(name);
  await press(page, "Make them");
  await expect(page.getByRole("heading", { level: 1, name: `Lot ${name}` })).toBeVisible();

  // A camera that sees the label, and later one that nobody allows.
  await page.addInitScript(
    ([label]) => {
      navigator.mediaDevices.getUserMedia = async () => {
        if (sessionStorage.getItem("refused") !== null) throw new DOMException("no", "NotAllowedError");
        const image = new Image();
        image.src = label ?? "";
        await image.decode();
        const canvas = Object.assign(document.createElement("canvas"), { width: 640, height: 480 });
        const drawing = canvas.getContext("2d");
        const draw = () => {
          drawing?.fillRect(0, 0, 640, 480);
          drawing?.drawImage(image, 120, 40);
        };
        draw();
        setInterval(draw, 50);
        return canvas.captureStream(20);
      };
    },
    [await toDataURL(name, { width: 400, margin: 4 })],
  );
  const floor = page.getByRole("link", { name: "Floor", exact: true });
  const [answer] = await Promise.all([page.waitForResponse((each) => each.url().endsWith("/floor")), floor.click()]);
  expect(answer.headers()["permissions-policy"]).toContain("camera=(self)");
  await expect(page.getByRole("heading", { level: 1, name: "Find a lot" })).toBeVisible();
  await page.getByRole("button", { name: "Read a code with the camera" }).click();
  await expect(page.getByRole("heading", { level: 1, name: `Lot ${name}` })).toBeVisible();

  await page.evaluate(() => sessionStorage.setItem("refused", "yes"));
  await page.goto("/floor");
  await page.getByRole("button", { name: "Read a code with the camera" }).click();
  await expect(page.getByRole("alert")).toContainText("The camera is not allowed here.");
  await expectNoAxeFindings(page);
  const desk = await page.request.get("/lots");
  expect(desk.headers()["permissions-policy"]).toContain("camera=()");
});

test.describe("through a lost connection", () => {
  test.use({ serviceWorkers: "allow", refusals: true, viewport: TABLET });

  test("a sheet is read with its age, and what is entered is kept, sent once, and shown where it is refused", async ({
    page,
    context,
    browser,
  }) => {
    test.slow();
    const name = `O-${Date.now().toString(36)}`;
    const desk = await lotOnSheet(page, name);
    await signIn(page, "technician");
    const lot = `/floor${desk}`;
    await page.goto(lot);
    await page.getByRole("button", { name: /^I have read/ }).click();
    await expect(page.getByRole("link", { name: /^Go to step 1,/ })).toBeVisible();
    await page.goto("/floor");
    await expect(page.getByText("No connection.")).toBeHidden();
    await page.getByRole("link", { name }).click();
    // Every step of the lot is kept, though none was opened, the forms of the first two, where lots are found, and hand-overs.
    await expect
      .poll(
        () =>
          page.evaluate(async () => {
            const names = (await caches.keys()).filter((each) => each.startsWith("floor-pages-"));
            return (await Promise.all(names.map(async (each) => (await caches.open(each)).keys()))).flat().length;
          }),
        { timeout: 60_000 },
      )
      .toBe(32);

    await context.setOffline(true);
    await page.goto("/floor/hand-overs");
    await expect(page.getByText("No connection.")).toBeVisible();
    await expect(page.getByRole("link", { name: "Hand a place over" })).toBeHidden();
    await page.goto(`/floor?lot=${name}`);
    await expect(page).toHaveURL("/floor");
    await expect(page.getByText("Only lots that were opened on this device")).toBeVisible();
    await page.getByRole("link", { name }).click();
    await expect(page.getByRole("heading", { level: 1, name: `Lot ${name}` })).toBeVisible();
    await page.goto(`${lot}/steps/1`);
    await expect(
      page.getByText("No connection: whether this sheet is still current could not be checked"),
    ).toBeVisible();
    await expect(page.getByText(/^It is as it was at .+ ago\./)).toBeVisible();
    await expect(page.getByText("Current at")).toBeHidden();
    await page.getByRole("button", { name: /^Start this step/ }).click();
    await expect(page.getByRole("status", { name: "Entries that wait" })).toContainText("Step 1 started");
    await page.getByRole("link", { name: /^Report an incident/ }).click();
    await page.getByLabel("What happened").selectOption("edge chip");
    await page.getByLabel("How bad").selectOption("near miss");
    await page.getByLabel("Wafer", { exact: true }).fill("W02");
    await page.getByLabel("In your words").fill("Touched the cassette");
    await page.getByLabel("Photos").setInputFiles({ name: "chip.png", mimeType: "image/png", buffer: await photo() });
    await expectNoAxeFindings(page);
    await page.getByRole("button", { name: "Report it" }).click();
    await expect(page.getByText(/^2 entries wait for the connection/)).toBeVisible();
    await expect(page.getByText("Incident, step 1")).toBeVisible();
    await page.getByRole("button", { name: /^Step done/ }).click();
    // It leads on to the next step, which this device kept.
    await expect(page).toHaveURL(`${lot}/steps/2`);
    await expect(page.getByText(/^3 entries wait for the connection/)).toBeVisible();
    await page.getByRole("button", { name: /^Start this step/ }).click();
    await expect(page.getByText(/^4 entries wait for the connection/)).toBeVisible();

    // Meanwhile somebody who has a connection stops the second step.
    const other = await newPage(browser, TABLET);
    await signIn(other, "process owner");
    await other.goto(`${lot}/steps/2?do=stop`);
    await other.getByLabel("Cause").selectOption("tool trouble");
    await other.getByLabel("What happened").fill("The gauge drifts");
    await press(other, "Stop it for every lot");
    await expect(other.getByRole("alert")).toContainText("is stopped for every lot");

    await context.setOffline(false);
    await expect(page.getByText("3 entries that waited have been sent.")).toBeVisible({ timeout: 30_000 });
    // The page knows by itself how things stand now.
    await expect(page.getByText("Current at")).toBeVisible();
    const refused = page.getByRole("alert").filter({ hasText: "Not taken: Step 2 started" });
    await expect(refused).toContainText("is stopped for every lot: tool trouble");
    await refused.getByRole("button", { name: "Keep it as an observation" }).click();
    await expect(page.getByText("4 entries that waited have been sent.")).toBeVisible({ timeout: 30_000 });
    await page.goto(lot);
    const entries = page.getByRole("region", { name: "Entered last" });
    await expect(entries.getByText(/Step 2 started/)).toHaveCount(1);
    await expect(entries.getByText("done", { exact: true })).toHaveCount(1);

    await page.goto(`/incidents?q=${name}`);
    await page.getByRole("link", { name: /^TERN-I/ }).click();
    await expect(page.getByText("Touched the cassette")).toBeVisible();
    await expect(page.getByRole("img", { name: /photo/i })).toHaveCount(1);

    await page.goto("/");
    await press(page, "Sign out");
    await expect(page).toHaveURL(/\/sign-in/);
    expect(
      await page.evaluate(async () => (await caches.keys()).filter((each) => each.startsWith("floor-pages-"))),
    ).toEqual([]);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("a lot is made and found, and not worked on while it is on no sheet", async ({ page }) => {
    await signIn(page, "technician");
    const name = `N-${Date.now().toString(36)}`;
    await page.goto("/lots/new");
    await page.getByLabel("Program").selectOption({ label: "Tern" });
    await page.getByLabel("Lot", { exact: true }).fill(name);
    await page.getByRole("button", { name: "Make them" }).click();
    await page.goto("/floor");
    await page.getByLabel("Lot, typed or scanned").fill(name);
    await page.getByRole("button", { name: "Find" }).click();
    await expect(page.getByText("This lot is on no sheet.")).toBeVisible();
  });
});
