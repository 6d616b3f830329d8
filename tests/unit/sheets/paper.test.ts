import jsQR from "jsqr";
import { getDocument } from "pdfjs-dist/legacy/build/pdf.mjs";
import { describe, expect, it } from "vitest";
import { FILING_MARGIN, MARGIN, PAPERS, type Paper } from "#app/lib/paper-size.ts";
import type { SheetFacts } from "#app/lib/sheet/sheet-facts.ts";
import { sheetPlan } from "#app/lib/sheet/sheet-plan.ts";
import { sheetHtml } from "#app/services/sheets/sheet-html.server.ts";
import { sheetPdf } from "#app/services/sheets/sheet-pdf.server.ts";
import { DRAFT_FACTS } from "#app/lib/sheet/sheet-facts.ts";
import { demoSheet, releasedFacts } from "#tests/fixtures/sheet-documents.ts";

const POINT = 25.4 / 72;
const FLOWS = ["Tern", "Petrel", "Fulmar A"] as const;
const PAPER_NAMES = ["a4", "letter"] as const;

/** A word of a PDF with its place, mm from the upper left corner. */
interface Placed {
  text: string;
  left: number;
  right: number;
  top: number;
}

async function read(bytes: Uint8Array) {
  // The reader takes what it is given for its own.
  const pdf = await getDocument({ data: bytes.slice(), useSystemFonts: false, verbosity: 0 }).promise;
  const pages = await Promise.all(
    Array.from({ length: pdf.numPages }, async (_, index) => {
      const page = await pdf.getPage(index + 1);
      const { items } = await page.getTextContent();
      const [, , width = 0, height = 0] = page.view;
      const placed = items.flatMap((item): Placed[] => {
        if (!("str" in item) || item.str.trim() === "") return [];
        const [, , , , x = 0, y = 0] = item.transform as number[];
        return [{ text: item.str, left: x * POINT, right: (x + item.width) * POINT, top: (height - y) * POINT }];
      });
      return {
        width: width * POINT,
        height: height * POINT,
        placed,
        text: items.map((item) => ("str" in item ? item.str : "")).join(" "),
      };
    }),
  );
  const { info, metadata } = await pdf.getMetadata();
  return { pages, info: info as Record<string, unknown>, metadata };
}

/** The letters of a text and nothing else: spaces fall elsewhere where a line breaks. The sign of micro is a Greek mu to a PDF. */
const letters = (text: string) => text.normalize("NFKC").replace(/\s+/g, "");

/** How often each letter stands in a text, so that two are compared in whatever order their parts are read. */
function counted(text: string): Record<string, number> {
  const counts: Record<string, number> = {};
  for (const letter of letters(text)) counts[letter] = (counts[letter] ?? 0) + 1;
  return counts;
}

