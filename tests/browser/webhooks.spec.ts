import { once } from "node:events";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test("a process owner makes a webhook, tries it, sends it again, and deletes it", async ({ page }) => {
  const asked: string[] = [];
  const receiver = createServer((request, response) => {
    asked.push(String(request.headers["planeward-signature"]));
    request.resume();
    response.end("taken");
  }).listen(0, "127.0.0.1");
  await once(receiver, "listening");
  await signIn(page, "process owner");
  await page.goto("/webhooks");
  await page.getByLabel("What receives it").fill("Line board");
  await page.getByLabel("Program").selectOption({ label: "Tern" });
  await page.getByLabel("Address").fill(`http://127.0.0.1:${(receiver.address() as AddressInfo).port}/hook`);
  await page.getByLabel("A step is stopped").check();
  await page.getByRole("button", { name: "Make the webhook" }).click();
  await expect(page.getByText("Copy its secret now")).toBeVisible();
  await expect(page.getByText(/^pwh_/)).toBeVisible();
  await expectNoAxeFindings(page);

  await page.getByRole("link", { name: "Line board" }).click();
  await page.getByRole("button", { name: "Send a test" }).click();
  await expect(page.getByRole("heading", { name: "A test" })).toBeVisible();
  await expect(async () => {
    await page.reload();
    await expect(page.getByText("taken")).toBeVisible({ timeout: 500 });
  }).toPass();
  await expect(page.getByText("Sent:")).toBeVisible();
  await expectNoAxeFindings(page);
  const first = page.url();
  await page.getByRole("button", { name: "Send it again" }).click();
  await page.waitForURL((url) => url.href !== first);
  await expect.poll(() => asked.length).toBe(2);
  for (const signature of asked) expect(signature).toMatch(/^v1=[\da-f]{64}$/);

  await page.getByRole("link", { name: "Line board" }).click();
  await expect(page.getByRole("link", { name: /^A test/ })).toHaveCount(2);
  await expectNoAxeFindings(page);
  await page.goto("/webhooks/receiving");
  await expect(page.getByRole("heading", { name: "How to check it" })).toBeVisible();
  await expectNoAxeFindings(page);
  await page.goBack();
  await page.getByRole("button", { name: "Delete the webhook" }).click();
  await expect(page.getByText("The webhook and its log are deleted.")).toBeVisible();
  receiver.close();
});
