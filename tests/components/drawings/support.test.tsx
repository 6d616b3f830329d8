import { describe, expect, it } from "vitest";
import { plannedSpans } from "#app/components/drawings/planned-spans.ts";
import { runsOf } from "#app/components/drawings/runs-of.ts";
import { StepStrip } from "#app/components/drawings/StepStrip.tsx";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import type { SupportClass } from "#app/engine/vocabulary.ts";
import { attributes, render, words } from "./render.ts";
import { STEPS } from "./samples.ts";

const REQUIRED: SupportClass[] = [
  "bare",
  "bare",
  "carrier",
  "carrier",
  "carrier",
  "tape or ring",
  "tape or ring",
  "tape or ring",
];
const PLANNED = [
  null,
  null,
  "Glass carrier 3.0 ppm",
  "Glass carrier 3.0 ppm",
  "Glass carrier 3.0 ppm",
  "film frame",
  "film frame",
  "film frame",
];

describe("runs", () => {
  it("joins neighbours only", () => {
    expect(runsOf(["a", "a", "b", "a"])).toEqual([
      { value: "a", from: 0, to: 2 },
      { value: "b", from: 2, to: 3 },
      { value: "a", from: 3, to: 4 },
    ]);
    expect(runsOf([])).toEqual([]);
  });
});

describe("support bar", () => {
  const bar = (props: Partial<Parameters<typeof SupportBar>[0]> = {}) =>
    render(<SupportBar required={REQUIRED} planned={PLANNED} label="carrier from step 3 to 5" {...props} />);

  it.each(["screen", "paper", "floor"] as const)("has one hatched segment with its word per run, on %s", (variant) => {
    const markup = bar({ variant });
    // Two rectangles (ground and outline) per segment of three.
    const outlines = [...markup.matchAll(/<rect [^>]*fill="none"[^>]*stroke="var\(--(clear|need|caution)\)"/g)];
    expect(outlines.map((match) => match[1])).toEqual(["clear", "need", "caution"]);
    for (const word of ["Bare", "Carrier", "Tape or ring"]) expect(words(markup)).toContain(word);
    expect(markup).toContain('role="img" aria-label="carrier from step 3 to 5"');
  });

  it("numbers the steps, with their own numbers where given", () => {
    expect(words(bar())).toMatch(/^1 2 3 4 5 6 7 8/);
    expect(words(bar({ numbers: [4, 5, 6, 7, 8, 9, 10, 11] }))).toMatch(/^4 5 6 7 8 9 10 11/);
  });

  it("leaves out numbers that would touch, on paper as on screen", () => {
    const many: SupportClass[] = Array.from({ length: 60 }, () => "bare");
    const planned = many.map(() => null);
    expect(words(bar({ required: many, planned, variant: "paper" }))).toMatch(/^1 2 4 6 .* 58 60 Bare/);
    expect(words(bar({ required: many.slice(0, 24), planned: planned.slice(0, 24), variant: "paper" }))).toMatch(
      /^1 2 3 4 .* 23 24 Bare/,
    );
  });

  it("writes a word that has no room on its segment beneath the bar on paper, with its steps", () => {
    const narrow: SupportClass[] = Array.from({ length: 24 }, (_, index) => (index === 10 ? "tape or ring" : "bare"));
    const outcomes = narrow.map((_, index) =>
      index === 4 || index === 5 ? ("do not run" as const) : ("clear" as const),
    );
    const paper = { required: narrow, planned: narrow.map(() => null), outcomes, variant: "paper" as const };
    expect(words(bar(paper))).toContain("Tape or ring: step 11; do not run: steps 5 and 6");
    expect(words(bar({ ...paper, variant: "screen" }))).not.toContain("step 11");
  });

  it("draws planned support once per run, with its words", () => {
    expect(words(bar()).match(/Glass carrier 3.0 ppm/g)).toHaveLength(1);
    expect(words(bar()).match(/film frame/g)).toHaveLength(1);
  });

  it("marks the step that the reader is at", () => {
    expect(bar({ variant: "floor", current: 3 })).toContain('stroke-width="3"');
    expect(bar({ variant: "floor" })).not.toContain('stroke-width="3"');
  });

  it("gives blocked steps a plate in their own column", () => {
    const outcomes = ["clear", "clear", "clear", "do not run", "cannot judge", "clear", "clear", "clear"] as const;
    expect(words(bar({ outcomes }))).toContain("Do not run");
    expect(words(bar({ outcomes }))).toContain("Cannot judge");
  });

  it("keeps every word when segments are narrow, on two lines if need be", () => {
    const many: SupportClass[] = Array.from({ length: 24 }, (_, index) =>
      index % 2 === 0 ? "tape or ring" : "none fits",
    );
    const text = words(bar({ required: many, planned: many.map(() => null) }));
    expect(text).toContain("Tape or ring");
    expect(text).toContain("None fits");
  });
});