/** What a reader sees of the file, page by page; the words across a page are drawn, not written. */
function htmlPages(html: string): string[] {
  const body = html.slice(html.indexOf("<body>"));
  return body
    .replace(/<svg class="sheet-mark.*?<\/svg>/gs, "")
    .split("<section ")
    .slice(1)
    .map((page) =>
      page
        .slice(page.indexOf(">") + 1)
        .replace(/<[^>]+>/g, " ")
        .replace(/&#x27;/g, "'")
        .replace(/&quot;/g, '"')
        .replace(/&lt;/g, "<")
        .replace(/&gt;/g, ">")
        .replace(/&amp;/g, "&"),
    );
}

const CASES = FLOWS.flatMap((flow) =>
  PAPER_NAMES.flatMap((paper) =>
    [DRAFT_FACTS, releasedFacts()].map((facts): [string, Paper, SheetFacts] => [flow, paper, facts]),
  ),
);

// The first file of a process waits for the renderer to load.
describe("a sheet as a file", { timeout: 30_000 }, () => {
  it.each(CASES)(
    "%s on %s says the same as HTML and as PDF, on the same pages, within its frame",
    async (flow, paper, facts) => {
      const document = demoSheet(flow, facts);
      const { pages } = await read(await sheetPdf(document, paper));
      const html = htmlPages(await sheetHtml(document, paper));
      expect(pages).toHaveLength(sheetPlan(document, paper).length);
      expect(html).toHaveLength(pages.length);
      for (const [index, page] of pages.entries()) {
        expect(counted(page.text)).toEqual(counted(html[index] ?? ""));
        const { width, height } = PAPERS[paper];
        expect(page.width).toBeCloseTo(width, 1);
        expect(page.height).toBeCloseTo(height, 1);
        for (const { text, left, right, top } of page.placed) {
          expect(left, text).toBeGreaterThanOrEqual(FILING_MARGIN);
          expect(right, text).toBeLessThanOrEqual(width - MARGIN);
          expect(top, text).toBeGreaterThan(MARGIN);
          expect(top, text).toBeLessThan(height - MARGIN);
        }
      }
    },
  );

  it.each(CASES)("%s on %s puts nothing over its title block and leaves no text out", async (flow, paper, facts) => {
    const document = demoSheet(flow, facts);
    const { pages } = await read(await sheetPdf(document, paper));
    for (const page of pages) {
      const owner = page.placed.find(({ text }) => text.startsWith("Legal owner"));
      if (!owner) throw new Error("every page has its title block");
      const body = page.placed.filter(({ top }) => top < owner.top - 3.5);
      const strip = page.placed.filter(({ top }) => top >= owner.top - 3.5);
      // What stands in the strip is the block, the code's words and the page: no line of the body has run into it.
      expect(strip.length).toBeLessThan(40);
      expect(body.length).toBeGreaterThan(5);
      expect(page.text).not.toContain("…");
    }
  });

  it("embeds every font that it uses, as a subset, and knows what it is", async () => {
    const document = demoSheet("Fulmar A", releasedFacts());
    const bytes = await sheetPdf(document, "a4");
    const { info } = await read(bytes);
    expect(info).toMatchObject({
      Title: "Handling-risk sheet TERN-H003 B",
      Author: "Kestrel Ridge Packaging, pilot line",
      Language: "en",
    });
    expect(String(info.CreationDate)).toMatch(/^D:20261201075500/);
    const raw = Buffer.from(bytes).toString("latin1");
    const used = raw.match(/\/Type \/FontDescriptor/g)?.length ?? 0;
    expect(used).toBeGreaterThanOrEqual(2);
    expect(raw.match(/\/FontFile[23]? \d+ 0 R/g)).toHaveLength(used);
    expect(raw).toMatch(/\/FontName \/[A-Z]{6}\+NotoSans/);
    expect(raw).not.toMatch(/\/BaseFont \/Helvetica/);
    expect(raw).not.toContain("/Subtype /Image");
  });

  it("asks for nothing from outside and runs nothing", async () => {
    const html = await sheetHtml(demoSheet("Petrel", releasedFacts()), "a4");
    expect(html).not.toMatch(/<script|<link|<img|<iframe|@import|javascript:/i);
    for (const [, address] of html.matchAll(/url\(([^)]{0,40})/g)) expect(address).toMatch(/^data:font\/woff2;base64,/);
    expect(html).not.toMatch(/ (?:src|href)="/);
  });

  it("is the same file again when it is drawn again", async () => {
    const document = demoSheet("Tern", releasedFacts());
    expect(Buffer.compare(await sheetPdf(document, "a4"), await sheetPdf(document, "a4"))).toBe(0);
    expect(await sheetHtml(document, "a4")).toBe(await sheetHtml(document, "a4"));
  });

  it("gives a guest the pages for hands and nothing of the others", async () => {
    const document = demoSheet("Petrel", releasedFacts());
    const { pages } = await read(await sheetPdf(document, "a4", { pages: "hands" }));
    const html = await sheetHtml(document, "a4", { pages: "hands" });
    const hands = sheetPlan(document, "a4").filter(({ kind }) => kind === "hands").length;
    expect(pages).toHaveLength(hands);
    expect(htmlPages(html)).toHaveLength(hands);
    const title = document.engineers?.steps[2]?.title ?? "";
    expect(title).toContain("polymer dielectric");
    expect(html).not.toContain(title);
    expect(letters(pages.map(({ text }) => text).join(""))).not.toContain(letters(title));
    expect(html).not.toContain("Grind to 100");
  });

  it("names on every page what it is when it is not in force", async () => {
    const superseded = demoSheet("Tern", releasedFacts({ status: "superseded", supersededBy: "C" }));
    const withdrawn = demoSheet("Tern", releasedFacts({ status: "withdrawn" }));
    for (const [document, mark, status] of [
      [superseded, "superseded by C", "Superseded by C"],
      [withdrawn, "withdrawn", "Withdrawn"],
      [demoSheet("Tern"), "Draft, not for the floor", "Draft"],
    ] as const) {
      const html = await sheetHtml(document, "letter");
      const pages = htmlPages(html);
      expect(html.match(/<svg class="sheet-mark/g)).toHaveLength(pages.length);
      expect(html.split(`>${mark}</text>`)).toHaveLength(pages.length + 1);
      const pdf = await read(await sheetPdf(document, "letter"));
      for (const page of pdf.pages) expect(page.text).toContain(status);
      const unmarked = await sheetPdf({ ...document, mark: null }, "letter");
      expect((await sheetPdf(document, "letter")).length).toBeGreaterThan(unmarked.length);
    }
  });
});

describe("the code on paper", () => {
  it("leads to the revision's status", () => {
    const { status } = demoSheet("Tern", releasedFacts());
    if (!status) throw new Error("a released sheet has a code");
    const scale = 4;
    const side = (status.code.size + 8) * scale;
    const pixels = new Uint8ClampedArray(side * side * 4).fill(255);
    for (const [, x, y, width] of status.code.path.matchAll(/M(\d+) (\d+)h(\d+)v1h-\d+z/g))
      for (let down = 0; down < scale; down += 1)
        for (let along = 0; along < Number(width) * scale; along += 1) {
          const at = (((Number(y) + 4) * scale + down) * side + (Number(x) + 4) * scale + along) * 4;
          pixels.fill(0, at, at + 3);
        }
    expect(jsQR(pixels, side, side)?.data).toBe("https://planeward.kestrel-ridge.example/s/TERN-H003/B");
  });

  it("is not on a draft, which has no status to look up", () => {
    expect(demoSheet("Tern").status).toBeNull();
  });
});
