import type { ReactNode } from "react";
import { describe, expect, it } from "vitest";
import { WarpChart } from "#app/components/charts/WarpChart.tsx";
import { AnswerLine } from "#app/components/drawings/AnswerLine.tsx";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { Cut } from "#app/components/drawings/Cut.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { Mark } from "#app/components/drawings/Mark.tsx";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { StepStrip } from "#app/components/drawings/StepStrip.tsx";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import { SupportColumn } from "#app/components/drawings/SupportColumn.tsx";
import { HOLDINGS, OUTCOMES, SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { shippedRanges, strangeCharacters, STYLES } from "../glyphs.ts";
import { render } from "./render.ts";
import { LAYERS, STEPS, WARP } from "./samples.ts";

const EVERYTHING: readonly [name: string, part: ReactNode][] = [
  [
    "answer",
    <AnswerLine
      key=""
      outcome="cannot judge"
      sentences={["Step 9 bows 313 ± 39 µm."]}
      figures={[{ label: "Limit", value: "300 µm" }]}
    />,
  ],
  [
    "bow lines",
    HOLDINGS.map((holding) => (
      <BowLine
        key={holding}
        diameter={0.3}
        shape={{ kind: "bowed", bow: 1e-4 }}
        deviceSideUp
        holding={holding}
        exaggeration={100}
        width={76}
        height={32}
        label="edges down"
        showScale
      />
    )),
  ],
  [
    "cut",
    <Cut
      key=""
      layers={LAYERS}
      top={{ words: "Device side", add: { words: "Add a film on top", href: "#" } }}
      bottom={{ words: "Back side" }}
      label="The cut"
      showKey
      shape={{
        diameter: 0.3,
        shape: { kind: "flat" },
        deviceSideUp: true,
        holding: "bare",
        exaggeration: 100,
        head: "Free at 25 °C",
        note: "flat, ×100",
      }}
    />,
  ],
  ["tags", OUTCOMES.map((outcome) => <FindingTag key={outcome} outcome={outcome} />)],
  ["sources", SOURCE_KINDS.map((kind) => <SourceMark key={kind} kind={kind} />)],
  ["strip", <StepStrip key="" steps={STEPS} diameter={0.3} exaggeration={100} label="Steps" />],
  [
    "bar",
    <SupportBar
      key=""
      required={STEPS.map((step) => step.required)}
      planned={STEPS.map((step) => step.planned)}
      label="Support"
    />,
  ],
  ["column", <SupportColumn key="" level="stop" />],
  ["mark", <Mark key="" />],
  ["chart", <WarpChart key="" data={WARP} label="Warp" summary="Warp grows as silicon gets thinner." />],
];

describe.each(EVERYTHING)("%s", (_, part) => {
  const markup = render(part);

  it("has no pattern, which would print as blocks, and no fixed identifier that could collide", () => {
    expect(markup).not.toContain("<pattern");
    expect(markup).not.toMatch(/ id="/);
  });

  it("uses only characters for which a font is shipped", () => {
    expect(strangeCharacters(markup)).toEqual([]);
  });

  it("paints with tokens only, so that dark, paper and forced colours follow", () => {
    expect(markup).not.toMatch(/(?:fill|stroke)="(?:#|rgb|black|white)/);
  });
});

describe("style sheet", () => {
  it("declares three weights in three subsets, and no glyph that they lack", () => {
    expect(STYLES.match(/@font-face \{\s+font-family: "Noto Sans";/g)).toHaveLength(9);
    const lacking = [0x2191, 0x2192, 0x2264, 0x2265, 0x207b, 0x2080, 0x2713];
    const declared = lacking.filter((point) => shippedRanges().some(([from, to]) => point >= from && point <= to));
    expect(declared.map((point) => point.toString(16))).toEqual([]);
  });

  it("keeps the dark palette off paper", () => {
    expect(STYLES).toContain("@media screen and (prefers-color-scheme: dark)");
    expect(STYLES).not.toMatch(/@media not print and/);
  });
});
