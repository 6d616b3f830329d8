import type { Page } from "@playwright/test";
import {
  expect,
  expectNoAxeFindings,
  expectNoAxeFindingsInBothThemes,
  scriptsAtWork,
  signIn,
  test,
} from "./support.ts";

test.slow();

const opener = (page: Page) => page.getByRole("link", { name: "Search everything" });
const field = (page: Page) => page.getByRole("combobox", { name: "Name or number of anything" });

/** Opens the palette by its keys, once the scripts are at work. */
async function openPalette(page: Page): Promise<void> {
  await scriptsAtWork(opener(page));
  await page.keyboard.press("Control+k");
  await expect(field(page)).toBeFocused();
}

test("a flow is found and opened by keys alone", async ({ page }) => {
  await signIn(page, "engineer");
  await page.goto("/films");
  await openPalette(page);
  await page.keyboard.type("tern t-2, to 100");
  const dialog = page.getByRole("dialog", { name: "Search" });
  await expect(dialog.getByRole("status")).toHaveText(/^\d+ found$/);
  const flow = dialog.getByRole("option", { name: /^Tern T-2, to 100 µm on tape/ }).first();
  await expect(flow).toHaveAttribute("aria-selected", "true");
  await expect(field(page)).toHaveAttribute("aria-activedescendant", (await flow.getAttribute("id")) ?? "");
  await page.keyboard.press("Enter");
  await expect(page.getByRole("heading", { level: 1, name: "Tern T-2, to 100 µm on tape" })).toBeVisible();
  await expect(dialog).toBeHidden();
});

test("arrows go round, Escape leaves, and nothing found says what to try", async ({ page }) => {
  await signIn(page, "engineer");
  await page.goto("/films");
  await openPalette(page);
  await page.keyboard.type("copper");
  const options = page.getByRole("dialog").getByRole("option");
  const chosen = page.locator("[role=option][aria-selected=true]");
  await expect(options.first()).toHaveAttribute("aria-selected", "true");
  await page.keyboard.press("ArrowDown");
  await expect(options.nth(1)).toHaveAttribute("aria-selected", "true");
  await page.keyboard.press("ArrowUp");
  await page.keyboard.press("ArrowUp");
  await expect(options.last()).toHaveAttribute("aria-selected", "true");
  await expect(options.last()).toBeInViewport();
  await expect(chosen).toHaveCount(1);
  await field(page).fill("no such thing");
  await expect(page.getByRole("dialog").getByRole("status")).toHaveText(
    "Nothing is called “no such thing”; try fewer letters, or one word alone.",
  );
  await page.keyboard.press("Escape");
  await expect(field(page)).toBeHidden();
  await expect(page).toHaveURL(/\/films$/);
});

test.describe("a search that does not come through", () => {
  test.use({ refusals: true });

  test("says so and can be tried again", async ({ page }) => {
    await signIn(page, "engineer");
    await page.goto("/films");
    await page.route("**/search/found?q=tern", (route) => route.fulfill({ status: 429 }));
    await openPalette(page);
    await page.keyboard.type("tern");
    const status = page.getByRole("dialog").getByRole("status");
    await expect(status).toHaveText("The server could not search just now.");
    await page.unroute("**/search/found?q=tern");
    await page.getByRole("button", { name: "Try again" }).click();
    await expect(status).toHaveText(/^\d+ found$/);
  });
});

test("what was opened and marked stands in the palette and on Today", async ({ page }) => {
  await signIn(page, "process owner");
  await page.goto("/stacks?q=fulmar");
  await scriptsAtWork(opener(page));
  await page
    .getByRole("table")
    .getByRole("link", { name: /^Fulmar/ })
    .click();
  const star = page.getByRole("button", { name: "Favourite" });
  await expect(star).toHaveAttribute("aria-pressed", "false");
  // It shows at once, before the server has it; a page that is left at that moment takes the request along.
  const marked = page.waitForResponse((answer) => answer.request().method() === "POST");
  await star.click();
  await expect(star).toHaveAttribute("aria-pressed", "true");
  await marked;
  const name = await page.getByRole("heading", { level: 1 }).innerText();
  await page.goto("/");
  for (const group of ["Favourites", "Recently opened"])
    await expect(page.getByRole("region", { name: group }).getByRole("link", { name })).toBeVisible();
  await openPalette(page);
  await expect(page.getByRole("group", { name: "Favourites" })).toContainText(name);
  await expect(page.getByRole("group", { name: "Recently opened" })).toContainText(name);
  await page.keyboard.press("Escape");
  await page.goto("/stacks?favourites=mine");
  await expect(page.getByRole("table").getByRole("row")).toHaveCount(2);
  await page.goto("/favourites");
  await scriptsAtWork(page.getByRole("button", { name: `Favourite: ${name}` }));
  await page.getByRole("button", { name: `Favourite: ${name}` }).click();
  await expect(page.getByText("Nothing is marked yet")).toBeVisible();
});

