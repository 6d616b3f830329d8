import { createRoutesStub } from "react-router";
import { describe, expect, it } from "vitest";
import { LotDots } from "#app/components/drawings/LotDots.tsx";
import { LotSection } from "#app/components/lot/LotSection.tsx";
import { LotSpread } from "#app/components/lot/LotSpread.tsx";
import { expectedSentences, lotFault, spreadSentences } from "#app/lib/lot-words.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { LotRecord, WaferAnswer } from "#app/schemas/lot.ts";
import { render, words } from "#tests/components/drawings/render.ts";

const um = (micrometres: number) => micrometres / 1e6;

const answer = (slot: number, outcome: Outcome, warp: number, more: Partial<WaferAnswer> = {}): WaferAnswer => ({
  slot,
  bow: um(-10 * slot),
  thickness: um(725),
  outcome,
  at: { step: 12, title: "Edge trim", warp: um(warp), limit: um(500), rolled: false, lies: "edges up" },
  reason: null,
  ...more,
});

const ANSWERS = [
  answer(1, "clear", 245),
  answer(2, "caution", 460),
  answer(3, "do not run", 612),
  answer(4, "do not run", 44_000, {
    at: { step: 12, title: "Edge trim", warp: 0.044, limit: um(500), rolled: true, lies: "edges up" },
  }),
  answer(5, "cannot judge", 0, { at: null, reason: "This bow cannot come from the films." }),
];

const LOT: LotRecord = {
  name: "K-17",
  bow: um(-30),
  thickness: um(725),
  warp: null,
  edgeChips: "none",
  identity: "matches",
  wafers: ANSWERS.map(({ slot, bow, thickness }) => ({ slot, bow, thickness })),
  of: { id: "a1", number: 3, documentNumber: 7 },
  answers: ANSWERS,
};

describe("the wafers of a lot", () => {
  it("are counted in words, those that cannot be judged apart", () => {
    expect(spreadSentences(ANSWERS)).toEqual([
      "2 of 5 wafers miss the warp limit of a tool: slots 3 and 4.",
      "One more comes near one.",
      "One cannot be judged, which is no pass.",
    ]);
    expect(spreadSentences([answer(1, "clear", 100)])).toEqual(["None of 1 wafers misses the warp limit of a tool."]);
    expect(spreadSentences([answer(9, "do not run", 900), answer(10, "clear", 1)])[0]).toMatch(
      /^1 of 2 wafers misses .*: slot 9\.$/,
    );
  });

  it("stand in a table by slot, each with its word, and one that rolls up with its edge lift", () => {
    const text = words(render(<LotSpread lot={LOT} />));
    expect(text).toMatch(/3 −30\.0 µm 725\.0 µm 12, Edge trim edges up 612 µm 500 µm Do not run 122 % of limit/);
    expect(text).toContain("rolls up, edges lift 44");
    expect(text).toContain("Cannot judge This bow cannot come from the films.");
    expect(text).not.toContain("NaN");
  });

  it("are nothing where only the mean is known", () => {
    expect(render(<LotSpread lot={{ answers: [], thickness: null }} />)).toBe("");
  });

  it("are drawn with marks that differ by shape", () => {
    const dots = ANSWERS.map(({ slot, outcome, at }) => ({ slot, outcome, share: at && at.warp / um(500) }));
    const markup = render(<LotDots dots={dots} slots={25} label="Wafers" />);
    expect(markup).toContain('aria-label="Wafers"');
    expect(markup.match(/<circle/g)).toHaveLength(2);
    expect(markup.match(/<rect/g)).toHaveLength(1);
    expect(markup.match(/<path/g)).toHaveLength(1);
    expect(markup).not.toContain("NaN");
  });
});

it("a kept lot says of which assessment it is, and that it is no revision", () => {
  const Stub = createRoutesStub([{ path: "/", Component: () => <LotSection lot={LOT} /> }]);
  const text = words(render(<Stub initialEntries={["/"]} />));
  expect(text).toContain("Of lot K-17 alone, and no revision of the flow");
  expect(text).toMatch(/mean bow of −30 µm over 5 wafers, 725 µm thick\. Everything else is as in assessment C ?\./);
});

describe("what any lot is expected to come to", () => {
  const expected = {
    ...{ step: 12, title: "Edge trim", share: 0.12, lots: [0.001, 0.42] as [number, number] },
    ...{ slots: null, by: "" },
  };

  it("is said in wafers of a cassette, with the range of single lots", () => {
    expect(expectedSentences(expected)).toEqual([
      "With the tolerances given, about 3 of 25 wafers are expected beyond the tightest limit, that of step 12, Edge trim.",
      "Of 95 lots in 100 it is between none and about 11.",
    ]);
    expect(expectedSentences({ ...expected, share: 0, lots: [0, 0], by: "It rests most on A." })).toEqual([
      "With the tolerances given, no wafer of any lot is expected beyond the tightest limit, that of step 12, Edge trim.",
      "It rests most on A.",
    ]);
  });

  it("is said of the slots that come out worst where a flow parts by slot", () => {
    expect(expectedSentences({ ...expected, slots: [1, 2, 3, 4, 5, 6, 7, 8, 9, 10] })[0]).toBe(
      "With the tolerances given, about 1 of 10 wafers in slots 1 to 10 is expected beyond the tightest limit, that of step 12, Edge trim.",
    );
  });
});

it("a figure that no flow comes of is said where it was typed", () => {
  const fault = new EngineInputError("lot.bow", "cannot come from the films", "a smaller bow");
  expect(lotFault(fault, { wafers: [] })).toEqual({ field: "bow", reason: "This bow cannot come from the films." });
  expect(lotFault(fault, LOT).field).toBe("wafers");
});
