import { describe, expect, it } from "vitest";
import { bondingMaterialSchema } from "#app/schemas/bonding-material.ts";
import { carrierSchema } from "#app/schemas/carrier.ts";
import { equipmentSchema } from "#app/schemas/equipment.ts";
import { siliconSchema } from "#app/schemas/silicon.ts";
import { property, send, type Sent } from "./forms.ts";

const GLASS: Sent = {
  name: "Glass carrier 3.0 ppm",
  material: "glass",
  diameter: "300 mm",
  ...property("thickness", "700um", { tolerance: "10 um" }),
  ...property("youngsModulus", "74 GPa"),
  ...property("poissonsRatio", "0.22"),
  ...property("expansion", "3 ppm/K", { tolerance: "0.1 ppm/K" }),
  expansionRange: "25 to 150 °C mean",
  ...property("density", "2.45 g/cm3"),
  ...property("thicknessVariation", "1.5 µm"),
  ...property("temperatureLimit", "400 °C", { tolerance: "5 K", on: "2026-10-21" }),
  passesUltraviolet: "on",
  reuseLimit: "20",
};

const SILICON_CARRIER: Sent = {
  ...GLASS,
  material: "silicon",
  "expansion.value": "",
  "expansion.tolerance": "",
  expansionRange: "",
  passesUltraviolet: "",
};

describe("a carrier's curve", () => {
  const CURVE = { "expansionCurve.rows": "20; 3\n300; 3.4", "expansionCurve.source": "supplier" };
  const NO_MEAN = { "expansion.value": "", "expansion.tolerance": "", expansionRange: "" };

  it("stands in place of the mean, with its own range and source", () => {
    const { value, errors } = send(carrierSchema, {
      ...GLASS,
      ...NO_MEAN,
      ...CURVE,
      "expansionCurve.tolerance": "0.1 ppm/K",
    });
    expect(errors).toEqual({});
    expect(value).toMatchObject({
      expansion: null,
      expansionRange: "curve, 20 to 300 °C",
      expansionCurve: { source: "supplier", tolerance: expect.closeTo(1e-7, 12), note: "", on: null },
    });
  });

  it("is left out when it is blank", () => {
    expect(
      send(carrierSchema, { ...GLASS, "expansionCurve.rows": "  ", "expansionCurve.source": "" }).value,
    ).toMatchObject({
      expansionCurve: null,
    });
  });

  it.each([
    [{ ...CURVE, "expansionCurve.rows": "20; 3\n300; x" }, "expansionCurve.rows", "Row 2: "],
    [{ ...CURVE, "expansionCurve.source": "" }, "expansionCurve.source", "Say where the curve comes from"],
    [{ "expansionCurve.tolerance": "0.1 ppm/K" }, "expansionCurve.rows", "Type the curve as well"],
    [{ ...CURVE, "expansionCurve.tolerance": "0.1 ppm/K" }, "expansionCurve.tolerance", "clear one of the two"],
    [{ ...CURVE, "expansionCurve.on": "1.2.2026" }, "expansionCurve.on", "Type the date as"],
  ])("%j is refused at %s", (typed, field, says) => {
    expect(send(carrierSchema, { ...GLASS, ...typed }).errors[field]?.[0]).toContain(says);
  });

  it("is silicon's own on silicon", () => {
    const { errors } = send(carrierSchema, { ...SILICON_CARRIER, ...CURVE });
    expect(errors["expansionCurve.rows"]?.[0]).toContain("the curve of silicon itself");
  });
});

