import type { Locator, Page } from "@playwright/test";
import {
  expect,
  expectNoAxeFindings,
  expectNoAxeFindingsInBothThemes,
  scriptsAtWork,
  signIn,
  test,
} from "./support.ts";

/** A name of its own for each test's stack, so that none depends on another. */
const nameFor = (what: string) => `Edited ${what} ${Date.now().toString(36)}`;

const field = (page: Page, name: string) => page.locator(`form#stack [name="${name}"]`);
const films = (page: Page) => page.locator("details[id^=layer-] > summary");
const cut = (page: Page) => page.getByRole("group", { name: "The stack, layer by layer" });
const save = (page: Page) => page.getByRole("button", { name: "Save stack" });
const button = (page: Page, name: string | RegExp) => page.getByRole("button", { name });

async function addFilm(page: Page, film: string, thickness: string) {
  await button(page, "Add a film on top").click();
  await field(page, "layers[0].film").selectOption({ label: film });
  await field(page, "layers[0].thickness.value").fill(thickness);
  await field(page, "name").focus();
}

/** A new stack of Tern, not saved: a polymer on copper on 600 µm of silicon. */
async function fillNew(page: Page, name: string) {
  await page.goto("/stacks/new");
  await scriptsAtWork(field(page, "name"));
  await field(page, "name").fill(name);
  await field(page, "program").selectOption({ label: "Tern" });
  await field(page, "silicon").selectOption({ label: "Silicon (001), 200 mm, 725 µm" });
  await field(page, "siliconThickness.value").fill("600 um");
  await addFilm(page, "Plated copper A", "5um");
  await addFilm(page, "Polymer dielectric A", "7um");
}

/** The same, saved; where it is then. */
async function makeStack(page: Page, what: string): Promise<string> {
  await fillNew(page, nameFor(what));
  await save(page).click();
  await expect(page).toHaveURL(/\/stacks\/[0-9a-f-]{36}/);
  await expect(page.getByText("Remove this stack")).toBeVisible();
  return new URL(page.url()).pathname;
}

/** Where a layer of the cut is drawn, past the arrows of its stress. */
async function bandOf(page: Page, index: number): Promise<{ x: number; y: number; height: number }> {
  const box = await cut(page).locator(`[data-layer="${index}"] rect`).nth(1).boundingBox();
  if (!box) throw new Error(`Layer ${index} is not drawn.`);
  return { x: box.x + box.width / 2, y: box.y, height: box.height };
}

const middle = async (page: Page, index: number) => {
  const { x, y, height } = await bandOf(page, index);
  return [x, y + height / 2] as const;
};

const POLYMER = /^Polymer dielectric A/;
const COPPER = /^Plated copper A/;
const inOrder = (page: Page, ...names: RegExp[]) => expect(films(page)).toHaveText(names);

