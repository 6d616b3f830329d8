import { describe, expect, it } from "vitest";
import type { ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import { checkOnWafer, checkTogether } from "#app/lib/profile-on-wafer.ts";

const WAFER = { diameter: 0.2, edgeExclusion: 5e-3 };

/** A level scan from one position to another, m, with one height that differs. */
function profile(from: number, to: number, height = 1e-6): ReadProfile {
  const points = {
    x: Float64Array.from({ length: 21 }, (_, n) => from + ((to - from) * n) / 20),
    z: Float64Array.from({ length: 21 }, (_, n) => (n === 3 ? height : 0)),
  };
  const reading = { rows: 21, used: 21, columns: 2, heading: null, delimiter: ",", skipped: [], skippedInAll: 0 };
  return { points, reading: { ...reading, from, to } };
}

describe("a profile on its wafer", () => {
  const check =
    (scan: ReadProfile, wafer = WAFER) =>
    () =>
      checkOnWafer(scan, "M-0388.csv", wafer);

  it("fits, up to a little beyond the edge", () => {
    expect(check(profile(-0.095, 0.095))).not.toThrow();
    expect(check(profile(0, 0.204))).not.toThrow();
  });

  it.each<[what: string, scan: ReadProfile, says: RegExp]>([
    ["micrometres read as millimetres", profile(-95, 95), /positions run over 190.m, but the wafer measures 200.mm/],
    [
      "millimetres read as micrometres",
      profile(-95e-6, 95e-6),
      /run over 190.µm; with 5.mm left out .* nothing remains/,
    ],
    ["nanometres read as millimetres", profile(-0.09, 0.09, 5), /heights differ by 5.m, more than the radius/],
    ["one position only", profile(0.01, 0.01), /all rows have the same position, 10.mm/],
  ])("%s", (_, scan, says) => expect(check(scan)).toThrow(says));

  it("nothing remains when twice the rim is the whole scan", () => {
    expect(check(profile(0, 0.01), WAFER)).toThrow(/nothing remains/);
    expect(check(profile(0, 0.0101), WAFER)).not.toThrow();
  });
});

describe("two profiles together", () => {
  const together = (after: ReadProfile) => () =>
    checkTogether({ name: "before.csv", profile: profile(-0.095, 0) }, { name: "after.csv", profile: after }, WAFER);

  it("that share a stretch are compared", () => expect(together(profile(-0.05, 0.05))).not.toThrow());

  it("that do not overlap are refused with both ranges", () => {
    expect(together(profile(0.01, 0.095))).toThrow(
      /do not overlap: before\.csv runs from −95.mm to 0.mm, after\.csv from 10.mm to 95.mm/,
    );
  });

  it("that overlap by less than the two rims are refused", () => {
    expect(together(profile(-0.008, 0.095))).toThrow(/overlap over 8.mm only.*nothing remains/);
  });
});
