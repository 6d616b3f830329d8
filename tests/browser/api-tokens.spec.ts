import { request as newRequest } from "@playwright/test";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test.use({ refusals: true });

test("an engineer makes a token, a script asks with it, and it is revoked", async ({ page, baseURL }) => {
  await signIn(page, "engineer");
  await page.goto("/tokens");
  await page.getByRole("button", { name: "Make the token" }).click();
  await expect(page.getByText("Name what will use it.")).toBeVisible();
  await page.getByLabel("What will use it").fill("Bow gauge in bay 3");
  await page.getByLabel("Program").selectOption({ label: "Tern" });
  await page.getByLabel("Read stacks").check();
  await page.getByRole("button", { name: "Make the token" }).click();
  const shown = page.getByRole("status").locator("code");
  await expect(shown).toHaveText(/^pwd_[\w-]{43}$/);
  const token = (await shown.textContent()) ?? "";
  await expectNoAxeFindings(page);
  await page.setViewportSize({ width: 320, height: 640 });
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);

  const script = await newRequest.newContext({
    baseURL: baseURL ?? "",
    extraHTTPHeaders: { Authorization: `Bearer ${token}`, Origin: "http://elsewhere.example" },
  });
  const stacks = await script.get("/api/v1/stacks");
  expect(stacks.status()).toBe(200);
  expect(stacks.headers()["x-request-id"]).toMatch(/^[0-9a-f-]{36}$/);
  const { data } = (await stacks.json()) as { data: { program: string }[] };
  expect([...new Set(data.map(({ program }) => program))]).toEqual(["tern"]);
  // A token made for reading changes nothing, and a page of another site's does not count against a token.
  expect((await script.post("/api/v1/lots", { data: {} })).status()).toBe(403);
  expect((await script.get("/api/v1/openapi.json")).status()).toBe(200);
  // Outside of the API a token opens nothing.
  expect((await script.get("/stacks", { maxRedirects: 0 })).status()).toBe(302);

  await page.reload();
  await expect(page.getByText(token)).toHaveCount(0);
  const row = page.getByRole("listitem").filter({ hasText: "Bow gauge in bay 3" });
  await expect(row).toContainText("Last used");
  await row.getByRole("button", { name: /^Revoke/ }).click();
  await expect(page.getByText("The token is revoked.")).toBeVisible();
  await expect(row).toContainText("revoked");
  expect((await script.get("/api/v1/stacks")).status()).toBe(401);
  await script.dispose();
  // A cookie does not help a token that is not good.
  const mixed = await page.request.get("/api/v1/stacks", { headers: { Authorization: `Bearer ${token}` } });
  expect(mixed.status()).toBe(401);
  expect((await page.request.get("/api/v1/stacks")).status()).toBe(200);
});

test("the reference is read in the dark, on a phone and by keyboard", async ({ page }) => {
  await page.emulateMedia({ colorScheme: "dark" });
  await signIn(page, "technician");
  await page.goto("/api");
  await expect(page.getByRole("heading", { level: 1, name: "API" })).toBeVisible();
  const operation = page.getByRole("region", { name: "GET /api/v1/stacks/{stack_id}" });
  await operation.locator("summary").last().focus();
  await page.keyboard.press("Enter");
  await expect(operation.getByText("films[].thickness_m.value")).toBeVisible();
  await expectNoAxeFindings(page);
  await page.setViewportSize({ width: 320, height: 640 });
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
});