test.describe("an engineer", () => {
  test.beforeEach(async ({ page }) => signIn(page, "engineer"));

  test("takes back and does again by keyboard, the focus on what changed", async ({ page }) => {
    await fillNew(page, nameFor("undo"));
    const thickness = field(page, "layers[0].thickness.value");
    await films(page).nth(0).click();
    await thickness.fill("9 µm");
    // While the text is not left the keys are the browser's own.
    await page.keyboard.press("Control+z");
    await expect(thickness).toHaveValue("7um");
    await thickness.fill("9 µm");
    await field(page, "siliconThickness.value").focus();
    await page.keyboard.press("Control+z");
    await expect(thickness).toHaveValue("7um");
    await expect(thickness).toBeFocused();
    await expect(page.getByText("Taken back. Thickness of Polymer dielectric A: 7um, was 9 µm")).toBeVisible();
    await page.keyboard.press("Control+Shift+z");
    await expect(thickness).toHaveValue("9 µm");
    await expect(thickness).toBeFocused();

    await button(page, "Remove film: Polymer dielectric A").click();
    await inOrder(page, COPPER);
    await button(page, "Undo").click();
    await inOrder(page, POLYMER, COPPER);
    await expect(thickness).toHaveValue("9 µm");
    await expect(button(page, "Undo")).toBeFocused();
    await expect(button(page, "Redo")).not.toHaveAttribute("aria-disabled");
    // What is done then ends the way on.
    await field(page, "siliconThickness.value").fill("500 µm");
    await field(page, "name").focus();
    await expect(button(page, "Redo")).toHaveAttribute("aria-disabled", "true");
    await save(page).click();
    await expect(page.getByText("Remove this stack")).toBeVisible();
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("9 µm");
  });

  test("takes back all that was done, to the blank page and on again", async ({ page }) => {
    await fillNew(page, nameFor("whole"));
    await field(page, "layers[0].cut").selectOption({ label: "Patterned in lines" });
    await field(page, "layers[0].coverage").fill("40 %");
    await field(page, "layers[0].lineWidth").fill("5 um");
    await field(page, "name").focus();
    await expect(async () => {
      await page.keyboard.press("Control+z");
      await expect(button(page, "Undo")).toHaveAttribute("aria-disabled", "true", { timeout: 200 });
    }).toPass();
    await expect(films(page)).toHaveCount(0);
    await expect(field(page, "name")).toHaveValue("");
    await expect(async () => {
      await page.keyboard.press("Control+y");
      await expect(button(page, "Redo")).toHaveAttribute("aria-disabled", "true", { timeout: 200 });
    }).toPass();
    await inOrder(page, POLYMER, COPPER);
    await expect(field(page, "layers[0].coverage")).toHaveValue("40 %");
    await expect(field(page, "layers[0].lineWidth")).toHaveValue("5 um");
  });

  test("moves films by keys, in the list and in the cut", async ({ page }) => {
    await fillNew(page, nameFor("keys"));
    await films(page).nth(0).focus();
    await page.keyboard.press("Alt+ArrowDown");
    await inOrder(page, COPPER, POLYMER);
    await expect(films(page).nth(1)).toBeFocused();
    await expect(page.getByText("Polymer dielectric A is 2 of 2 from the top, device side")).toBeVisible();
    await page.keyboard.press("Alt+ArrowDown");
    await expect(page.getByText("Polymer dielectric A is the lowest film of the device side")).toBeVisible();
    const drawn = cut(page).getByRole("link", { name: POLYMER });
    await drawn.focus();
    await page.keyboard.press("Alt+ArrowUp");
    await inOrder(page, POLYMER, COPPER);
    await expect(drawn).toBeFocused();
  });

  test("keeps a film that is typed into before the page has drawn what follows from it", async ({ page }) => {
    await fillNew(page, nameFor("haste"));
    const slow = await page.context().newCDPSession(page);
    await slow.send("Emulation.setCPUThrottlingRate", { rate: 6 });
    // As quick as any hand or paste can be: the field is typed into as soon as it is there.
    await page.evaluate(async () => {
      const add = [...document.querySelectorAll("button")].find(
        ({ textContent }) => textContent === "Add a film on top",
      );
      const summaries = () => document.querySelectorAll("details[id^=layer-]").length;
      add?.click();
      while (summaries() < 3) await new Promise((done) => setTimeout(done));
      const field = document.querySelector<HTMLInputElement>('[name="layers[0].thickness.value"]');
      const write = Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, "value")?.set;
      write?.call(field, "3 um");
      field?.dispatchEvent(new Event("input", { bubbles: true }));
    });
    await slow.send("Emulation.setCPUThrottlingRate", { rate: 1 });
    await inOrder(page, /^Film not chosen/, POLYMER, COPPER);
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("3 um");
    await expect(field(page, "layers[2].thickness.value")).toHaveValue("5um");
  });

  test("draws a film where it is now, as soon as the list says so", async ({ page }) => {
    await fillNew(page, nameFor("lag"));
    const slow = await page.context().newCDPSession(page);
    await slow.send("Emulation.setCPUThrottlingRate", { rate: 6 });
    const said = await page.evaluate(async () => {
      const first = () => document.querySelector("details[id^=layer-] > summary");
      const before = first()?.textContent;
      const down = { key: "ArrowDown", altKey: true, bubbles: true, cancelable: true };
      first()?.dispatchEvent(new KeyboardEvent("keydown", down));
      while (first()?.textContent === before) await new Promise((done) => setTimeout(done));
      return document.querySelector('a[data-layer="0"]')?.getAttribute("aria-label");
    });
    await slow.send("Emulation.setCPUThrottlingRate", { rate: 1 });
    expect(said).toMatch(COPPER);
    await inOrder(page, COPPER, POLYMER);
  });

  test("drags a film in the cut, through the silicon too", async ({ page }) => {
    // So that all of the cut is within reach of the mouse.
    await page.setViewportSize({ width: 1440, height: 1400 });
    await fillNew(page, nameFor("drag"));
    await page.mouse.move(...(await middle(page, 0)));
    await page.mouse.down();
    const [x, y] = await middle(page, 1);
    await page.mouse.move(x, y + 8, { steps: 5 });
    await page.mouse.up();
    await inOrder(page, COPPER, POLYMER);
    await page.mouse.move(...(await middle(page, 0)));
    await page.mouse.down();
    const foot = await bandOf(page, 2);
    await page.mouse.move(foot.x, foot.y + foot.height - 3, { steps: 5 });
    await page.mouse.up();
    await expect(page.getByText("Plated copper A is 2 of 2 from the top, back side")).toBeVisible();
    await inOrder(page, POLYMER, COPPER);
    await expect(field(page, "layers[1].side")).toHaveValue("back");
    // Escape lets go.
    await page.mouse.move(...(await middle(page, 0)));
    await page.mouse.down();
    await page.mouse.move(foot.x, foot.y, { steps: 5 });
    await page.keyboard.press("Escape");
    await page.mouse.up();
    await inOrder(page, POLYMER, COPPER);
    await button(page, "Undo").click();
    await inOrder(page, COPPER, POLYMER);
    await expect(field(page, "layers[0].side")).toHaveValue("front");
  });

  test("duplicates, mirrors and changes sides, and sees the forces balance", async ({ page }) => {
    await fillNew(page, nameFor("mirror"));
    const forces = page.getByRole("region", { name: "Film forces, 25 °C" });
    await expect(forces.getByRole("row")).toHaveCount(4);
    await films(page).nth(0).click();
    await button(page, "Duplicate: Polymer dielectric A").first().click();
    await inOrder(page, POLYMER, POLYMER, COPPER);
    await expect(films(page).nth(0)).toBeFocused();
    await button(page, "Undo").click();
    await button(page, "Mirror to the back side: Polymer dielectric A").click();
    await inOrder(page, POLYMER, COPPER, POLYMER);
    await expect(field(page, "layers[2].side")).toHaveValue("back");
    await button(page, "Move to the device side: Polymer dielectric A").click();
    await expect(field(page, "layers[2].side")).toHaveValue("front");
    await button(page, "Undo").click();
    await button(page, "Mirror the device side").click();
    await expect(page.getByText("The back side mirrors the device side, in place of one film")).toBeVisible();
    await inOrder(page, POLYMER, COPPER, COPPER, POLYMER);
    await expect(forces.getByRole("row", { name: /less back side/ })).toContainText("balanced");
    await expect(page.getByRole("region", { name: "Answer" })).toContainText("lies flat");
  });

  test("finds a draft after the page was closed, and takes it up or throws it away", async ({ page }) => {
    const path = await makeStack(page, "draft");
    await field(page, "siliconThickness.value").fill("480 µm");
    await expect(page.getByText(/^Draft kept \d\d:\d\d$/)).toBeVisible();
    const again = await page.context().newPage();
    await again.goto(path);
    const offer = again.getByRole("status").filter({ hasText: /Found a draft from \d\d:\d\d, not saved/ });
    await expect(offer).toBeVisible();
    await expect(field(again, "siliconThickness.value")).toHaveValue("600 um");
    await offer.getByRole("button", { name: "Take it up" }).click();
    await expect(field(again, "siliconThickness.value")).toHaveValue("480 µm");
    await expect(offer).toHaveCount(0);
    await save(again).click();
    await expect(again.getByText(/Draft kept/)).toHaveCount(0);
    await expect(offer).toHaveCount(0);
    await again.close();

    await field(page, "siliconThickness.value").fill("470 µm");
    await expect.poll(() => page.evaluate(() => Object.values(localStorage).join())).toContain("470 µm");
    await page.reload();
    await button(page, "Throw it away").click();
    await expect(page.getByText(/Found a draft/)).toHaveCount(0);
    await expect(field(page, "siliconThickness.value")).toHaveValue("480 µm");
    expect(await page.evaluate(() => Object.keys(localStorage))).toEqual([]);
  });

  test("leaves nothing in the browser by signing out", async ({ page }) => {
    await fillNew(page, nameFor("out"));
    await expect(page.getByText(/^Draft kept/)).toBeVisible();
    await button(page, "Sign out").click();
    await page.getByRole("dialog").getByRole("button", { name: "Leave without saving" }).click();
    await expect(page).toHaveURL(/\/sign-in/);
    expect(await page.evaluate(() => Object.keys(localStorage))).toEqual([]);
    await signIn(page, "engineer");
    await page.goto("/stacks/new");
    await scriptsAtWork(field(page, "name"));
    await expect(page.getByText(/Found a draft/)).toHaveCount(0);
  });

  test("keeps what is typed when the page's data come anew", async ({ page, browser }) => {
    const path = await makeStack(page, "view");
    await field(page, "siliconThickness.value").fill("470 µm");
    await othersSave(await browser.newPage(), path, "siliconThickness.value", "550 µm");
    await page.getByLabel("Shape also at").fill("245 C");
    await page.getByLabel("Shape also at").press("Enter");
    await expect(page).toHaveURL(/at=245/);
    await expect(page.getByText(/Last changed .*Mikael Lindqvist/)).toBeVisible();
    await expect(field(page, "siliconThickness.value")).toHaveValue("470 µm");
  });

  test("meets nothing that axe finds while editing", async ({ page }) => {
    await fillNew(page, nameFor("themes"));
    await button(page, "Mirror the device side").click();
    await button(page, "Undo").click();
    await expect(page.getByText(/^Draft kept/)).toBeVisible();
    await expectNoAxeFindingsInBothThemes(page);
    await films(page).nth(0).click();
    await button(page, "Not in the library? Type it here").first().click();
    await expect(page.getByRole("dialog", { name: "A film that the library lacks" })).toBeVisible();
    await expectNoAxeFindingsInBothThemes(page);
  });
});

