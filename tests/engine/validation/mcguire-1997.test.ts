/*
 * K. McGuire, S. Danyluk, T. L. Baker, J. W. Rupnow, D. McLaughlin, The influence of backgrinding on the fracture strength of
 * 100 mm diameter (111) p-type silicon wafers, Journal of Materials Science 32 (1997) 1017. Abstract read: 136 and 124 MPa with
 * the swirl along the flat and at 45°, 100 and 103 MPa at 90° and 135°; ground from 0.53 to 0.36 mm. Data, not a formula.
 */
import { describe, expect, it } from "vitest";
import { STRENGTH_DATA } from "#app/engine/strength/strength-data.ts";

describe("McGuire et al. 1997, abstract", () => {
  it("coarse ground wafers: 136, 124, 100 and 103 MPa by direction of the swirl", () => {
    const datum = STRENGTH_DATA.find(({ source }) => source === "mcguire-1997");
    // The printed digits themselves.
    expect(datum?.values).toEqual([136e6, 124e6, 100e6, 103e6]);
    expect(datum?.characteristicStrength).toEqual([100e6, 136e6]);
    expect(datum?.specimen).toContain("0.53 to 0.36 mm");
  });
});
