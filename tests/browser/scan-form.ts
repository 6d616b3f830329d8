import type { Page } from "@playwright/test";

export const fileBefore = (page: Page) => page.getByLabel("File before the film");
export const fileAfter = (page: Page) => page.getByLabel("File after the film");
export const readAndKeep = (page: Page) => page.getByRole("button", { name: "Read and keep" }).click();

/** A wafer of this test alone, so that no test counts on another's data. */
export const ownLabel = () => `M-${Math.random().toString(36).slice(2, 10)}`;

/** Fills in everything but the two files. */
export async function fillForm(page: Page, label: string): Promise<void> {
  await page.goto("/scans/new");
  await page.getByLabel("Wafer", { exact: true }).fill(label);
  await page.getByLabel("Program").selectOption({ label: "Tern" });
  await page.getByLabel("Film, to compare with the library").selectOption({ label: "Polymer dielectric A" });
  await page.getByLabel("Film thickness").fill("5 um");
  await page.getByLabel("Silicon thickness").fill("725 um");
  for (const tolerance of await page.getByLabel("Tolerance, ±").all()) await tolerance.fill("0.05 um");
  await page.getByLabel("Diameter").fill("200 mm");
  await page.getByLabel("Unit of position").selectOption("mm");
  await page.getByLabel("Unit of height").selectOption("µm");
  await page.getByLabel("Decimal mark in the files").selectOption("point");
}

/** What stands below a field: its error or its hint. */
export const below = async (page: Page, label: string) => {
  const id = await page.getByLabel(label).getAttribute("aria-describedby");
  return page.locator(`[id="${id}"]`);
};