/** A process owner saves the stack in the meantime. */
async function othersSave(other: Page, path: string, name: string, text: string) {
  await signIn(other, "process owner");
  await other.goto(path);
  await scriptsAtWork(field(other, name));
  await field(other, name).fill(text);
  await save(other).click();
  await expect(other.getByText(/Last changed .*Mikael Lindqvist/)).toBeVisible();
  await other.context().close();
}

test.describe("of two who change one stack", () => {
  test.use({ refusals: true });

  /** Both have changed the silicon, the other one a film too, and this one the name. */
  async function inConflict(page: Page, other: Page, what: string): Promise<Locator> {
    await signIn(page, "engineer");
    const path = await makeStack(page, what);
    await othersSave(other, path, "siliconThickness.value", "550 µm");
    await field(page, "siliconThickness.value").fill("500 µm");
    await films(page).nth(0).click();
    await field(page, "layers[0].thickness.value").fill("8 µm");
    await save(page).click();
    return page.getByRole("alert");
  }

  test("the second sees what differs, field by field, and may keep theirs", async ({ page, browser }) => {
    const alert = await inConflict(page, await browser.newPage(), "mine");
    await expect(alert).toContainText(/Mikael Lindqvist saved this stack at .* UTC, after you had opened it/);
    const row = (name: string) => alert.getByRole("row", { name });
    await expect(row("Remaining silicon")).toContainText("both of you");
    for (const words of ["600 um", "500 µm", "550 µm"]) await expect(row("Remaining silicon")).toContainText(words);
    await expect(row("Thickness of Polymer dielectric A")).toContainText("you did");
    await expectNoAxeFindings(page);
    await alert.getByRole("button", { name: "Keep mine" }).click();
    await expect(alert).toHaveCount(0);
    await expect(page.getByText(/Last changed .*Ines Varga/)).toBeVisible();
    await page.reload();
    await expect(field(page, "siliconThickness.value")).toHaveValue("500 µm");
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("8 µm");
  });

  test("puts both together row by row, and saves it on top of the other's", async ({ page, browser }) => {
    const alert = await inConflict(page, await browser.newPage(), "merged");
    const merge = alert.getByRole("button", { name: "Save merged" });
    await merge.click();
    await expect(alert.getByText(/Choose yours or theirs first: Remaining silicon/)).toBeVisible();
    const theirs = alert.getByRole("radio", { name: "Remaining silicon: theirs, 550 µm" });
    const mine = alert.getByRole("radio", { name: "Remaining silicon: yours, 500 µm" });
    await expect(mine).toBeFocused();
    await expect(alert.getByRole("radio", { name: /^Thickness of Polymer .*: yours/ })).toBeChecked();
    await page.keyboard.press("ArrowRight");
    await expect(theirs).toBeChecked();
    await expectNoAxeFindings(page);

    await alert.getByRole("button", { name: "Put into the fields" }).click();
    await expect(alert).toHaveCount(0);
    await expect(field(page, "siliconThickness.value")).toHaveValue("550 µm");
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("8 µm");
    await button(page, "Undo").click();
    await expect(field(page, "siliconThickness.value")).toHaveValue("500 µm");
    await button(page, "Redo").click();

    // A third one saves meanwhile: what was put together is held against that.
    const third = await browser.newPage();
    await signIn(third, "process owner");
    await third.goto(new URL(page.url()).pathname);
    const name = nameFor("third");
    await field(third, "name").fill(name);
    await save(third).click();
    await expect(third.getByRole("heading", { level: 1, name })).toBeVisible();
    await third.context().close();
    await save(page).click();
    await expect(alert.getByRole("row", { name: /^Name/ })).toContainText("they did");
    // The conflict goes from the screen before the save is sent.
    const saved = page.waitForResponse((answer) => answer.request().method() === "POST");
    await merge.click();
    await expect(alert).toHaveCount(0);
    expect((await saved).status()).toBeLessThan(400);
    await expect(page.getByText(/Last changed .*Ines Varga/)).toBeVisible();
    await page.reload();
    await expect(field(page, "siliconThickness.value")).toHaveValue("550 µm");
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("8 µm");
    await expect(field(page, "name")).toHaveValue(name);
  });

  test("may take the other's, and have the own back by undo", async ({ page, browser }) => {
    const alert = await inConflict(page, await browser.newPage(), "theirs");
    await alert.getByRole("button", { name: "Take theirs" }).click();
    await expect(alert).toHaveCount(0);
    await expect(field(page, "siliconThickness.value")).toHaveValue("550 µm");
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("7um");
    await button(page, "Undo").click();
    await expect(field(page, "siliconThickness.value")).toHaveValue("500 µm");
    await button(page, "Redo").click();
    await expect(field(page, "siliconThickness.value")).toHaveValue("550 µm");
    await save(page).click();
    await expect(page.getByText(/Last changed .*Ines Varga/)).toBeVisible();
    await expect(alert).toHaveCount(0);
  });
});

