import { describe, expect, test } from "vitest";
import { lotProgress, type Move } from "#app/lib/floor/lot-progress.ts";

const STEPS = [1, 2, 3, 4, 5];
const began = (step: number): Move => ({ kind: "started", step });
const ended = (step: number): Move => ({ kind: "done", step });

describe("where a lot is in its flow", () => {
  test("is the step at which it came onto the sheet, before anything was said", () => {
    expect(lotProgress(STEPS, 1, [])).toEqual({ underWay: null, here: 1, done: [], missing: [] });
    expect(lotProgress(STEPS, 3, [])).toEqual({ underWay: null, here: 3, done: [], missing: [] });
  });

  test("is the step under way until it is done, and then the next", () => {
    expect(lotProgress(STEPS, 1, [began(1)])).toMatchObject({ underWay: 1, here: 1 });
    expect(lotProgress(STEPS, 1, [began(1), ended(1)])).toMatchObject({ underWay: null, here: 2, done: [1] });
  });

  test("passes over the steps that a part of the slots skips", () => {
    expect(lotProgress([1, 2, 5], 1, [began(1), ended(1), began(2), ended(2)])).toMatchObject({ here: 5 });
  });

  test("names the steps that were passed without a word", () => {
    expect(lotProgress(STEPS, 2, [began(4), ended(4)])).toEqual({
      underWay: null,
      here: 5,
      done: [4],
      missing: [2, 3],
    });
  });

  test("goes back for rework, and on where it was once that is done", () => {
    const moves = [began(1), ended(1), began(2), ended(2), began(1)];
    expect(lotProgress(STEPS, 1, moves)).toMatchObject({ underWay: 1, here: 1, done: [2] });
    expect(lotProgress(STEPS, 1, [...moves, ended(1)])).toMatchObject({ here: 3, done: [1, 2] });
  });

  test("is nowhere once the last step is done", () => {
    expect(lotProgress(STEPS, 5, [began(5), ended(5)])).toMatchObject({ underWay: null, here: null, missing: [] });
  });
});