test("a search of a list is kept, chosen again and removed", async ({ page }) => {
  await signIn(page, "shift lead");
  await page.goto("/films?kind=metal");
  const keep = page.getByText("Keep this search");
  await scriptsAtWork(opener(page));
  await keep.click();
  await page.getByLabel("Name of the search").fill("Metals");
  await page.getByRole("button", { name: "Keep", exact: true }).click();
  const kept = page.getByRole("list", { name: "Kept searches" });
  await expect(kept.getByRole("link", { name: "Metals" })).toHaveAttribute("aria-current", "true");
  await page.goto("/films");
  await kept.getByRole("link", { name: "Metals" }).click();
  await expect(page).toHaveURL(/\/films\?kind=metal$/);
  await scriptsAtWork(kept.getByRole("button"));
  await kept.getByRole("button", { name: "Remove the kept search Metals" }).click();
  await expect(kept).toBeHidden();
});

test("? shows the keys outside of fields, until it is switched off", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/films");
  await scriptsAtWork(opener(page));
  const keys = page.getByRole("dialog", { name: "Keys" });
  await page.getByLabel("Search films").press("?");
  await expect(page.getByLabel("Search films")).toHaveValue("?");
  await expect(keys).toBeHidden();
  await page.getByLabel("Search films").blur();
  await page.keyboard.press("?");
  await expect(keys).toContainText("Alt Up");
  await expectNoAxeFindings(page);
  await keys.getByRole("link", { name: "Preferences" }).click();
  await page.getByLabel("The key ? shows").uncheck();
  await page.getByRole("button", { name: "Save preferences" }).click();
  await expect(page.getByText("Your preferences are saved.")).toBeVisible();
  await page.getByRole("heading", { level: 1 }).click();
  await page.keyboard.press("?");
  await page.keyboard.press("Control+k");
  await expect(field(page)).toBeFocused();
  await expect(keys).toBeHidden();
  await page.keyboard.press("Escape");
  await page.getByLabel("The key ? shows").check();
  await page.getByRole("button", { name: "Save preferences" }).click();
  await expect(page.getByText("Your preferences are saved.")).toBeVisible();
});

test("theme and density are there from the first byte, and paper stays light", async ({ page }) => {
  await signIn(page, "shift lead");
  const save = (form: Record<string, string>) => page.request.post("/preferences", { form });
  await save({ theme: "dark", density: "tight", singleKeys: "on" });
  expect(await (await page.request.get("/films")).text()).toMatch(
    /<html[^>]* data-theme="dark"[^>]* data-density="tight"/,
  );
  await page.goto("/films");
  const surface = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor);
  expect(await surface()).toBe("rgb(18, 23, 30)");
  await page.emulateMedia({ media: "print" });
  expect(await surface()).toBe("rgb(255, 255, 255)");
  await page.emulateMedia({ media: "screen", colorScheme: "dark" });
  await save({ theme: "light", density: "roomy", singleKeys: "on" });
  await page.reload();
  expect(await surface()).toBe("rgb(250, 248, 243)");
  await save({ theme: "system", density: "roomy", singleKeys: "on" });
});

test("a guest finds places and the method page, and no other program's name", async ({ page }) => {
  await signIn(page, "guest");
  for (const query of ["petrel", "tern", "polymer", "copper"]) {
    const text = await (await page.request.get(`/search/found?q=${query}`)).text();
    expect(text).not.toMatch(/Petrel|Fulmar|Polymer dielectric|\/(?:films|flows|stacks)\//);
  }
  await page.goto("/search?q=sheets");
  await expect(page.getByRole("main").getByRole("link", { name: "Sheets", exact: true })).toBeVisible();
});

test.describe("without JavaScript", () => {
  test.use({ javaScriptEnabled: false });

  test("one searches, marks and keeps by forms", async ({ page }) => {
    await signIn(page, "engineer");
    await page.goto("/films");
    await opener(page).click();
    await page.getByLabel("Name or number of anything").fill("polymer dielectric a");
    await page.getByRole("button", { name: "Search", exact: true }).click();
    await page.getByRole("main").getByRole("link", { name: "Polymer dielectric A", exact: true }).click();
    const star = page.getByRole("button", { name: "Favourite" });
    await star.click();
    await expect(star).toHaveAttribute("aria-pressed", "true");
    await star.click();
    await expect(star).toHaveAttribute("aria-pressed", "false");
    await page.goto("/films?q=copper");
    await page.getByText("Keep this search").click();
    await page.getByLabel("Name of the search").fill("Copper");
    await page.getByRole("button", { name: "Keep", exact: true }).click();
    await expect(page).toHaveURL(/\/films\?q=copper$/);
    await page.getByRole("button", { name: "Remove the kept search Copper" }).click();
    await expect(page.getByRole("list", { name: "Kept searches" })).toBeHidden();
  });
});

test("axe finds nothing in the search and the preferences on a phone", async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 780 });
  await signIn(page, "engineer");
  const narrow = async () =>
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
  for (const path of ["/search?q=copper", "/preferences", "/favourites", "/films?q=copper"]) {
    await page.goto(path);
    await narrow();
    await expectNoAxeFindingsInBothThemes(page);
  }
  await openPalette(page);
  await page.keyboard.type("copper");
  await expect(page.getByRole("option").first()).toBeVisible();
  await narrow();
  await expectNoAxeFindingsInBothThemes(page);
});