describe("a carrier's form", () => {
  it("is read in SI, with what was typed kept", () => {
    const { value, errors } = send(carrierSchema, GLASS);
    expect(errors).toEqual({});
    expect(value).toMatchObject({
      diameter: 0.3,
      thickness: { value: expect.closeTo(700e-6, 12), tolerance: expect.closeTo(10e-6, 12), text: "700um" },
      expansion: { value: expect.closeTo(3e-6, 14) },
      density: { value: expect.closeTo(2450, 6) },
      temperatureLimit: { value: expect.closeTo(673.15, 6), tolerance: 5, on: "2026-10-21" },
      passesUltraviolet: true,
      passesInfrared: false,
      perforated: false,
      reuseLimit: 20,
    });
  });

  it.each([
    ["diameter", "12 parsecs", "diameter", "parsecs is not a unit of length"],
    ["diameter", "-300 mm", "diameter", "outside 25 mm to 460 mm"],
    ["thickness.value", "", "thickness.value", "Blank is missing, not zero"],
    ["thickness.value", "700", "thickness.value", "700 what?"],
    ["thickness.tolerance", "-1 um", "thickness.tolerance", "outside zero"],
    ["youngsModulus.source", "", "youngsModulus.source", "Say where the value comes from"],
    ["poissonsRatio.value", "0.6", "poissonsRatio.value", "outside 0 to 0.499"],
    ["expansion.value", "", "expansion.value", "Type the expansion"],
    ["expansionRange", "", "expansionRange", "Say over which temperatures"],
    ["reuseLimit", "2.5", "reuseLimit", "as a whole number"],
    ["reuseLimit", "often", "reuseLimit", "as a whole number"],
    ["reuseLimit", "0", "reuseLimit", "It must be 1 or more."],
    ["material", "steel", "material", "Choose the material."],
    ["temperatureLimit.on", "21.10.2026", "temperatureLimit.on", "Type the date as 2026-12-01."],
    ["name", " ", "name", "Give it a name."],
  ])("refuses %s “%s” at its field", (field, typed, at, words) => {
    const { errors } = send(carrierSchema, { ...GLASS, [field]: typed });
    expect(errors[at]?.join(" ")).toContain(words);
  });

  it("takes no expansion and no ultraviolet light for silicon, which has its own curve", () => {
    const { value } = send(carrierSchema, SILICON_CARRIER);
    expect(value).toMatchObject({ expansion: null, expansionRange: "silicon's own curve" });
    const { errors } = send(carrierSchema, { ...GLASS, material: "silicon" });
    expect(errors["expansion.value"]?.[0]).toContain("Leave it blank");
    expect(errors["passesUltraviolet"]?.[0]).toContain("does not pass ultraviolet");
  });

  it("takes the range of a mean as two temperatures, and says it in words", () => {
    const range = { meanExpansionFrom: "30 °C", meanExpansionTo: "300 °C" };
    const given = { meanExpansionFrom: expect.closeTo(303.15, 6), meanExpansionTo: expect.closeTo(573.15, 6) };
    for (const words of ["", "25 to 150 °C mean"])
      expect(send(carrierSchema, { ...GLASS, ...range, expansionRange: words }).value).toMatchObject({
        ...given,
        expansionRange: "30 to 300 °C mean",
      });
    const own = { ...GLASS, ...range, expansionRange: "up to its strain point" };
    expect(send(carrierSchema, own).value).toMatchObject({ expansionRange: "up to its strain point" });
  });

  it.each([
    [{ meanExpansionFrom: "30 °C" }, "meanExpansionTo", "where the range ends too"],
    [{ meanExpansionTo: "30 °C" }, "meanExpansionFrom", "where the range begins too"],
    [{ meanExpansionFrom: "150 °C", meanExpansionTo: "25 °C" }, "meanExpansionTo", "ends before it begins"],
    [{ meanExpansionFrom: "12 parsecs" }, "meanExpansionFrom", "parsecs is not a unit of temperature"],
  ])("refuses the range %j", (range, at, words) => {
    expect(send(carrierSchema, { ...GLASS, ...range }).errors[at]?.join(" ")).toContain(words);
  });

  it("takes no range for silicon", () => {
    const { errors } = send(carrierSchema, {
      ...SILICON_CARRIER,
      meanExpansionFrom: "25 °C",
      meanExpansionTo: "150 °C",
    });
    expect(errors["meanExpansionFrom"]?.[0]).toContain("silicon has its own curve");
  });

  it("does not lose a tolerance or a note that stands beside a blank value", () => {
    for (const beside of ["expansion.tolerance", "expansion.note"]) {
      const { errors } = send(carrierSchema, { ...SILICON_CARRIER, [beside]: "0.1 ppm/K" });
      expect(errors["expansion.value"]?.[0]).toBe("Type the expansion as well, or clear its tolerance and note.");
    }
  });
});

const SLIDE: Sent = {
  name: "Thermoplastic slide adhesive A",
  flows: "on",
  ...property("softening", "120 °C"),
  ...property("bondTemperature", "180 °C"),
  ...property("temperatureLimit", "200 °C"),
  ...property("effectiveModulus", "150 MPa"),
  ...property("dataSheetModulus", "1.6 GPa"),
  ...property("poissonsRatio", "0.38"),
  ...property("expansionBelow", "60 ppm/K"),
  ...property("expansionAbove", "190 ppm/K"),
  leastThickness: "10 um",
  mostThickness: "40 um",
  ...property("thicknessVariationShare", "5 %"),
  release: "thermal slide",
  ...property("releaseTemperature", "200 °C"),
};

