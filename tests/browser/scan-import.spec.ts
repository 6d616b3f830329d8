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
const list = (page: Page) => page.getByRole("list", { name: "Files of the import" });
const row = (page: Page, text: string | RegExp) => list(page).getByRole("listitem").filter({ hasText: text });
/** A name that no other test has. */
const ownName = (letter: string) => `${letter}-${Math.random().toString(10).slice(2, 9)}`;

const summaryOf = (lot: string) =>
  `Lot;Slot;Bow (µm);Warp (µm)\n${Array.from({ length: 8 }, (_, n) => `${lot};${n + 1};${n}.5;9.5`).join("\n")}`;

/** Fills in what all files of a batch share. */
async function fillShared(page: Page): Promise<void> {
  await page.getByLabel("Program", { exact: true }).selectOption({ label: "Tern" });
  await page.getByLabel("Film thickness").fill("5 um");
  await page.getByLabel("Silicon thickness").fill("725 um");
  await page.getByLabel("Diameter").fill("200 mm");
}

test("a technician brings ten different files at once: good ones go in, also alone, the rest stays with its reason", async ({
  page,
}) => {
  // Ten files with their questions, on a machine that others use too.
  test.setTimeout(150_000);
  await signIn(page, "technician");
  await page.goto("/scans");
  await page.getByRole("link", { name: "Import scans" }).click();
  await expectNoAxeFindings(page);
  const [one, two, three] = [ownScans(), ownScans(), ownScans()];
  const [w1, w2, w3, lot] = [ownName("M"), ownName("M"), ownName("M"), ownName("L")];
  const odd = "<img src=x onerror=alert(1)>";
  await choose(page, [
    file(`${w1}_az000_pre.csv`, one.before()),
    file(`${w1}_az000_post.csv`, one.after({ delimiter: ";", decimalComma: true })),
    file(
      `${w1}_az045_pre.txt`,
      two.before({
        delimiter: "\t",
        encoding: "utf-16le with mark",
        footer: ["End of scan"],
        counted: true,
        lines: [],
      }),
    ),
    file(
      `${w1}_az045_post.txt`,
      two.after({
        delimiter: ";",
        groups: ",",
        heightUnit: "nm",
        heightDecimals: 0,
        positionDecimals: 0,
        lines: ["x (mm);z (nm)"],
      }),
    ),
    file(`${w2}_pre.csv`, three.before({ lines: ["x,z"] })),
    file(`${w2}_post.csv`, three.after({ instead: { 3: { height: "NaN" }, 9: { height: "---" } } })),
    file(`${w3}_pre.dat`, three.before({ power: "D", delimiter: " ", lines: ["Position(mm) Height(µm)"] })),
    file(`${odd}_post.csv`, three.after({ lines: ["x (mm),<b>z</b> (µm)"] })),
    file("lot.csv", summaryOf(lot)),
    file("scan.csv", Buffer.from([0x50, 0x4b, 3, 4, 0])),
  ]);
  await expect(page.getByRole("heading", { name: "10 files" })).toBeVisible();
  await expect(page.getByText("scan.csv is a zip archive")).toBeVisible();
  await expect(row(page, "lot.csv")).toContainText("a summary");
  await expect(row(page, odd)).toContainText("its partner is not in this batch");
  await expect(row(page, `${w3}_pre.dat`)).toContainText("its partner is not in this batch");
  await expectNoAxeFindings(page);

  // '82,697 is…' is answered where it is asked.
  await expect(row(page, `${w1}_az045_post.txt`)).toContainText("has an open question");
  await page.getByRole("button", { name: /thousands grouped by a comma$/ }).click();
  await expect(header(page, `${w1}_az045_post`)).toBeFocused();
  await expect(header(page, `${w1}_az045_post`)).toHaveAttribute("aria-expanded", "true");
  await expect(page.getByRole("img", { name: /^Plot of z \(nm\)/ })).toBeVisible();
  // Columns without heads and units, numbered: roles are told by how they run, units are asked.
  const counted = page.getByRole("list", { name: `Open questions of ${w1}_az045_pre.txt` });
  await counted.getByRole("button", { name: "mm", exact: true }).first().click();
  await counted.getByRole("button", { name: "µm", exact: true }).click();
  await expect(counted).toBeHidden();
  const plain = page.getByRole("list", { name: `Open questions of ${w2}_pre.csv` });
  await plain.getByRole("button", { name: "mm", exact: true }).first().click();
  await plain.getByRole("button", { name: "µm", exact: true }).click();
  await expect(page.getByRole("heading", { name: "9 files to import" })).toBeVisible();

  await header(page, `${w2}_post`).click();
  await expect(page.getByText("2 × no value")).toBeVisible();
  await expect(page.getByText(/row 5, column 2 “NaN”/)).toBeVisible();
  await expectNoAxeFindings(page);

  // What all files share is still missing: every field says so, and no file is lost.
  await page.getByRole("button", { name: "Import 9 files" }).click();
  await expect(page.getByRole("alert")).toContainText("fields need a look");
  await fillShared(page);
  await page.getByRole("button", { name: "Import 9 files" }).click();
  await expect(page.getByText("9 imported.")).toBeVisible({ timeout: 20_000 });
  await expect(row(page, "is a scan:")).toHaveCount(3);
  await expect(row(page, "waits for its partner")).toHaveCount(2);
  await expect(row(page, "lot.csv")).toContainText(`a summary of eight wafers, lot ${lot}`);
  await expect(page.getByRole("heading", { name: "1 file", exact: true })).toBeVisible();
});

