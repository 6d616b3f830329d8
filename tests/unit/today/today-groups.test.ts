import { describe, expect, it } from "vitest";
import { groupFlows, headline, headlineForGuest, SHOWN } from "#app/lib/today-groups.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { TodayFlow } from "#app/schemas/today.ts";

const day = (number: number) => `2026-11-${String(number).padStart(2, "0")}T08:00:00.000Z`;

/** A flow changed on a day of November and, unless left out, assessed on another. */
function flow(id: string, changed: number, assessed?: number, outcome: Outcome = "caution"): TodayFlow {
  return {
    id,
    name: id,
    program: "Tern",
    updatedAt: day(changed),
    mayAssess: true,
    newest: assessed === undefined ? null : { id: `${id}-1`, number: 1, outcome, at: day(assessed) },
  };
}

const NONE = new Set<string>();
const ids = ({ rows }: { rows: TodayFlow[] }) => rows.map(({ id }) => id);

describe("flows by what they wait for", () => {
  it("a decision while assessed, unchanged since, and not clear; the longest waiting first", () => {
    const { decisions, outOfDate, notAssessed } = groupFlows(
      [flow("later", 1, 9, "do not run"), flow("clear", 1, 2, "clear"), flow("earlier", 1, 3, "cannot judge")],
      NONE,
    );
    expect(ids(decisions)).toEqual(["earlier", "later"]);
    expect([outOfDate.total, notAssessed.total]).toEqual([0, 0]);
  });

  it("out of date once its newest assessment is, whatever that had said", () => {
    const { decisions, outOfDate } = groupFlows(
      [flow("was clear", 6, 5, "clear"), flow("was not", 5, 4, "do not run")],
      new Set(["was clear-1", "was not-1"]),
    );
    expect(ids(outOfDate)).toEqual(["was not", "was clear"]);
    expect(decisions.total).toBe(0);
  });

  it("saved again without a change that matters is still what was assessed", () => {
    expect(groupFlows([flow("saved", 6, 5)], NONE).outOfDate.total).toBe(0);
  });

  it("not assessed at all", () => {
    expect(ids(groupFlows([flow("new", 7), flow("old", 2)], NONE).notAssessed)).toEqual(["old", "new"]);
  });

  it("shows the first and counts all", () => {
    const { notAssessed } = groupFlows(
      Array.from({ length: SHOWN + 3 }, (_, n) => flow(String(n), n + 1)),
      NONE,
    );
    expect(notAssessed.rows).toHaveLength(SHOWN);
    expect(notAssessed.total).toBe(SHOWN + 3);
  });
});

const NO_LOTS = { blocked: { total: 0 }, toMove: { total: 0 }, toTake: { total: 0 } };

describe("the sentence at the top", () => {
  it.each<[decisions: number, outOfDate: number, notAssessed: number, sentence: string]>([
    [0, 0, 0, "Nothing waits for a decision."],
    [1, 0, 0, "One flow needs a decision."],
    [2, 1, 0, "Two flows need a decision and one assessment is out of date."],
    [0, 2, 3, "Two assessments are out of date and three flows are not assessed yet."],
    [2, 1, 1, "Two flows need a decision, one assessment is out of date and one flow is not assessed yet."],
    [0, 0, 14, "14 flows are not assessed yet."],
  ])("%i, %i and %i", (decisions, outOfDate, notAssessed, sentence) => {
    expect(
      headline({
        sheets: { toRelease: { total: 0 }, toSign: { total: 0 }, returned: { total: 0 } },
        lots: NO_LOTS,
        incidents: { total: 0 },
        decisions: { total: decisions },
        outOfDate: { total: outOfDate },
        notAssessed: { total: notAssessed },
      }),
    ).toBe(sentence);
  });

  it("begins with what waits for the reader alone", () => {
    const sheets = { toRelease: { total: 2 }, toSign: { total: 1 }, returned: { total: 1 } };
    const none = { total: 0 };
    const lots = { blocked: { total: 1 }, toMove: { total: 2 }, toTake: { total: 1 } };
    const incidents = { total: 2 };
    expect(headline({ sheets, lots, incidents, decisions: { total: 1 }, outOfDate: none, notAssessed: none })).toBe(
      "Two sheets wait for your review, one deviation waits for your signature, one sheet was returned to you, one lot or step is held, one place is to be taken over, two lots are on old sheets, two incidents are to be followed up and one flow needs a decision.",
    );
  });

  it.each([
    [0, "No sheet is in force for your programs."],
    [1, "One sheet is in force for your programs."],
    [3, "Three sheets are in force for your programs."],
  ])("of a guest with %i sheets", (inForce, sentence) => {
    expect(headlineForGuest(inForce)).toBe(sentence);
  });
});