describe("a bonding material's form", () => {
  it("is read in SI; what it stands is not known until it is said", () => {
    expect(send(bondingMaterialSchema, SLIDE).value).toMatchObject({
      flows: true,
      softening: { value: expect.closeTo(393.15, 6) },
      effectiveModulus: { value: expect.closeTo(0.15e9, 0) },
      thicknessVariationShare: { value: expect.closeTo(0.05, 12) },
      thermalCycles: null,
      vacuum: "not known",
    });
  });

  it.each([
    [{ mostThickness: "5 um" }, "mostThickness", "less than the least"],
    [{ "softening.value": "" }, "softening.value", "flows above its softening point"],
    [{ flows: "" }, "release", "cannot slide off"],
    [{ flows: "", ...property("flowPoint", "150 °C") }, "flowPoint.value", "Only a thermoplastic flows"],
    [property("flowPoint", "110 °C"), "flowPoint.value", "cannot flow below 120\u00A0°C"],
    [property("flowPoint", "210 °C"), "releaseTemperature.value", "at its flow point, 210\u00A0°C, or above"],
    [
      { "releaseTemperature.value": "100 °C" },
      "releaseTemperature.value",
      "its softening point, 120\u00A0°C, or above",
    ],
    [{ thermalCycles: "0" }, "thermalCycles", "It must be 1 or more."],
    [{ thermalCycles: "a few" }, "thermalCycles", "Type a whole number, or leave it blank."],
    [{ release: "" }, "release", "Choose how it lets go."],
    [{ "effectiveModulus.value": "0" }, "effectiveModulus.value", "0 what?"],
    [{ vacuum: "x".repeat(201) }, "vacuum", "Keep it under 200 characters."],
  ])("refuses %j", (change, at, words) => {
    const { errors } = send(bondingMaterialSchema, { ...SLIDE, ...change });
    expect(errors[at]?.join(" ")).toContain(words);
  });
});

describe("a tool's form", () => {
  const TOOL: Sent = {
    name: "Coater",
    holding: "vacuum",
    atPeak: "held",
    ...property("warpLimitEdgesUp", "400 um"),
    "warpLimitEdgesDown.value": "",
    ...property("leastUnsupportedThickness", "0 um"),
    ...property("largestDiameter", "300 mm"),
  };

  it("tells a limit that is not given from one of zero", () => {
    expect(send(equipmentSchema, TOOL).value).toMatchObject({
      warpLimitEdgesUp: { value: expect.closeTo(400e-6, 12) },
      warpLimitEdgesDown: null,
      leastUnsupportedThickness: { value: 0 },
    });
    expect(send(equipmentSchema, { ...TOOL, "warpLimitEdgesUp.value": "0 um" }).errors).toHaveProperty([
      "warpLimitEdgesUp.value",
    ]);
  });

  it.each([
    [{ holding: "" }, "holding", "Say how it holds the wafer."],
    [{ holding: "x".repeat(101) }, "holding", "Keep it under 100 characters."],
    [{ atPeak: "" }, "atPeak", "free when hot"],
    [{ "largestDiameter.value": "" }, "largestDiameter.value", "Type the largest diameter"],
  ])("refuses %j", (change, at, words) => {
    expect(send(equipmentSchema, { ...TOOL, ...change }).errors[at]?.[0]).toContain(words);
  });
});

describe("a silicon wafer's form", () => {
  const WAFER: Sent = { name: "Silicon", orientation: "100", diameter: "12 inch", ...property("thickness", "775 um") };

  it("is read in SI", () => {
    expect(send(siliconSchema, WAFER).value).toMatchObject({
      orientation: "100",
      diameter: expect.closeTo(0.3048, 9),
      thickness: { value: expect.closeTo(775e-6, 12) },
    });
  });

  it.each([
    [{ orientation: "110" }, "orientation", "Choose the face"],
    [{ diameter: "" }, "diameter", "Type the diameter"],
    [{ "thickness.value": "3 mm" }, "thickness.value", "outside 1 µm to 2 mm"],
  ])("refuses %j", (change, at, words) => {
    expect(send(siliconSchema, { ...WAFER, ...change }).errors[at]?.[0]).toContain(words);
  });
});
