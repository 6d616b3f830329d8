import type { Page } from "@playwright/test";
import { scanFile, trueScan, type FileStyle } from "#tests/fixtures/scan-files.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const file = (name: string, content: Uint8Array | string) => ({
  name,
  mimeType: "text/csv",
  buffer: Buffer.from(content),
});

/** Scans before and after a film whose bytes no other test has. */
function ownScans() {
  const times = 1 + Math.random() / 10;
  return {
    before: (style: Partial<FileStyle> = {}) => scanFile(trueScan({ times }), style).bytes,
    after: (style: Partial<FileStyle> = {}) => scanFile(trueScan({ times: 1.8 * times }), style).bytes,
  };
}

const choose = (page: Page, files: ReturnType<typeof file>[]) =>
  page.getByLabel("Or choose files").setInputFiles(files);
const header = (page: Page, name: string) => page.getByRole("button", { name: new RegExp(`^${name}`) });
const pairs = (page: Page) => page.getByRole("list", { name: "Pairs and files that stay" });
const row = (page: Page, text: string | RegExp) => pairs(page).getByRole("listitem").filter({ hasText: text });

/** Fills in what all pairs of a batch share. */
async function fillShared(page: Page): Promise<void> {
  await page.getByLabel("Program", { exact: true }).selectOption({ label: "Tern" });
  await page.getByLabel("Film thickness").fill("5 um");
  await page.getByLabel("Silicon thickness").fill("725 um");
  await page.getByLabel("Diameter").fill("200 mm");
}

test("a technician brings ten different files at once: good pairs go in, the rest stays with its reason", async ({
  page,
}) => {
  test.slow();
  await signIn(page, "technician");
  await page.goto("/scans");
  await page.getByRole("link", { name: "Import scans" }).click();
  await expectNoAxeFindings(page);
  const [one, two, three] = [ownScans(), ownScans(), ownScans()];
  const odd = "<img src=x onerror=alert(1)>";
  await choose(page, [
    file("M-1_az000_pre.csv", one.before()),
    file("M-1_az000_post.csv", one.after({ delimiter: ";", decimalComma: true })),
    file(
      "M-1_az045_pre.txt",
      two.before({
        delimiter: "\t",
        encoding: "utf-16le with mark",
        footer: ["End of scan"],
        counted: true,
        lines: [],
      }),
    ),
    file(
      "M-1_az045_post.txt",
      two.after({
        delimiter: ";",
        groups: ",",
        heightUnit: "nm",
        heightDecimals: 0,
        positionDecimals: 0,
        lines: ["x (mm);z (nm)"],
      }),
    ),
    file("M-2_pre.csv", three.before({ lines: ["x,z"] })),
    file("M-2_post.csv", three.after({ instead: { 3: { height: "NaN" }, 9: { height: "---" } } })),
    file("M-3_pre.dat", three.before({ power: "D", delimiter: " ", lines: ["Position(mm) Height(µm)"] })),
    file(`${odd}_post.csv`, three.after({ lines: ["x (mm),<b>z</b> (µm)"] })),
    file(
      "lot.csv",
      `Lot;Slot;Bow (µm);Warp (µm)\n${Array.from({ length: 8 }, (_, n) => `L1;${n + 1};${n}.5;9.5`).join("\n")}`,
    ),
    file("scan.csv", Buffer.from([0x50, 0x4b, 3, 4, 0])),
  ]);
  await expect(page.getByRole("heading", { name: "10 files" })).toBeVisible();
  await expect(page.getByText("scan.csv is a zip archive")).toBeVisible();
  await expect(row(page, "lot.csv")).toContainText("is a summary, not a profile");
  await expect(row(page, odd)).toContainText("waits for its scan before the film");
  await expect(row(page, "M-3_pre.dat")).toContainText("waits for its scan after the film");
  await expectNoAxeFindings(page);

  // '82,697 is…' is answered where it is asked.
  await expect(row(page, "M-1_az045_post.txt")).toContainText("has an open question");
  await page.getByRole("button", { name: /thousands grouped by a comma$/ }).click();
  await expect(header(page, "M-1_az045_post")).toBeFocused();
  await expect(header(page, "M-1_az045_post")).toHaveAttribute("aria-expanded", "true");
  await expect(page.getByRole("img", { name: /^Plot of z \(nm\)/ })).toBeVisible();
  // Columns without heads and units, numbered: roles are told by how they run, units are asked.
  const counted = page.getByRole("list", { name: "Open questions of M-1_az045_pre.txt" });
  await counted.getByRole("button", { name: "mm", exact: true }).first().click();
  await counted.getByRole("button", { name: "µm", exact: true }).click();
  await expect(counted).toBeHidden();
  const plain = page.getByRole("list", { name: "Open questions of M-2_pre.csv" });
  await plain.getByRole("button", { name: "mm", exact: true }).first().click();
  await plain.getByRole("button", { name: "µm", exact: true }).click();
  await expect(page.getByRole("heading", { name: "3 pairs to import" })).toBeVisible();

  await header(page, "M-2_post").click();
  await expect(page.getByText("2 × no value")).toBeVisible();
  await expect(page.getByText(/row 5, column 2 “NaN”/)).toBeVisible();
  await expectNoAxeFindings(page);

  // What all pairs share is still missing: every field says so, and no file is lost.
  await page.getByRole("button", { name: "Import 3 pairs" }).click();
  await expect(page.getByRole("alert")).toContainText("fields need a look");
  await fillShared(page);
  await page.getByRole("button", { name: "Import 3 pairs" }).click();
  await expect(page.getByText("3 imported.")).toBeVisible();
  await expect(pairs(page).getByRole("link")).toHaveText(["M-1, 0°", "M-1, 45°", "M-2"]);
  await expect(page.getByRole("heading", { name: "4 files" })).toBeVisible();
  await expectNoAxeFindings(page);

  // The same two files again are known.
  await choose(page, [
    file("M-1_pre.csv", one.before()),
    file("M-1_post.csv", one.after({ delimiter: ";", decimalComma: true })),
  ]);
  await page.getByRole("button", { name: "Import 1 pair" }).click();
  await expect(row(page, "was in already")).toContainText("M-1");

  await pairs(page).getByRole("link", { name: "M-1, 45°" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "M-1, 45°" })).toBeVisible();
  await expect(page.getByText("height in nm", { exact: false })).toBeVisible();
});

