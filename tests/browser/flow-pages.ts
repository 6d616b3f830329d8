import type { Page } from "@playwright/test";
import { expect } from "./support.ts";

/** The demo flow that the tests of flows start from. */
export const TERN = "Tern T-2, to 100 µm on tape";

/** A list in which the demo flow comes first, however many copies there are. */
export const LIST = `/flows?q=${encodeURIComponent(TERN)}&sort=name`;

/** Opens the demo flow and makes a copy of it, which is the test's own; its path. */
export async function ownFlow(page: Page): Promise<string> {
  await page.goto(LIST);
  await page.getByRole("link", { name: TERN, exact: true }).click();
  await press(page, "Copy");
  await expect(page.getByRole("heading", { level: 1 })).toContainText(`${TERN}, copy`);
  return new URL(page.url()).pathname;
}

/** The step table of a flow's page. */
export const steps = (page: Page) => page.getByRole("table", { name: "Steps of the flow" });

/** Presses the button of that name. */
export const press = (page: Page, name: string) => page.getByRole("button", { name, exact: true }).click();

/** Assesses the flow of the page and waits until the assessment is there. */
export async function assess(page: Page): Promise<void> {
  await press(page, "Assess");
  await expect(page).toHaveURL(/\/assessments\//);
}

/** Id of a stack of the demo, found by a film that it is made of. */
export async function stackId(page: Page, name: string): Promise<string> {
  await page.goto("/films");
  await page.getByRole("link", { name: "Polymer dielectric A", exact: true }).click();
  const path = await page.getByRole("link", { name }).getAttribute("href");
  if (!path) throw new Error(`There is no stack called ${name}.`);
  return path.replace("/stacks/", "");
}
