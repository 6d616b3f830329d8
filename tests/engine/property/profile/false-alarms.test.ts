/*
 * No check for a mistake says 'seen' on honest scans more often than its stated rate: 1,000 seeded cases, each with scans, records and
 * an expected change that is as far off as its uncertainty says. A rate of r is seen up to r + 3 sqrt(r/1000).
 */
import { describe, expect, it } from "vitest";
import { findMistakes, MISTAKES } from "#app/engine/profile/mistakes/find-mistakes.ts";
import { honestCase } from "../../unit/profile/honest-scan.ts";

const CASES = 1000;

describe("checks for mistakes on honest scans", () => {
  it("none is seen beyond its stated rate", () => {
    const count = new Map<number, number>();
    for (let n = 0; n < CASES; n += 1)
      for (const { number, state } of findMistakes(honestCase(7, n)))
        if (state === "seen") count.set(number, (count.get(number) ?? 0) + 1);
    for (const { number, falseAlarms } of MISTAKES) {
      const share = (count.get(number) ?? 0) / CASES;
      expect(share, `check ${number}`).toBeLessThanOrEqual(falseAlarms + 3 * Math.sqrt(falseAlarms / CASES));
    }
  }, 120_000);
});