test.describe("a film that the library lacks", () => {
  test.use({ refusals: true });

  test("is typed beside the stack, which stays as it is", async ({ page }) => {
    await signIn(page, "engineer");
    await fillNew(page, nameFor("film"));
    const name = `Trial nitride ${Date.now().toString(36)}`;
    await films(page).nth(0).click();
    await button(page, "Not in the library? Type it here").first().click();
    const dialog = page.getByRole("dialog", { name: "A film that the library lacks" });
    const add = dialog.getByRole("button", { name: "Add to library and stack" });
    await add.click();
    await expect(dialog.getByText("Give it a name.")).toBeVisible();
    for (const [label, text] of [
      ["Name", name],
      ["Stress at 25 °C", "-250 MPa"],
      ["Thickness in this stack", "800 nm"],
      ["Young’s modulus", "160 GPa"],
      ["Poisson’s ratio", "0.24"],
      ["Expansion", "2.8 ppm/K"],
    ] as const)
      await dialog.getByLabel(label).fill(text);
    await dialog.getByLabel("Kind").selectOption({ label: "Inorganic" });
    await add.click();
    await expect(dialog).toHaveCount(0);
    await inOrder(page, new RegExp(`^${name}`), COPPER);
    await expect(field(page, "layers[0].thickness.value")).toHaveValue("800 nm");
    await expect(cut(page).getByRole("link", { name: new RegExp(`^${name}.*compression, assumed`) })).toBeVisible();
    await expect(field(page, "siliconThickness.value")).toHaveValue("600 um");
    await button(page, "Undo").click();
    await inOrder(page, POLYMER, COPPER);
  });
});
