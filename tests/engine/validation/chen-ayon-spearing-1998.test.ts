/*
 * K.-S. Chen, A. Ayon, S. M. Spearing, Silicon strength testing for mesoscale structural applications, Materials Research Society
 * Symposium Proceedings (1998). Abstract read: Weibull reference strengths of 1.2 to 4.6 GPa in planar biaxial flexure, by the
 * finish. Data, not a formula.
 */
import { describe, expect, it } from "vitest";
import { STRENGTH_DATA } from "#app/engine/strength/strength-data.ts";

describe("Chen, Ayon and Spearing 1998, abstract", () => {
  it("fine finishes: 1.2 to 4.6 GPa", () => {
    const datum = STRENGTH_DATA.find(({ source }) => source === "chen-ayon-spearing-1998");
    // The printed digits themselves.
    expect(datum?.characteristicStrength).toEqual([1.2e9, 4.6e9]);
  });
});
