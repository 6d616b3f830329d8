import { randomUUID } from "node:crypto";
import type { Page } from "@playwright/test";
import { assess, ownFlow, press, stackId, steps, TERN } from "./flow-pages.ts";
import { expect, signIn, test } from "./support.ts";

/** A name that no other test has. */
const named = (what: string) => `${what}, ${randomUUID().slice(0, 8)}`;

const titles = (page: Page) => steps(page).locator("tbody th[scope=row] > a").allTextContents();

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("finds a flow by search, program and sort, all in the address", async ({ page }) => {
    await page.goto("/flows?sort=name");
    await page.getByLabel("Search flows").fill("to 100");
    await page.getByLabel("Program").selectOption("tern");
    await page.getByRole("button", { name: "Show" }).click();
    await expect(page).toHaveURL(/q=to\+100.*program=tern/);
    const row = page.getByRole("row").filter({ has: page.getByRole("link", { name: TERN, exact: true }) });
    await expect(row).toContainText("Tern");
    await expect(row).toContainText("200");
    await expect(row).toContainText("19");
    await page.getByRole("link", { name: "Last changed" }).click();
    await expect(page).toHaveURL(/sort=updated/);
    await page.goto("/flows?q=parsecs");
    await expect(page.getByRole("heading", { name: "No flow fits" })).toBeVisible();
  });

  test("assesses a flow, changes a step until it fails, and is told that the answer is old", async ({ page }) => {
    const path = await ownFlow(page);
    await expect(page.getByRole("heading", { name: "Not assessed yet" })).toBeVisible();
    await assess(page);
    await page.goto(path);
    const answer = page.getByRole("region", { name: "Newest assessment" });
    await expect(answer).toContainText("Clear");
    await expect(answer).toContainText("tape or ring from step 14");

    await page.getByRole("link", { name: "Mount on film frame in line, peel grinding tape", exact: true }).click();
    await page.getByLabel("Held by, as planned").selectOption("bare");
    await press(page, "Save step");
    await expect(page).toHaveURL(new RegExp(`${path}\\?step=`));
    await expect(answer).toContainText("Out of date");
    await assess(page);
    await page.goto(path);
    await expect(answer).toContainText("Do not run");
    await expect(page.getByRole("region", { name: "Earlier assessments" })).toContainText("Assessment A");
    await expect(page.getByText("It has been assessed, so it is kept")).toBeVisible();
  });

  test("moves a step and keeps the focus on the button; copies, removes and inserts", async ({ page }) => {
    await ownFlow(page);
    const [first, second, third] = await titles(page);
    const up = page.getByRole("button", { name: /^Move up step \d+, Coat and cure polymer dielectric 1/ });
    await up.focus();
    await page.keyboard.press("Enter");
    await expect.poll(() => titles(page).then((all) => all.slice(0, 3))).toEqual([first, third, second]);
    await expect(up).toBeFocused();
    await page.keyboard.press("Enter");
    await expect.poll(() => titles(page).then((all) => all.slice(0, 3))).toEqual([third, first, second]);
    await expect(up).toBeFocused();
    await expect(page.getByRole("status")).toContainText("to 1.");
    // The first step cannot go further up; the button stays where it is and does nothing.
    await page.keyboard.press("Enter");
    await expect(up).toHaveAttribute("aria-disabled", "true");

    await page.getByRole("button", { name: /^Copy step 1,/ }).click();
    await expect.poll(() => titles(page).then((all) => all[1])).toBe(`${third}, again`);
    await page.getByRole("button", { name: /^Remove step 2,/ }).click();
    await expect(page.getByRole("status")).toContainText("Removed step 2");
    await expect(page.getByRole("button", { name: "Undo" })).toBeFocused();
    await expect.poll(() => titles(page).then((all) => all.slice(0, 3))).toEqual([third, first, second]);

    await page.getByRole("link", { name: /^Insert a step before step 2,/ }).click();
    await page.getByLabel("What is done").fill("Look at it");
    await page.getByLabel("Kind of step").selectOption("measure");
    await press(page, "Save step");
    await expect.poll(() => titles(page).then((all) => all[1])).toBe("Look at it");
  });

  test("types a step with everything that its kind has, film by film", async ({ page }) => {
    const path = await ownFlow(page);
    await page.goto(`${path}/steps/new`);
    await page.getByLabel("What is done").fill("Bond and seed");
    await expect(page.getByRole("group", { name: "Carrier and bond" })).toBeHidden();
    await page.getByLabel("Kind of step").selectOption("bond");
    const bond = page.getByRole("group", { name: "Carrier and bond" });
    await expect(bond).toBeVisible();
    await expect(page.getByRole("group", { name: "Edge trim" })).toBeHidden();
    await bond.getByLabel("Carrier", { exact: true }).selectOption({ label: "Glass carrier 3.0 ppm" });
    await expect(bond).toContainText("expands 3.00");
    await bond.getByLabel("Bonding material").selectOption({ label: "Laser-release adhesive B" });
    await expect(bond).toContainText("does not flow");
    await page.getByRole("group", { name: "Thickness of the bond" }).getByLabel("Value").fill("50um");
    await expect(page.getByRole("group", { name: "Thickness of the bond" })).toContainText("50 µm");
    await page.getByLabel("Tool").selectOption({ index: 1 });
    await expect(page.getByText(/Takes warp to .* edges up/)).toBeVisible();
    await page.getByLabel("vacuum", { exact: true }).check();

    await press(page, "Add or remove a film");
    const film = page.getByRole("group", { name: "Film, line 1" });
    await film.getByLabel("Film", { exact: true }).selectOption({ label: "Plated copper A" });
    await expect(film).toContainText("The film’s own: +20");
    await film.getByRole("group", { name: "Film thickness" }).getByLabel("Value").fill("0.2 um");
    await press(page, "Another film");
    const second = page.getByRole("group", { name: "Film, line 2" });
    await second.getByLabel("What happens").selectOption("removes");
    await expect(second.getByRole("group", { name: "Film thickness" })).toBeHidden();
    await press(page, "Take line 2 out");
    await expect(page.getByRole("button", { name: "Another film" })).toBeFocused();

    await press(page, "Save step");
    const row = steps(page).getByRole("row").last();
    await expect(row).toContainText("Bond and seed");
    await expect(row).toContainText("adds Plated copper A, 0.2 µm");
    await expect(row).toContainText("Glass carrier 3.0 ppm, Laser-release adhesive B, 50 µm");
    await expect(row).toContainText("assumed numbers");
  });

  test("is asked before leaving a step that was changed", async ({ page }) => {
    const path = await ownFlow(page);
    await page.goto(`${path}/steps/new`);
    await page.getByLabel("What is done").fill("Half typed");
    await page.getByRole("link", { name: "Films" }).click();
    await expect(page.getByRole("dialog", { name: "Leave without saving?" })).toBeVisible();
    await press(page, "Stay here");
    await expect(page.getByLabel("What is done")).toHaveValue("Half typed");
    await page.getByRole("link", { name: "Leave without saving" }).click();
    await expect(page).toHaveURL(new RegExp(`${path}$`));
  });

  test("starts a flow from a stack: thinned on tape, every proposed number assumed", async ({ page }) => {
    const stack = await stackId(page, "Tern T-2, one redistribution layer");
    await page.goto(`/flows/new?stack=${stack}`);
    const proposed = page.getByRole("table", { name: "Steps proposed" });
    await expect(proposed).toContainText("Coat and cure Polymer dielectric A, 5 µm, 95 %");
    await expect(proposed).toContainText("Grind to 110 µm");
    const name = named("Tern T-2, from its stack");
    await page.getByLabel("Name").fill(name);
    await press(page, "Save with the steps below");
    await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
    const grind = steps(page).getByRole("row").filter({ hasText: "Grind to 110" });
    await expect(grind).toContainText("110 ± 3");
    await expect(grind).toContainText("assumed numbers");
    await assess(page);
  });

  test("removes a flow that was never assessed, asked twice", async ({ page }) => {
    const path = await ownFlow(page);
    await page.getByText("Remove this flow").click();
    await press(page, "Remove it");
    await expect(page).toHaveURL(/\/flows$/);
    const gone = await page.request.get(path);
    expect(gone.status()).toBe(404);
  });

  test.describe("with bad input", () => {
    test.use({ refusals: true });

    test("is told at each field, and nothing typed is lost", async ({ page }) => {
      const path = await ownFlow(page);
      await page.goto(`${path}/steps/new`);
      await page.getByLabel("Kind of step").selectOption("grind");
      await page.getByLabel("Peak temperature").fill("12 parsecs");
      await page.getByRole("group", { name: "Silicon after the step" }).getByLabel("Value").fill("-5 um");
      await press(page, "Add or remove a film");
      const film = page.getByRole("group", { name: "Film, line 1" });
      await film.getByRole("group", { name: "Film thickness" }).getByLabel("Value").fill("-3 um");
      await press(page, "Save step");
      await expect(page.getByRole("alert")).toContainText("5 fields need a look");
      await expect(page.getByText("Say what is done.")).toBeVisible();
      await expect(page.getByText("parsecs is not a unit of temperature")).toBeVisible();
      await expect(page.getByText("−5 µm is outside 1 µm to 2 mm.")).toBeVisible();
      await expect(page.getByText("−3 µm is outside 1 nm to 1 mm.")).toBeVisible();
      await expect(page.getByText("Choose a film.")).toBeVisible();
      await expect(page.getByLabel("Peak temperature")).toHaveValue("12 parsecs");
      await expect(film.getByRole("group", { name: "Film thickness" }).getByLabel("Value")).toHaveValue("-3 um");
      await expect(page.getByLabel("Kind of step")).toHaveValue("grind");
    });

    test("is asked for what the kind of step cannot do without", async ({ page }) => {
      const path = await ownFlow(page);
      await page.goto(`${path}/steps/new`);
      await page.getByLabel("What is done").fill("Bond");
      await page.getByLabel("Kind of step").selectOption("bond");
      await press(page, "Save step");
      await expect(page.getByText("Choose the carrier that it is bonded to.")).toBeVisible();
      await expect(page.getByText("Choose the bonding material.")).toBeVisible();
      await expect(page.getByText("Type the thickness of the bond.")).toBeVisible();
      await page.getByLabel("Kind of step").selectOption("grind");
      await press(page, "Save step");
      await expect(page.getByText("Type the silicon that remains after the grind.")).toBeVisible();
      const silicon = page.getByRole("group", { name: "Silicon after the step" });
      await silicon.getByLabel("Value").fill("20 um");
      await silicon.getByLabel("Tolerance").fill("30 um");
      await press(page, "Save step");
      await expect(silicon).toContainText("The tolerance is as large as the value itself.");
    });

    test("may save steps in an order that makes no sense, and hears of it from the assessment", async ({ page }) => {
      const path = await ownFlow(page);
      await page.goto(`${path}/steps/new?at=1`);
      await page.getByLabel("What is done").fill("Debond what is not bonded");
      await page.getByLabel("Kind of step").selectOption("debond");
      await page.getByLabel("Tool").selectOption({ label: "Debonder (1000 µm up, 1000 µm down)" });
      await press(page, "Save step");
      await assess(page);
      await page.goto(path);
      await expect(page.getByRole("region", { name: "Newest assessment" })).toContainText("nothing to debond");
    });

    test("must choose carrier and bonding material for a stack that needs them", async ({ page }) => {
      const stack = await stackId(page, "Petrel P-3, back-side metal");
      await page.goto(`/flows/new?stack=${stack}`);
      const name = named("Petrel P-3, from its stack");
      await page.getByLabel("Name").fill(name);
      await press(page, "Save with the steps below");
      await expect(page.getByText("This stack is thinned on a carrier: choose it.")).toBeVisible();
      await page.getByLabel("Carrier", { exact: true }).selectOption({ label: "Glass carrier 3.0 ppm" });
      await page.getByLabel("Bonding material").selectOption({ label: "Laser-release adhesive B" });
      await press(page, "Save with the steps below");
      await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
      await expect(steps(page)).toContainText("Bond to Glass carrier 3.0 ppm, Laser-release adhesive B");
      await assess(page);
    });

    test("is told why a flow without steps cannot be assessed", async ({ page }) => {
      await page.goto("/flows/new");
      await press(page, "Save and add steps");
      await expect(page.getByText("Give it a name.")).toBeVisible();
      const name = named("Tern without steps");
      await page.getByLabel("Name").fill(name);
      await page.getByLabel("Program").selectOption({ label: "Tern" });
      await page.getByLabel("Silicon").selectOption({ label: "Silicon (001), 200 mm, 725 µm" });
      const incoming = page.getByRole("group", { name: "Silicon as it comes in" });
      await incoming.getByLabel("Value").fill("0,725 mm");
      await incoming.getByLabel("Tolerance").fill("15 um");
      await press(page, "Save and add steps");
      await expect(page.getByRole("heading", { name: "No steps yet" })).toBeVisible();
      await press(page, "Assess");
      await expect(page.getByRole("alert")).toContainText("no steps yet");
      await page.goto("/flows/new");
      await page.getByLabel("Name").fill(name);
      await page.getByLabel("Program").selectOption({ label: "Tern" });
      await page.getByLabel("Silicon").selectOption({ index: 1 });
      await page.getByRole("group", { name: "Silicon as it comes in" }).getByLabel("Value").fill("725 um");
      await press(page, "Save and add steps");
      await expect(page.getByText("There is already a flow of that name.")).toBeVisible();
      await expect(page.getByLabel("Name")).toHaveValue(name);
    });

    test("hears that somebody else was there first, and may put the own in its place", async ({ page, context }) => {
      const path = await ownFlow(page);
      const title = "Wafer-level test and bow";
      await page.getByRole("link", { name: title, exact: true }).click();
      const other = await context.newPage();
      await other.goto(path);
      await other.getByRole("button", { name: /^Move down step 1,/ }).click();
      await expect(other).toHaveURL(/done=down/);
      await page.getByLabel("What is done").fill("Test and bow");
      await press(page, "Save step");
      await expect(page.getByRole("alert")).toContainText("Ines Varga changed this flow at");
      await expect(page.getByRole("alert")).toContainText("Moved step 1");
      await expect(page.getByRole("table", { name: "Where the two differ" })).toContainText("Test and bow");
      await expect(page.getByLabel("What is done")).toHaveValue("Test and bow");
      await press(page, "Keep mine");
      await expect(steps(page)).toContainText("Test and bow");

      // The other window still shows the flow as it was: its move is not done blindly.
      await other.getByRole("button", { name: /^Move down step 1,/ }).click();
      await expect(other.getByRole("alert")).toContainText("changed this flow");
      await expect(steps(other)).toContainText("Test and bow");
    });
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("everything of a flow works", async ({ page }) => {
    test.slow();
    await signIn(page, "engineer");
    const path = await ownFlow(page);
    const [first, second] = await titles(page);
    await page.getByRole("button", { name: /^Move down step 1,/ }).click();
    await expect.poll(async () => (await titles(page)).slice(0, 2)).toEqual([second, first]);
    await expect(page.getByRole("button", { name: /^Move down step 2,/ })).toBeFocused();
    await page.getByRole("button", { name: /^Copy step 1,/ }).click();
    await expect.poll(async () => (await titles(page))[1]).toBe(`${second}, again`);
    await page.getByRole("button", { name: /^Remove step 2,/ }).click();
    await expect.poll(async () => (await titles(page)).slice(0, 2)).toEqual([second, first]);

    await page.getByRole("link", { name: "Add a step at the end" }).click();
    for (const name of [
      "Edge trim",
      "Carrier and bond",
      "Force of the ground or polished face; compression is negative",
    ])
      await expect(page.getByRole("group", { name, exact: true })).toBeVisible();
    await page.getByLabel("What is done").fill("Trim");
    await page.getByLabel("Kind of step").selectOption("edge trim");
    await page.getByLabel("Peak temperature").fill("12 parsecs");
    await press(page, "Add or remove a film");
    await expect(page.getByLabel("What is done")).toHaveValue("Trim");
    await page.getByLabel("Film", { exact: true }).selectOption({ label: "Plated copper A" });
    await press(page, "Save step");
    await expect(page.getByText("parsecs is not a unit of temperature")).toBeVisible();
    await press(page, "Take line 1 out");
    await page.getByLabel("Peak temperature").fill("25 °C");
    await page.getByRole("group", { name: "Width of the trim" }).getByLabel("Value").fill("0.7 mm");
    await page.getByRole("group", { name: "Thickness of the bond" }).getByLabel("Value").fill("40 um");
    await press(page, "Save step");
    await expect(page.getByText("Type how deep the trim goes.")).toBeVisible();
    await expect(page.getByText("Only a bond has it")).toBeVisible();
    await page.getByRole("group", { name: "Depth of the trim" }).getByLabel("Value").fill("150 um");
    await page.getByRole("group", { name: "Thickness of the bond" }).getByLabel("Value").fill("");
    await press(page, "Save step");
    await expect(page).toHaveURL(new RegExp(`${path}\\?step=`));
    await expect(steps(page)).toContainText("trims edge, 0.7 mm wide, 150 µm deep");
    await assess(page);
  });
});
