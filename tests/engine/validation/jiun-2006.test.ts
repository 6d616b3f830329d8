/*
 * H. H. Jiun, I. Ahmad, A. Jalar, G. Omar, Effect of wafer thinning methods towards fracture strength and topography of silicon
 * die, Microelectronics Reliability 46 (2006) 836. Abstract read: stress relief by 25 µm strengthens wafers of 100 µm by 20.4 %
 * with a wet etch and of 75 µm by 36.4 % with plasma. Data, not a formula.
 */
import { describe, expect, it } from "vitest";
import { STRENGTH_DATA } from "#app/engine/strength/strength-data.ts";

describe("Jiun et al. 2006, abstract", () => {
  it.each([
    ["wet etched", 0.204, "100 µm"],
    ["plasma etched", 0.364, "75 µm"],
  ])("%s: stronger by %d", (finish, gain, thickness) => {
    const datum = STRENGTH_DATA.find((entry) => entry.finish === finish && entry.source === "jiun-2006");
    // The printed digits themselves.
    expect(datum?.gain).toBe(gain);
    expect(datum?.specimen).toContain(thickness);
    expect(datum?.specimen).toContain("25 µm");
  });
});
