import { expect, signIn, test } from "./support.ts";

test.use({ serviceWorkers: "allow", refusals: true });

/** Every way to the server is cut: what a restart, a lost radio or a pulled cable do. */
test("a page that cannot be asked for says so, and comes when it can", async ({ page, context }) => {
  await signIn(page, "technician");
  await page.goto("/films");
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined));
  await context.setOffline(true);
  await page.goto("/stacks");
  await expect(page.getByRole("heading", { level: 1, name: "No way to the server" })).toBeVisible();
  await context.setOffline(false);
  await page.getByRole("link", { name: "Try again" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Stacks" })).toBeVisible();
});

test("a page that is led to says so in the same words", async ({ page, context }) => {
  await signIn(page, "technician");
  await page.goto("/films");
  // Whoever was there before has its scripts and lacks its data; without the scripts the whole page is asked for.
  await page.getByRole("link", { name: "Stacks", exact: true }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Stacks" })).toBeVisible();
  await page.getByRole("link", { name: "Films", exact: true }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Films" })).toBeVisible();
  await context.setOffline(true);
  await page.getByRole("link", { name: "Stacks", exact: true }).click();
  await expect(page.getByRole("heading", { level: 1, name: "No way to the server" })).toBeVisible();
  await context.setOffline(false);
  await page.getByRole("link", { name: "Try again" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Stacks" })).toBeVisible();
});

test("nothing of a person's pages stays on the device", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/films");
  await page.evaluate(() => navigator.serviceWorker.ready.then(() => undefined));
  await page.goto("/stacks");
  const kept = await page.evaluate(async () => {
    const names = await caches.keys();
    const requests = await Promise.all(names.map(async (name) => (await caches.open(name)).keys()));
    return requests.flat().map(({ url }) => new URL(url).pathname);
  });
  expect(kept).toEqual(["/unreachable.html"]);
});
