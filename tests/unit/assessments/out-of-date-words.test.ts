import { describe, expect, it } from "vitest";
import { compareResults, movementOf } from "#app/lib/result-comparison.ts";
import { movementSentence, outOfDateTitle } from "#app/lib/out-of-date-words.ts";
import type { DatedChange } from "#app/schemas/assessment-changes.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";

const SINCE = "2026-12-01T11:10:34.000Z";
const change: DatedChange = {
  subject: "Polyimide",
  property: "Stress",
  from: "31 MPa",
  to: "35 MPa",
  steps: [3],
  record: { kind: "film", id: null },
  by: null,
  at: null,
};
const plain = (text: string) => text.replaceAll("\u00A0", " ");

describe("that an assessment is out of date", () => {
  it.each([
    [{ engine: null, changes: [change] }, "Out of date: one input has changed since 2026-12-01"],
    [{ engine: null, changes: [change, change] }, "Out of date: 2 inputs have changed since 2026-12-01"],
    [{ engine: { from: "0.1.0", to: "0.2.0" }, changes: [] }, "Out of date: engine 0.2.0 has come in place of 0.1.0"],
    [
      { engine: { from: "0.1.0", to: "0.2.0" }, changes: [change] },
      "Out of date: one input has changed since 2026-12-01, and engine 0.2.0 has come in place of 0.1.0",
    ],
    [null, "Out of date: the flow, or something that it uses, has changed since 2026-12-01"],
  ])("%#", (changed, title) => {
    expect(outOfDateTitle(changed, SINCE)).toBe(title);
  });
});

describe("how far an answer moves", () => {
  it("verdict, number of steps and tightest step, with units", () => {
    const sentence = plain(movementSentence(movementOf(demoResult("Fulmar A"), demoResult("Fulmar B"))));
    expect(sentence).toMatch(
      /^The verdict goes from do not run to caution, first at step 5; finding or support changes at \d steps\. /,
    );
    expect(sentence).toMatch(
      /Tightest: from 190\.3 ± 3\.8 µm at step 11, 95 % of its limit, to 169\.1 ± 3\.4 µm at step 11, 85 %\.$/,
    );
  });

  it("nothing", () => {
    expect(plain(movementSentence(movementOf(demoResult("Tern"), demoResult("Tern"))))).toMatch(
      /^The verdict stays clear; no step’s finding or support changes\. Tightest, as before: /,
    );
  });

  it("a flow that cannot be computed any more, with the step that stops it", () => {
    expect(movementSentence({ outcome: "not computable", step: 14, reason: "no silicon would be left" })).toBe(
      "As it is now nothing can be computed: step 14, no silicon would be left.",
    );
  });
});

describe("two results side by side", () => {
  it("has every step of both, aligned, with the difference of their warps", () => {
    const { rows } = compareResults(demoResult("Petrel"), demoResult("Petrel, glass 7.2 ppm"));
    expect(rows).toHaveLength(21);
    expect(rows.every(({ before, after }) => before && after)).toBe(true);
    expect(rows.find(({ after }) => after?.number === 3)).toMatchObject({ differs: false, difference: "0" });
    expect(rows.find(({ after }) => after?.number === 15)?.difference).toMatch(/^[+−][\d.]+$/);
  });

  it("says of a step that only one has that the other has no such step", () => {
    const before = demoResult("Tern");
    const after = { ...before, steps: before.steps.filter(({ number }) => number !== 5) };
    const alone = compareResults(before, after).rows.filter(({ after: step }) => step === null);
    expect(alone).toMatchObject([{ before: { number: 5 }, difference: null, differs: true }]);
  });

  it("gives no difference where a wafer is held flat", () => {
    const { rows } = compareResults(demoResult("Tern"), demoResult("Tern"));
    expect(rows.at(-1)?.difference).toBeNull();
  });
});
