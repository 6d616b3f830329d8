import { describe, expect, it } from "vitest";
import { AnswerLine } from "#app/components/drawings/AnswerLine.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { SupportTag } from "#app/components/drawings/SupportTag.tsx";
import { textWidth } from "#app/components/drawings/text-width.ts";
import { TitleBlock } from "#app/components/drawings/TitleBlock.tsx";
import { wrapText } from "#app/components/drawings/wrap-text.ts";
import { OUTCOMES, SOURCE_KINDS, SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import { render, words } from "./render.ts";

describe("signs and their words", () => {
  it("stand beside each other for every outcome", () => {
    const text = OUTCOMES.map((outcome) => words(render(<FindingTag outcome={outcome} />)));
    expect(text).toEqual(["Clear", "Caution", "Needs support", "Cannot judge", "Do not run"]);
    expect(words(render(<FindingTag outcome="do not run">first at step 9</FindingTag>))).toBe(
      "Do not run first at step 9",
    );
  });

  it("stand beside each other for every support class", () => {
    const text = SUPPORT_CLASSES.map((support) => words(render(<SupportTag support={support} />)));
    expect(text).toEqual(["Bare", "Thin-wafer gripper", "Tape or ring", "Carrier", "None fits"]);
  });

  it("say where a value comes from, and 'assumed' even where the others are only marked", () => {
    expect(SOURCE_KINDS.map((kind) => words(render(<SourceMark kind={kind} />)))).toEqual([...SOURCE_KINDS]);
    expect(words(render(<SourceMark kind="assumed" markOnly />))).toBe("assumed");
    expect(render(<SourceMark kind="supplier" markOnly />)).toContain('role="img" aria-label="supplier"');
  });
});

describe("title block", () => {
  const fields = {
    owner: "Kestrel Ridge Packaging",
    documentType: "Assessment",
    title: "Petrel P-3, thin sensor to 50 µm",
    prepared: "I. Varga",
    checked: "not yet",
    released: "not yet",
    number: "PL-0214",
    revision: "C",
    status: "Draft",
    date: "2026-11-30",
    language: "en",
    page: "1 of 1",
  };

  it("has the fields of ISO 7200, the language on screen only", () => {
    const screen = words(render(<TitleBlock fields={fields} />));
    for (const [label, value] of [
      ["Legal owner", fields.owner],
      ["Document type", fields.documentType],
      ["Title", fields.title],
      ["Released by", fields.released],
      ["Number", fields.number],
      ["Revision", fields.revision],
      ["Status", fields.status],
      ["Date of issue", fields.date],
      ["Language", fields.language],
      ["Page", fields.page],
    ]) {
      expect(screen).toContain(`${label} ${value}`);
    }
    expect(words(render(<TitleBlock fields={fields} variant="paper" />))).not.toContain("Language");
  });
});

describe("answer line", () => {
  it("sets the sentences as the heading, each a line of its own, then the figures", () => {
    const markup = render(
      <AnswerLine
        outcome="caution"
        where="first at step 12"
        sentences={["Clear as planned: carrier from step 12 to step 17.", "Tightest: step 15, edges up 343 ± 120 µm."]}
        figures={[{ label: "Pair at step 15", value: "343 ± 120 µm", working: <a href="#w">Working</a> }]}
      />,
    );
    expect(markup.match(/<h1[^>]*>(<span class="block">[^<]*<\/span>){2}<\/h1>/)).not.toBeNull();
    expect(words(markup)).toMatch(/^Caution first at step 12 Clear as planned/);
    expect(markup).toContain("343\u00a0±\u00a0120\ufeff\u00a0µm");
    expect(markup).toContain('<a href="#w">Working</a>');
  });
});

describe("no-break spaces", () => {
  it("tie value to unit and both sides of ±", () => {
    expect(noBreak("343 ± 120 nm at 25 K")).toBe("343\u00a0±\u00a0120\u00a0nm at 25\u00a0K");
    expect(noBreak("54 N/m, 86 % of 3.0 ppm/K")).toBe("54\u00a0N/m, 86\u00a0% of 3.0\u00a0ppm/K");
  });

  it("leave a mark where an ordinary one was written before a unit that a reader may have in another", () => {
    expect(noBreak("343 ± 120 µm at 25 °C")).toBe("343\u00a0±\u00a0120\ufeff\u00a0µm at 25\ufeff\u00a0°C");
    expect(noBreak("343 ± 120\u00a0µm")).toBe("343\u00a0±\u00a0120\u00a0µm");
  });

  it("leave words alone that only begin like a unit", () => {
    expect(noBreak("12 may, 3 Newton, 4 months")).toBe("12 may, 3 Newton, 4 months");
  });
});

describe("text in drawings", () => {
  it.each([
    // Widths in px measured on a canvas in a browser, from the shipped fonts at 12.5 px.
    ["Glass carrier 3.0 ppm", false, 124.5],
    ["curled about one axis", false, 126.3],
    ["−150 MPa compression", false, 136.4],
    ["Tape or ring", true, 73.0],
    ["Thin-wafer gripper", true, 114.1],
    ["Laser-release adhesive B", true, 150.2],
  ] as const)("is as wide as estimated, within 3 %%: %s", (text, semibold, measured) => {
    // The estimate only chooses places for words; it never cuts them.
    expect(Math.abs(textWidth(text, 12.5, semibold) / measured - 1)).toBeLessThan(0.03);
  });

  it("breaks between words and after hyphens, keeps no-break spaces, and never loses a word", () => {
    expect(wrapText("back-side film", 50, 12.5, 2)).toEqual(["back-", "side film"]);
    expect(wrapText("Bond", 10, 12.5, 2)).toEqual(["Bond"]);
    expect(wrapText("50\u00a0µm wafer", 30, 12.5, 2)).toEqual(["50\u00a0µm", "wafer"]);
    expect(wrapText("one two three four", 10, 12.5, 2)).toEqual(["one", "two three four"]);
  });
});