test("what is in is known the next time, is undone where it stands, and is there after a reload", async ({ page }) => {
  test.slow();
  await signIn(page, "technician");
  await page.goto("/scans/import");
  const scans = ownScans();
  const [wafer, lot] = [ownName("M"), ownName("L")];
  const pair = [file(`${wafer}_az045_pre.csv`, scans.before()), file(`${wafer}_az045_post.csv`, scans.after())];
  await choose(page, [...pair, file("lot.csv", summaryOf(lot))]);
  await fillShared(page);
  await page.getByRole("button", { name: "Import 3 files" }).click();
  await expect(page.getByText("3 imported.")).toBeVisible();
  await expect(row(page, "is a scan:")).toContainText(`${wafer}, 45°`);
  await expect(row(page, "lot.csv")).toContainText(`a summary of eight wafers, lot ${lot}`);

  await choose(page, pair);
  await page.getByRole("button", { name: "Import 2 files" }).click();
  await expect(row(page, "was imported on")).toHaveCount(2);
  await list(page).getByRole("link", { name: "lot.csv" }).click();
  await expect(page.getByRole("heading", { level: 1, name: `Lot ${lot}` })).toBeVisible();
  await expect(page.getByRole("row")).toHaveCount(9);
  await expectNoAxeFindings(page);

  await page.goto("/scans/import");
  const other = ownScans();
  await choose(page, [file(`${wafer}b_pre.csv`, other.before()), file(`${wafer}b_post.csv`, other.after())]);
  await fillShared(page);
  await page.getByRole("button", { name: "Import 2 files" }).click();
  await expect(page.getByText("2 imported.")).toBeVisible();
  await page.getByRole("button", { name: `Undo the import: ${wafer}b, 0°` }).click();
  await expect(row(page, `${wafer}b`)).toContainText("The import is undone. The two files themselves are kept.");
});

test.describe("a profile", () => {
  test.use({ refusals: true });
  test("is kept by an engineer, and reads the next file of that instrument", async ({ page }) => {
    test.slow();
    await signIn(page, "engineer");
    await page.goto("/scans/import");
    const scans = ownScans();
    const style = { lines: ["x,z"] };
    const wafer = ownName("M");
    await choose(page, [file(`${wafer}_pre.csv`, scans.before(style)), file(`${wafer}_post.csv`, scans.after(style))]);
    await page.getByRole("combobox", { name: "Unit of x" }).first().selectOption("mm");
    await page.getByRole("combobox", { name: "Unit of z" }).first().selectOption("µm");
    await page.getByRole("button", { name: "Keep", exact: true }).first().click();
    await expect(page.getByText("Name the instrument.")).toBeVisible();
    const instrument = `Profilometer ${Math.random().toString(36).slice(2, 8)}`;
    await page.getByLabel("Keep for this instrument").first().fill(instrument);
    await page.getByRole("button", { name: "Keep", exact: true }).first().click();
    await expect(page.getByText(`Kept as ${instrument}`)).toBeVisible();
    await page.getByLabel("Use profile of an instrument").last().selectOption({ label: instrument });
    await page.getByLabel("Use profile of an instrument").first().selectOption({ label: instrument });
    await expect(page.getByRole("heading", { name: "2 files to import" })).toBeVisible();
    await fillShared(page);
    await page.getByRole("button", { name: "Import 2 files" }).click();
    await expect(page.getByText("2 imported.")).toBeVisible();
    await list(page).getByRole("link", { name: wafer }).click();
    await expect(page.getByText(instrument)).toBeVisible();
    await page.goBack();
    await expect(page.getByLabel("Or choose files")).toBeVisible();

    // What was chosen for one file goes to all, and a file that contradicts it says where.
    await choose(page, [
      file("M-7_pre.csv", scans.before(style)),
      file("M-8_pre.csv", scans.before({ heightUnit: "nm", lines: ["x,z (nm)"] })),
    ]);
    await page.getByRole("combobox", { name: "Unit of x" }).first().selectOption("mm");
    await page.getByRole("combobox", { name: "Unit of z" }).first().selectOption("µm");
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

  test("a file that the server refuses stays with its reason; the others go in", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans/import");
    const [good, small] = [ownScans(), ownScans()];
    const [w10, w11] = [ownName("M"), ownName("M")];
    const wide = { positionUnit: "inch", lines: ["x (mm),z (µm)"] } as const;
    await choose(page, [
      file(`${w11}_pre.csv`, small.before(wide)),
      file(`${w11}_post.csv`, small.after(wide)),
      file(`${w10}_pre.csv`, good.before()),
      file(`${w10}_post.csv`, good.after()),
    ]);
    await fillShared(page);
    await page.getByRole("button", { name: "Import 4 files" }).click();
    await expect(page.getByText("2 imported. 2 refused")).toBeVisible();
    await expect(row(page, "Refused:")).toContainText(w11);
    await expect(list(page).getByRole("link", { name: w10 })).toBeVisible();
    await expect(page.getByRole("heading", { name: "2 files", exact: true })).toBeVisible();
  });

  test("a post of another hand is answered in a sentence, never trusted", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans/import");
    const scans = ownScans();
    const sent = (profile: string, program = "00000000-0000-4000-8000-000000000000") =>
      page.request.post("/scans/import/file", {
        multipart: {
          program,
          wafer: "M-12",
          side: "before",
          lines: "[[0,0]]",
          orientation: "100",
          filmThickness: "5 um",
          siliconThickness: "725 um",
          diameter: "200 mm",
          edgeExclusion: "5 mm",
          profile,
          file: file("a.csv", scans.before()),
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