test.describe("a profile", () => {
  test.use({ refusals: true });
  test("is kept by an engineer, and reads the next file of that instrument", async ({ page }) => {
    await signIn(page, "engineer");
    await page.goto("/scans/import");
    const scans = ownScans();
    const style = { lines: ["x,z"] };
    await choose(page, [file("M-7_pre.csv", scans.before(style)), file("M-7_post.csv", scans.after(style))]);
    await page.getByRole("combobox", { name: "Unit of x" }).first().selectOption("mm");
    await page.getByRole("combobox", { name: "Unit of z" }).first().selectOption("µm");
    await page.getByRole("button", { name: "Keep", exact: true }).first().click();
    await expect(page.getByText("Name the instrument.")).toBeVisible();
    const instrument = `Profilometer ${Math.random().toString(36).slice(2, 8)}`;
    await page.getByLabel("Keep for this instrument").first().fill(instrument);
    await page.getByRole("button", { name: "Keep", exact: true }).first().click();
    await expect(page.getByText(`Kept as ${instrument}`)).toBeVisible();
    await page.getByLabel("Use profile of an instrument").last().selectOption({ label: instrument });
    await expect(page.getByRole("heading", { name: "1 pair to import" })).toBeVisible();

    // What was chosen for one file goes to all, and a file that contradicts it says where.
    await choose(page, [file("M-8_pre.csv", scans.before({ heightUnit: "nm", lines: ["x,z (nm)"] }))]);
    await page.getByRole("button", { name: "Apply to all files of this batch" }).first().click();
    await expect(page.getByText(/M-8_pre\.csv, row 1: .*in nm, but µm is chosen/)).toBeVisible();
  });
});

test("files that are dropped anywhere on the page are read", async ({ page }) => {
  await signIn(page, "shift lead");
  await page.goto("/scans/import");
  const text = Buffer.from(ownScans().before()).toString();
  await expect(page.getByLabel("Or choose files")).toBeVisible();
  const transfer = await page.evaluateHandle((content) => {
    const data = new DataTransfer();
    data.items.add(new File([content], "M-9_pre.csv"));
    return data;
  }, text);
  await page.dispatchEvent("body", "dragover", { dataTransfer: transfer });
  await expect(page.getByText("Let go to read the files here")).toBeVisible();
  await page.dispatchEvent("body", "drop", { dataTransfer: transfer });
  await expect(page.getByText("Read: 96 rows.")).toBeVisible();
});

test.describe("what is refused", () => {
  test.use({ refusals: true });

  test("a pair that the server refuses stays with its reason; the other goes in", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans/import");
    const [good, small] = [ownScans(), ownScans()];
    const wide = { positionUnit: "inch", lines: ["x (mm),z (µm)"] } as const;
    await choose(page, [
      file("M-11_pre.csv", small.before(wide)),
      file("M-11_post.csv", small.after(wide)),
      file("M-10_pre.csv", good.before()),
      file("M-10_post.csv", good.after()),
    ]);
    await fillShared(page);
    await page.getByRole("button", { name: "Import 2 pairs" }).click();
    await expect(page.getByText("1 imported. 1 refused")).toBeVisible();
    await expect(row(page, "Refused:")).toContainText("M-11");
    await expect(pairs(page).getByRole("link", { name: "M-10" })).toBeVisible();
    await expect(page.getByRole("heading", { name: "2 files" })).toBeVisible();
  });

  test("a post of another hand is answered in a sentence, never trusted", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans/import");
    const scans = ownScans();
    const sent = (profile: string, program = "00000000-0000-4000-8000-000000000000") =>
      page.request.post("/scans/import/pair", {
        multipart: {
          program,
          label: "M-12",
          orientation: "100",
          filmThickness: "5 um",
          siliconThickness: "725 um",
          diameter: "200 mm",
          edgeExclusion: "5 mm",
          profileBefore: profile,
          profileAfter: "{}",
          before: file("a.csv", scans.before()),
          after: file("b.csv", scans.after()),
        },
      });
    for (const profile of ["{", "[]", '{"headerRow":-1}', '{"__proto__":{"delimiter":1},"x":2}'])
      expect(await (await sent(profile)).json()).toMatchObject({ outcome: "refused" });
    expect((await sent("{}")).status()).toBe(404);
  });

  test("who may not upload scans is told so, and who has no scripts is led to the form", async ({ page, browser }) => {
    await signIn(page, "guest");
    expect((await page.goto("/scans/import"))?.status()).toBe(403);
    const context = await browser.newContext({ javaScriptEnabled: false });
    const still = await context.newPage();
    await signIn(still, "technician");
    await still.goto("/scans/import");
    await still.getByRole("link", { name: "upload one pair" }).click();
    await expect(still.getByLabel("File before the film")).toBeVisible();
    await context.close();
  });
});
