import type { Browser, Page } from "@playwright/test";
import sharp from "sharp";
import { assess, ownFlow, press } from "./flow-pages.ts";
import { readPrinted } from "./printed-sheet.ts";
import { expect, signIn, test, type Role } from "./support.ts";

/** A person at a browser of their own. */
async function at(browser: Browser, role: Role, viewport = { width: 1280, height: 900 }): Promise<Page> {
  const page = await (await browser.newContext({ viewport, serviceWorkers: "allow" })).newPage();
  await signIn(page, role);
  return page;
}

/** Opens the newest mail with a subject, once it has arrived. */
async function openMail(page: Page, subject: RegExp): Promise<void> {
  await expect
    .poll(
      async () => {
        await page.goto("/mail");
        return page.getByRole("link", { name: subject }).count();
      },
      { timeout: 30_000 },
    )
    .toBeGreaterThan(0);
  await page.getByRole("link", { name: subject }).first().click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(subject);
}

/** How many pages of the floor the device keeps. */
const keptPages = (page: Page) =>
  page.evaluate(async () => {
    const names = (await caches.keys()).filter((each) => each.startsWith("floor-pages-"));
    return (await Promise.all(names.map(async (each) => (await caches.open(each)).keys()))).flat().length;
  });

/** Changes the thickness that a flow ends at, by trying it first. */
async function thinTo(page: Page, flow: string, from: string, to: string): Promise<void> {
  await page.goto(flow);
  await page.getByText("What if").click();
  const value = page.getByLabel("Value", { exact: true });
  await expect(value).toHaveValue(from);
  await value.fill(to);
  await press(page, "Apply to the flow");
  await expect(page).toHaveURL(/done=what-if/);
}

/** Assesses the flow and asks for the review; where the review is. */
async function askFor(page: Page, flow: string): Promise<string> {
  await page.goto(flow);
  await assess(page);
  await page.getByRole("link", { name: "Review", exact: true }).click();
  await expect(page).toHaveURL(/\/review$/);
  await press(page, "Ask for a review");
  await expect(page.getByText("asked for a review at")).toBeVisible();
  return new URL(page.url()).pathname;
}

async function release(page: Page, review: string): Promise<string> {
  await page.goto(review);
  await page.getByRole("checkbox").check();
  await press(page, "Release the sheet");
  await page.getByRole("link", { name: "Open the sheet" }).click();
  await expect(page.getByText("Current: this is the revision in force.")).toBeVisible();
  return new URL(page.url()).pathname;
}

