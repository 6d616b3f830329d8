import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** A film that no other test has. */
const ownName = () => `Trial nitride ${Math.random().toString(36).slice(2, 8)}`;
const HEADS =
  "name;kind;stress_MPa;stress_source;youngs_modulus_GPa;youngs_modulus_source;poissons_ratio;poissons_ratio_source;expansion_ppm_per_K;expansion_source";
const rowOf = (name: string, stress: number) =>
  `${HEADS}\n${name};inorganic;${stress};supplier;250;handbook;0,25;handbook;2,3;handbook\n`;
const table = (name: string, text: string) => ({ name, mimeType: "text/csv", buffer: Buffer.from(text) });

for (const javaScriptEnabled of [true, false])
  test.describe(javaScriptEnabled ? "an engineer" : "an engineer without scripts", () => {
    test.use({ javaScriptEnabled, refusals: true });

    test("brings films in as a table, sees first what it would do, and compares two", async ({ page }) => {
      await signIn(page, "engineer");
      const name = ownName();
      await page.goto("/films");
      await page.getByRole("link", { name: "Import films" }).click();
      await page.getByLabel("Or its rows, pasted").fill(rowOf(name, 400));
      await page.getByRole("button", { name: "See what would change" }).click();
      await expect(page.getByRole("heading", { name: "1 film would be added" })).toBeVisible();
      if (javaScriptEnabled) await expectNoAxeFindings(page);
      await page.getByRole("button", { name: "Add 1 film" }).click();
      await expect(page.getByText("1 film is imported.")).toBeVisible();

      await page.goto("/films/import");
      const changed = `${rowOf(name, 450)};;\nNobody knows;metal;nonsense;supplier;;;;;;\n`;
      await page.getByLabel("File", { exact: true }).setInputFiles(table("films.csv", changed));
      await page.getByRole("button", { name: "See what would change" }).click();
      await expect(page.getByRole("heading", { name: "1 film would be changed" })).toBeVisible();
      await expect(page.getByText("Row 4 is left out")).toBeVisible();
      await expect(page.getByRole("row").filter({ hasText: name })).toContainText("450 MPa, supplier");
      await page.getByRole("button", { name: "Change 1 film" }).click();
      await expect(page.getByText("1 film is imported.")).toBeVisible();

      await page.goto(`/films?q=${encodeURIComponent(name)}`);
      await page.getByRole("link", { name, exact: true }).click();
      await page.getByRole("link", { name: "Compare with another film" }).click();
      await page.getByLabel("Against").selectOption({ label: "Passivation nitride A" });
      await page.getByRole("button", { name: "Compare", exact: true }).click();
      await expect(page.getByRole("heading", { name: /^They differ in \d+ of \d+ properties$/ })).toBeVisible();
      await expect(page.getByRole("row", { name: /^Stress \d/ })).toContainText("450 MPa, supplier");
      if (javaScriptEnabled) await expectNoAxeFindings(page);
    });

    test("is told what is wrong with a table, and nothing is changed", async ({ page }) => {
      await signIn(page, "engineer");
      await page.goto("/films/import");
      await page.getByRole("button", { name: "See what would change" }).click();
      await expect(page.getByRole("alert")).toContainText("Choose a file, or paste its rows.");
      await page.getByLabel("Or its rows, pasted").fill("stress_MPa\n3");
      await page.getByRole("button", { name: "See what would change" }).click();
      await expect(page.getByRole("alert")).toContainText("names no column ‘name’");
    });
  });

test("a technician takes the library out as a table, and brings none in", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/films");
  await expect(page.getByRole("link", { name: "Import films" })).toHaveCount(0);
  const download = page.waitForEvent("download");
  await page.getByRole("link", { name: "Download as CSV" }).click();
  expect((await download).suggestedFilename()).toBe("Films.csv");
});
