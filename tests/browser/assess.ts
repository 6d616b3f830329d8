import type { Page } from "@playwright/test";
import { expect } from "./support.ts";

/** The demo's own flow. Tests assess it and never change it; who wants to change a flow makes a copy. */
export const TERN = "Tern T-2, to 100 µm on tape";

/** Opens the demo flow. */
export async function openTern(page: Page): Promise<void> {
  await page.goto("/flows?q=Tern&sort=name");
  await page.getByRole("link", { name: TERN, exact: true }).click();
  await expect(page.getByRole("heading", { level: 1 })).toContainText(TERN);
}

/** Assesses the flow that is open and stays at the assessment, whose path it returns. */
export async function assess(page: Page): Promise<string> {
  await page.getByRole("button", { name: "Assess", exact: true }).click();
  // The first one after a start takes a while longer: nothing is compiled yet.
  await expect(page).toHaveURL(/\/assessments\/[0-9a-f-]+$/, { timeout: 20_000 });
  return new URL(page.url()).pathname;
}

/** A new assessment of the demo flow. */
export async function assessTern(page: Page): Promise<string> {
  await openTern(page);
  return assess(page);
}