test("the whole life of a sheet, from a flow that is sent back to a paper that is out of force", async ({
  browser,
}) => {
  test.setTimeout(360_000);
  const engineer = await at(browser, "engineer");
  const owner = await at(browser, "process owner");
  const technician = await at(browser, "technician", { width: 1024, height: 768 });
  const lead = await at(browser, "shift lead");
  const lot = `L-${Date.now().toString(36)}`;
  let flow = "";
  let sheet = "";
  let desk = "";
  let code = "";
  let number = "";

  await test.step("an engineer asks for a review, and it is sent back with its reason", async () => {
    flow = await ownFlow(engineer);
    const review = await askFor(engineer, flow);
    await openMail(owner, /review asked for sheet TERN-H\d+/);
    await owner.goto("/");
    await expect(owner.getByRole("heading", { name: "For you to review" })).toBeVisible();
    await owner.goto(review);
    await owner.getByLabel("Why it goes back").fill("Take 5 µm more off");
    await press(owner, "Return it");
    await expect(owner.getByText("Take 5 µm more off")).toBeVisible();
    await openMail(engineer, /sheet TERN-H\d+ returned/);
    await engineer.goto("/");
    await expect(engineer.getByRole("main")).toContainText("Take 5 µm more off");
  });

  await test.step("it is mended, asked for again and released; everybody is told", async () => {
    await thinTo(engineer, flow, "100 µm", "95 um");
    sheet = await release(owner, await askFor(engineer, flow));
    number = /TERN-H\d+/.exec((await owner.getByRole("heading", { level: 1 }).textContent()) ?? "")?.[0] ?? "";
    await openMail(technician, new RegExp(`sheet ${number} A released`));
  });

  await test.step("its paper says what it is, and the code on it that it is current", async () => {
    await technician.goto(sheet);
    const [paper] = await Promise.all([technician.waitForEvent("download"), press(technician, "Take out the PDF")]);
    const [hands] = await readPrinted(browser, await paper.path());
    for (const words of [number, "Effective from", "shards"]) expect(hands?.text).toContain(words);
    expect(hands?.code).toMatch(/\/s\/[\w-]{22}$/);
    code = new URL(hands?.code ?? "").pathname;
    const visitor = await (await browser.newContext()).newPage();
    await visitor.goto(code);
    await expect(visitor.getByRole("heading", { level: 1 })).toHaveText("Current");
  });

  await test.step("a lot is put on it and worked by it", async () => {
    await engineer.goto("/lots/new");
    await engineer.getByLabel("Program").selectOption({ label: "Tern" });
    await engineer.getByLabel("Lot", { exact: true }).fill(lot);
    await engineer.getByLabel(/^Wafers/).fill("1, W01\n2, W02");
    await press(engineer, "Make them");
    await engineer.getByText("Put it on a sheet").click();
    const choice = engineer.getByLabel("Released revision").locator("option", { hasText: `${number} A` });
    await engineer.getByLabel("Released revision").selectOption((await choice.getAttribute("value")) ?? "");
    await press(engineer, "Put the lot on it");
    await expect(engineer.getByRole("link", { name: `${number} A` }).first()).toBeVisible();
    desk = new URL(engineer.url()).pathname;
    await technician.goto(`/floor${desk}`);
    await technician.getByRole("button", { name: /^I have read/ }).click();
    await expect(technician.getByRole("link", { name: /^Go to step 1,/ })).toBeVisible();
    await expect.poll(() => keptPages(technician), { timeout: 60_000 }).toBe(30);
    // The network is cut before the first step and comes back after it.
    await technician.context().setOffline(true);
    await technician.goto(`/floor${desk}/steps/1`);
    await expect(technician.getByText("whether this sheet is still current could not be checked")).toBeVisible();
    await technician.getByRole("button", { name: /^Start this step/ }).click();
    await technician.getByRole("button", { name: /^Step done/ }).click();
    await expect(technician.getByText(/^2 entries wait for the connection/)).toBeVisible();
    await technician.context().setOffline(false);
    await expect(technician.getByText("2 entries that waited have been sent.")).toBeVisible({ timeout: 30_000 });
    await engineer.reload();
    await expect(engineer.getByRole("main")).toContainText("1 of 19 steps entered as done");
  });

  await test.step("a step is stopped on the floor, told to the shift lead and cleared", async () => {
    await technician.goto(`/floor${desk}/steps/2`);
    await technician.getByRole("link", { name: /^Stop this step/ }).click();
    await technician.getByLabel("Cause").selectOption("tool trouble");
    await technician.getByLabel("What happened").fill("The chuck leaks");
    await press(technician, "Stop it for every lot");
    await expect(technician.getByRole("alert")).toContainText("is stopped for every lot: tool trouble");
    await openMail(lead, /stopped, step 2/);
    await lead.goto("/");
    await expect(lead.getByRole("heading", { name: "Held and stopped" })).toBeVisible();
    await lead.goto(desk);
    await lead.getByText("Clear this stop").click();
    await lead.getByLabel("What was done about it").fill("Seal changed");
    await press(lead, "Clear it");
    await expect(lead.getByText("Nothing holds the lot")).toBeVisible();
    await technician.goto(`/floor${desk}/steps/2`);
    await expect(technician.getByRole("button", { name: /^Start this step/ })).toBeVisible();
  });

  await test.step("an incident is reported from the step with a photo, told and followed up", async () => {
    await technician.getByRole("link", { name: /^Report an incident/ }).click();
    await expect(technician.getByText(`Lot ${lot}, step 2`)).toBeVisible();
    await technician.getByLabel("What happened").selectOption("edge chip");
    await technician.getByLabel("How bad").selectOption("damaged, goes on");
    await technician.getByLabel("In your words").fill("Chipped at the notch");
    await technician.getByLabel("Wafers of the lot that went through").fill("2");
    const image = sharp({ create: { width: 60, height: 40, channels: 3, background: "#734" } });
    await technician
      .getByLabel("Photos")
      .setInputFiles({ name: "chip.jpg", mimeType: "image/jpeg", buffer: await image.jpeg().toBuffer() });
    await press(technician, "Report it");
    await expect(technician).toHaveURL(new RegExp(`${desk}/steps/2$`));
    await openMail(engineer, new RegExp(`incident with lot ${lot}`));
    await engineer.goto(`/incidents?q=${lot}`);
    await engineer.getByRole("link", { name: /^TERN-I/ }).click();
    await expect(engineer.getByRole("img", { name: /^Photo 1 of TERN-I/ })).toBeVisible();
    await engineer.getByLabel("Note", { exact: true }).fill("Notch finger set anew");
    await press(engineer, "Add the note");
    await expect(engineer.getByText("Notch finger set anew")).toBeVisible();
  });

  await test.step("a new revision takes its place: the old paper says so, and the lot waits to be moved", async () => {
    await thinTo(engineer, flow, "95 µm", "90 um");
    await release(owner, await askFor(engineer, flow));
    const visitor = await (await browser.newContext()).newPage();
    await visitor.goto(code);
    await expect(visitor.getByRole("heading", { level: 1 })).toHaveText("Superseded by B");
    await openMail(technician, new RegExp(`sheet ${number} A superseded by B`));
    await technician.goto(`/floor${desk}/steps/2`);
    await expect(technician.getByRole("alert")).toContainText(`Sheet ${number} A is superseded by B`);
    await expect(technician.getByRole("button", { name: /^Start this step/ })).toHaveCount(0);
    await engineer.goto("/");
    await expect(engineer.getByRole("main")).toContainText(`Lot ${lot}`);
  });
});
