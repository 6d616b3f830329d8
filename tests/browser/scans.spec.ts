import { readFileSync, truncateSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { below, fileAfter, fileBefore, fillForm, ownLabel, readAndKeep } from "./scan-form.ts";
import { expect, expectNoAxeFindings, signIn, signInAtToday, test } from "./support.ts";

const fixture = (name: string) => fileURLToPath(new URL(`../../fixtures/scans/${name}`, import.meta.url));
const BEFORE = fixture("monitor-200mm-725um-before-film-seed-7.csv");
const AFTER = fixture("monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv");

const csv = (name: string, content: string | Buffer) => ({
  name,
  mimeType: "text/csv",
  buffer: Buffer.from(content),
});

test.describe("a technician", () => {
  test.beforeEach(({ page }) => signIn(page, "technician"));

  test("uploads two scans and gets the film's stress, its curves and the raw files back", async ({ page }) => {
    const label = ownLabel();
    await page.goto("/scans");
    await page.getByRole("link", { name: "Upload one pair" }).click();
    await fillForm(page, label);
    await fileBefore(page).setInputFiles(BEFORE);
    await fileAfter(page).setInputFiles(AFTER);
    await readAndKeep(page);

    await expect(page.getByRole("heading", { level: 1, name: label })).toBeVisible();
    const answer = page.getByRole("region", { name: "Answer" });
    await expect(answer).toContainText(/Polymer dielectric A: 31\.\d+.±.0\.\d+.MPa, tension\./);
    await expect(answer).toContainText(/The library uses 30\.0.±.3\.0.MPa: the two agree\./);
    await expect(answer).toContainText(/−49\.\d+.±.0\.\d+.µm/);
    await expect(answer).toContainText("centre low, device side up");
    await expect(page.getByRole("img", { name: `Profile of ${label} before and after the film` })).toBeVisible();
    await expect(page.getByText("381 of 381 rows read").first()).toBeVisible();
    await expectNoAxeFindings(page);

    for (const [name, path] of [
      ["monitor-200mm-725um-before-film-seed-7.csv", BEFORE],
      ["monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv", AFTER],
    ] as const) {
      const href = await page.getByRole("link", { name }).getAttribute("href");
      const response = await page.request.get(href ?? "");
      expect(response.headers()["content-disposition"]).toContain(`attachment; filename="${name}"`);
      expect(response.headers()["x-content-type-options"]).toBe("nosniff");
      expect((await response.body()).equals(readFileSync(path))).toBe(true);
    }

    await page.goto(`/scans?q=${label}&program=tern&sort=-stress`);
    const row = page.getByRole("row").filter({ has: page.getByRole("link", { name: label }) });
    await expect(row).toContainText("Polymer dielectric A");
    await expect(row).toContainText(/\+31\.\d+/);
    await expect(row).toContainText("Jude Okafor");
    await expectNoAxeFindings(page);
  });

  test("sorts and filters through the address, and is told when nothing fits", async ({ page }) => {
    await page.goto("/scans?q=no such wafer");
    await expect(page.getByRole("heading", { name: "No scan fits" })).toBeVisible();
    await page.goto("/scans?q=%00&sort=nonsense&page=99&program=no-such-program");
    await expect(page.getByRole("heading", { level: 1, name: "Scans" })).toBeVisible();
  });

  test("files as an instrument writes them: numbered rows, height before position, UTF-16, remarks around them", async ({
    page,
  }) => {
    const asWritten = (path: string) => {
      const [, ...rows] = readFileSync(path, "utf8").trimEnd().split("\n");
      const body = rows.map((row, n) => [n + 1, ...row.split(",").reverse()].join("\t"));
      const text = ["Recipe 12", "", "No\tHeight\tPosition", "\tµm\tmm", ...body, "End of scan", ""].join("\r\n");
      return Buffer.from(`\uFEFF${text}`, "utf16le");
    };
    await fillForm(page, ownLabel());
    await fileBefore(page).setInputFiles(csv("before.txt", asWritten(BEFORE)));
    await fileAfter(page).setInputFiles(csv("after.txt", asWritten(AFTER)));
    await readAndKeep(page);
    await expect(page.getByRole("region", { name: "Answer" })).toContainText(/31\.\d+.±/);
    await expect(page.getByText("381 of 381 rows read").first()).toBeVisible();
    await expect(page.getByText("column 3 was read as the position and column 2 as the height").first()).toBeVisible();
  });

  test("working and method stand one link away", async ({ page }) => {
    const label = ownLabel();
    await fillForm(page, label);
    await fileBefore(page).setInputFiles(BEFORE);
    await fileAfter(page).setInputFiles(AFTER);
    await readAndKeep(page);
    await page.getByRole("link", { name: "Where this relation holds" }).click();
    await expect(page).toHaveURL(/\/method#equation-stoney-stress$/);
    await expect(
      page.getByRole("heading", { name: "Stress of a thin film from a change of curvature" }),
    ).toBeInViewport();
  });
});

test.describe("what is refused", () => {
  test.use({ refusals: true });
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("an empty form names every field, and nothing is stored", async ({ page }) => {
    await page.goto("/scans/new");
    await page.getByLabel("Rim left out").fill("");
    await readAndKeep(page);
    await expect(page.getByRole("alert")).toContainText("fields need a look");
    for (const [label, says] of [
      ["Wafer", "Name the wafer"],
      ["Program", "Choose the program"],
      ["Film thickness", "Type the film thickness. Blank is missing, not zero."],
      ["Diameter", "Type the diameter"],
      ["Decimal mark in the files", "Choose the decimal mark"],
      ["File before the film", "Choose the file before the film"],
      ["Rim left out", "Type the rim left out"],
    ] as const)
      await expect(await below(page, label === "Wafer" ? "Wafer" : label)).toContainText(says);
    await expectNoAxeFindings(page);
  });

  test("quantities that are none, beside their fields, with what was typed kept", async ({ page }) => {
    await fillForm(page, ownLabel());
    await page.getByLabel("Film thickness").fill("12 parsecs");
    await page.getByLabel("Silicon thickness").fill("-5 um");
    await fileBefore(page).setInputFiles(BEFORE);
    await fileAfter(page).setInputFiles(AFTER);
    await readAndKeep(page);
    await expect(await below(page, "Film thickness")).toContainText("parsecs is not a unit of length");
    await expect(await below(page, "Silicon thickness")).toContainText("−5 µm is outside 1 µm to 2 mm");
    await expect(page.getByLabel("Film thickness")).toHaveValue("12 parsecs");
    await page.getByLabel("Film thickness").fill("5 um");
    await page.getByLabel("Silicon thickness").fill("725 um");
    await readAndKeep(page);
    await expect(page.getByRole("region", { name: "Answer" })).toBeVisible();
  });

  const half = readFileSync(AFTER, "utf8");
  for (const [what, file, says] of [
    ["a zip", csv("scan.zip", Buffer.from([0x50, 0x4b, 3, 4, 0])), "scan.zip is a zip archive"],
    ["a PDF", csv("scan.pdf", "%PDF-1.7"), "scan.pdf is a PDF"],
    ["an empty file", csv("empty.csv", ""), "empty.csv is empty"],
    ["words", csv("mail.txt", "Dear all,\nno scans today.\n"), "mail.txt has no row of numbers"],
    ["three rows", csv("short.csv", "1,2\n3,4\n5,6\n"), "short.csv has 3 usable rows"],
    ["one column", csv("one.csv", "1.5\n2.5\n3.5\n4.5\n5.5\n6.5\n7.5\n8.5\n"), "one.csv has one column only"],
    ["decimal commas", csv("comma.csv", half.replaceAll(",", ";").replaceAll(".", ",")), "only with a decimal comma"],
    ["another unit", csv("nano.csv", half.replace("z_um", "z (nm)")), "headed “z (nm)”, in nm, but µm is chosen"],
    ["no overlap", csv("far.csv", half.replace(/^-?(\d)/gm, "9$1")), "far.csv"],
  ] as const)
    test(`${what}: a sentence at the file, and nothing stored`, async ({ page }) => {
      const label = ownLabel();
      await fillForm(page, label);
      await fileBefore(page).setInputFiles(BEFORE);
      await fileAfter(page).setInputFiles(file);
      await readAndKeep(page);
      await expect(await below(page, "File after the film")).toContainText(says);
      await expect(page.getByText("Choose the two files again")).toBeVisible();
      await expect(page.getByLabel("Wafer", { exact: true })).toHaveValue(label);
      await page.goto(`/scans?q=${label}`);
      await expect(page.getByRole("heading", { name: "No scan fits" })).toBeVisible();
    });

  test("a file that is too large is turned down as soon as it is chosen", async ({ page }, testInfo) => {
    const large = testInfo.outputPath("large.csv");
    writeFileSync(large, "1.5,2.5\n");
    truncateSync(large, 49 * 1024 * 1024);
    await fillForm(page, ownLabel());
    await fileBefore(page).setInputFiles(large);
    await expect(await below(page, "File before the film")).toContainText(
      /large\.csv has 49\.0.MB; a file may have up to 48.MB/,
    );
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("the upload works, refuses at the field and keeps what was typed", async ({ page }) => {
    // 49 MB go through the browser.
    test.slow();
    await signIn(page, "technician");
    const label = ownLabel();
    await fillForm(page, label);
    await fileBefore(page).setInputFiles(csv("large.csv", Buffer.alloc(49 * 1024 * 1024, "1.5,2.5\n")));
    await fileAfter(page).setInputFiles(AFTER);
    await readAndKeep(page);
    await expect(await below(page, "File before the film")).toContainText(/large\.csv has 49\.0.MB/);
    await expect(page.getByText("Choose the two files again")).toBeVisible();
    await expect(page.getByLabel("Film thickness")).toHaveValue("5 um");
    await fileBefore(page).setInputFiles(BEFORE);
    await fileAfter(page).setInputFiles(AFTER);
    await readAndKeep(page);
    await expect(page.getByRole("heading", { level: 1, name: label })).toBeVisible();
    await expect(page.getByRole("region", { name: "Answer" })).toContainText(/31\.\d+.±/);
  });
});

test.describe("who may not", () => {
  test.use({ refusals: true });

  test("a guest sees neither list nor form, nor a scan of their own program", async ({ page, browser }) => {
    const technician = await browser.newPage();
    await signIn(technician, "technician");
    await fillForm(technician, ownLabel());
    await fileBefore(technician).setInputFiles(BEFORE);
    await fileAfter(technician).setInputFiles(AFTER);
    await readAndKeep(technician);
    await expect(technician.getByRole("region", { name: "Answer" })).toBeVisible();
    const scan = new URL(technician.url()).pathname;
    const file = await technician.getByRole("link", { name: /before-film/ }).getAttribute("href");
    await technician.close();

    await signInAtToday(page, "guest");
    await expect(page.getByRole("link", { name: "Scans" })).toHaveCount(0);
    for (const [path, status] of [
      ["/scans", 403],
      ["/scans/new", 403],
      [scan, 404],
      [file ?? "", 404],
      ["/scans/not-an-id", 404],
    ] as const)
      expect((await page.request.get(path)).status(), path).toBe(status);
    const origin = new URL(page.url()).origin;
    const posted = await page.request.post("/scans/new", { headers: { origin }, multipart: { label: "x" } });
    expect(posted.status()).toBe(403);
  });

  test("a body that is no form of ours is refused, not failed", async ({ page }) => {
    await signInAtToday(page, "engineer");
    const headers = { origin: new URL(page.url()).origin };
    for (const options of [
      { headers: { ...headers, "content-type": "application/json" }, data: "{}" },
      { headers: { ...headers, "content-type": "multipart/form-data; boundary=x" }, data: "nothing" },
      { headers, form: { label: "x", __intent__: "{" } },
    ])
      expect((await page.request.post("/scans/new", options)).status()).toBe(400);
  });
});