describe("words of planned support", () => {
  it("stand in the gap of their line where that is long enough, and beneath it where not", () => {
    const [long, short] = plannedSpans([...Array<string>(6).fill("film frame"), "thin-wafer gripper"], 60, 12.5);
    expect(long).toMatchObject({ row: null, from: 0, to: 6 });
    expect(short).toMatchObject({ row: 0, from: 6, to: 7 });
  });

  it("take a row of their own when they would run into the next", () => {
    const spans = plannedSpans(["Silicon carrier 775 µm", "grinding tape 200 µm", "film frame"], 48, 12.5);
    expect(spans.map((span) => span.row)).toEqual([0, 1, 2]);
  });
});

describe("step strip", () => {
  const strip = render(<StepStrip steps={STEPS} diameter={0.3} exaggeration={100} label="Steps of Petrel" />);

  it("is a named region that takes the focus, so that the keyboard can scroll it", () => {
    expect(strip).toMatch(
      /^<div class="[^"]*overflow-x-auto[^"]*" role="region" aria-label="Steps of Petrel" tabindex="0">/,
    );
  });

  it("makes every step a link with its outcome in words", () => {
    expect(attributes(strip, "href")).toEqual(STEPS.map((step) => step.href));
    expect(strip).toContain('aria-label="Step 2, Bond to glass carrier: do not run"');
    expect(strip).toContain('aria-label="Step 3, Polish to 50 µm: cannot judge"');
    expect(strip.match(/aria-current="step"/g)).toHaveLength(1);
  });

  it("prints thickness only where it changes, temperature only where it is warm", () => {
    const text = words(strip);
    expect(text.match(/\b775\b/g)).toHaveLength(1);
    expect(text.match(/\b50\b/g)?.length).toBe(2); // silicon, and the 50 % of the scale
    expect(text).toContain("180");
    expect(text).not.toMatch(/\b25\b/);
  });

  it("prints the page's scale in the head and ×1 at a rolled wafer", () => {
    expect(words(strip)).toContain("as it lies, ×100");
    expect(strip).toContain(">×1<");
  });

  it("keeps a warp beyond the row inside it, with the true figure and a mark that it goes on", () => {
    expect(words(strip)).toContain("142");
    const [, y = 0] = strip.match(/M[\d.]+ ([\d.]+)h12" stroke="var\(--stop\)"/)?.map(Number) ?? [];
    expect(y).toBeGreaterThanOrEqual(262);
    expect(strip).toContain("l5 -7l5 7z");
  });

  it("keeps columns at least 48 px wide however many steps there are", () => {
    const many = Array.from(
      { length: 40 },
      (_, index) => ({ ...STEPS[0], number: index + 1 }) as (typeof STEPS)[number],
    );
    const wide = render(<StepStrip steps={many} diameter={0.3} exaggeration={100} label="Steps" />);
    expect(wide).toMatch(new RegExp(`viewBox="0 0 ${124 + 68 + 40 * 48} `));
  });
});
