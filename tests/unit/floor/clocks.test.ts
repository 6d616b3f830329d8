import { describe, expect, test } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { clockState, runningClocks, type ClockMove } from "#app/lib/floor/clocks.ts";

const LIMITS = defaultLimits();
const DAY = 86_400;
const at = (hours: number) => new Date(Date.UTC(2026, 11, 1, hours)).toISOString();
const move = (
  kind: ClockMove["kind"],
  stepKind: ClockMove["stepKind"],
  hours: number,
  planned = "bare",
): ClockMove => ({
  kind,
  stepKind,
  planned: planned as ClockMove["planned"],
  at: at(hours),
});
const names = (moves: ClockMove[], ahead: ClockMove["stepKind"][] = ["grind", "stress relief", "clean"]) =>
  runningClocks(moves, ahead, LIMITS, null).map(({ name }) => name);

describe("a clock", () => {
  test("runs from the end of the grind until relief begins", () => {
    const ground = [move("started", "grind", 0), move("done", "grind", 1)];
    expect(runningClocks(ground, ["stress relief"], LIMITS, null)).toEqual([
      { name: "Since grind, until stress relief", since: at(1), limit: DAY, margin: 0.2 * DAY },
    ]);
    expect(names([move("started", "grind", 0)])).toEqual([]);
    expect(names([...ground, move("started", "polish", 2)])).toEqual([]);
  });

  test("has no red line to keep where the flow has no such step ahead", () => {
    expect(names([move("done", "grind", 1)], ["dice"])).toEqual([]);
  });

  test("begins anew with each grind, and several run side by side", () => {
    const moves = [move("done", "debond", 1), move("done", "grind", 2), move("done", "grind", 5)];
    expect(runningClocks(moves, ["clean", "polish"], LIMITS, null).map(({ since }) => since)).toEqual([at(1), at(5)]);
  });

  test("of tape runs on it, ends where it leaves, and keeps the tape's own shorter time", () => {
    const on = [move("done", "laminate tape", 0, "grinding tape"), move("done", "grind", 1, "grinding tape")];
    expect(names(on, [])).toEqual(["On tape"]);
    expect(runningClocks(on, [], LIMITS, 2 * DAY)[0]?.limit).toBe(2 * DAY);
    expect(runningClocks(on, [], LIMITS, 30 * DAY)[0]?.limit).toBe(LIMITS.tapeWithin.value);
    expect(runningClocks([...on, move("done", "mount on frame", 2, "film frame")], [], LIMITS, null)[0]?.since).toBe(
      at(2),
    );
    expect(names([...on, move("done", "debond", 2, "bare")], [])).toEqual([]);
  });

  test("is clear, cautions from its margin on, passes at its red line, and is over beyond it", () => {
    const clock = { name: "", since: at(0), limit: DAY, margin: 0.2 * DAY };
    const level = (seconds: number) => clockState(clock, new Date(Date.parse(at(0)) + seconds * 1000)).level;
    expect(level(0.8 * DAY - 1)).toBe("clear");
    expect(level(0.8 * DAY)).toBe("caution");
    expect(level(DAY)).toBe("caution");
    expect(level(DAY + 1)).toBe("do not run");
    expect(clockState(clock, new Date(Date.parse(at(0)) + 1000 * DAY * 2))).toMatchObject({ left: -DAY });
  });
});
