import { describe, expect, it } from "vitest";
import { filmSchema } from "#app/schemas/film.ts";
import { property, send, type Sent } from "../carriers/forms.ts";

const POLYMER: Sent = {
  name: "Polymer dielectric A",
  kind: "polymer",
  ...property("stress", "31 MPa"),
  ...property("youngsModulus", "3.2 GPa"),
  ...property("poissonsRatio", "0.35"),
  ...property("expansion", "35 ppm/K"),
  ...property("zeroStressTemperature", "230 °C", { tolerance: "10 K" }),
};

describe("the zero-stress temperature of a film", () => {
  it("is a polymer's, with its tolerance as a difference, and may be left blank", () => {
    expect(send(filmSchema, POLYMER).value).toMatchObject({
      zeroStressTemperature: { value: expect.closeTo(503.15, 6), tolerance: 10 },
    });
    const blank = { ...POLYMER, ...property("zeroStressTemperature", "", { tolerance: "" }) };
    expect(send(filmSchema, blank).value).toMatchObject({ zeroStressTemperature: null });
  });

  it.each([
    [{ kind: "metal" }, "Only a polymer has one"],
    [{ "zeroStressTemperature.value": "20 °C" }, "above 25 °C"],
    [{ "zeroStressTemperature.value": "12 parsecs" }, "parsecs is not a unit of temperature"],
  ])("is refused with %j", (changes, words) => {
    const { errors } = send(filmSchema, { ...POLYMER, ...changes });
    expect(errors["zeroStressTemperature.value"]?.join(" ")).toContain(words);
  });
});
