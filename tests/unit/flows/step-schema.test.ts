import { describe, expect, it } from "vitest";
import { flowSchema, newFlowSchema, stepSchema } from "#app/schemas/flow.ts";

const ID = "11111111-1111-4111-8111-111111111111";

const step = (overrides: Record<string, unknown> = {}) => ({
  title: "Measure",
  kind: "measure",
  peakTemperature: "25 °C",
  planned: "bare",
  ...overrides,
});

/** What is wrong, by the field that says so. */
function faults(values: Record<string, unknown>): Record<string, string> {
  const read = stepSchema.safeParse(step(values));
  if (read.success) return {};
  return Object.fromEntries(read.error.issues.map(({ path, message }) => [path.join("."), message]));
}

const adds = (overrides: Record<string, unknown> = {}) => ({
  films: [{ change: "adds", side: "front", film: ID, thickness: { value: "5 um" }, ...overrides }],
});

describe("a step's form", () => {
  it("takes the least that a step needs, blank meaning nothing", () => {
    const read = stepSchema.parse(step({ holdTime: "", siliconAfter: { value: "" } }));
    expect(read).toMatchObject({
      peakTemperature: 298.15,
      holdTime: null,
      equipment: null,
      exposures: [],
      siliconAfter: null,
      films: [],
    });
  });

  it("takes the face that a debond lets go, of a debond alone", () => {
    const handling = { debondFace: "back" };
    expect(stepSchema.parse(step({ kind: "debond", handling })).handling.debondFace).toBe("back");
    expect(stepSchema.parse(step({ kind: "debond" })).handling.debondFace).toBeNull();
    expect(faults({ handling })).toEqual({ "handling.debondFace": "Only a debond has it: leave it blank." });
    expect(faults({ kind: "debond", handling: { debondFace: "rim" } })).toEqual({
      "handling.debondFace": "Choose one of the list.",
    });
  });

  it("reads quantities with their units, in any of the usual spellings", () => {
    const read = stepSchema.parse(
      step({
        peakTemperature: "503.15 K",
        holdTime: "2 h",
        siliconAfter: { value: "0,1 mm", tolerance: "3um", source: "supplier" },
      }),
    );
    expect(read.peakTemperature).toBeCloseTo(503.15, 9);
    expect(read.holdTime).toBe(7200);
    expect(read.siliconAfter).toMatchObject({ value: 1e-4, tolerance: 3e-6, source: "supplier", text: "0,1 mm" });
  });

  it.each([
    { peakTemperature: "", says: "Type the peak temperature. Blank is missing, not zero." },
    { peakTemperature: "12 parsecs", says: "“12 parsecs”: parsecs is not a unit of temperature used here." },
    { peakTemperature: "-300 °C", says: "the lowest temperature is" },
    { peakTemperature: "5000 °C", says: "is outside −123 °C to 1200 °C" },
    { peakTemperature: "230", says: "230 what? Type 230 °C or 230 K." },
  ])("says of the temperature '$peakTemperature': $says", ({ peakTemperature, says }) => {
    expect(faults({ peakTemperature })["peakTemperature"]).toContain(says);
  });

  it("refuses silicon at or below zero, and a tolerance that eats it", () => {
    expect(faults({ siliconAfter: { value: "-5 um" } })["siliconAfter.value"]).toContain("is outside 1 µm to 2 mm");
    expect(faults({ siliconAfter: { value: "0 um" } })["siliconAfter.value"]).toContain("is outside");
    expect(faults({ siliconAfter: { value: "20 um", tolerance: "20 um" } })["siliconAfter.tolerance"]).toContain(
      "as large as",
    );
    expect(faults({ siliconAfter: { value: "20 um", tolerance: "19 um" } })).toEqual({});
  });

  it("asks for what the kind of step cannot do without", () => {
    expect(faults({ kind: "bond" })).toEqual({
      carrier: "Choose the carrier that it is bonded to.",
      bondingMaterial: "Choose the bonding material.",
      "bondThickness.value": "Type the thickness of the bond.",
    });
    expect(faults({ kind: "edge trim" })).toEqual({
      "trimWidth.value": "Type how wide the trim is.",
      "trimDepth.value": "Type how deep the trim goes.",
    });
    expect(faults({ kind: "grind" })).toEqual({
      "siliconAfter.value": "Type the silicon that remains after the grind.",
    });
    expect(faults({ kind: "grind", siliconAfter: { value: "100 um" }, groundFaceForce: { value: "-60 N/m" } })).toEqual(
      {},
    );
  });

  it("refuses what the kind of step has no use for, at the field", () => {
    const strays = {
      carrier: ID,
      bondingMaterial: ID,
      bondThickness: { value: "40 um" },
      trimWidth: { value: "0.7 mm" },
      trimDepth: { value: "150 um" },
      groundFaceForce: { value: "-60 N/m" },
    };
    expect(Object.keys(faults(strays)).toSorted()).toEqual(
      [
        "bondThickness.value",
        "bondingMaterial",
        "carrier",
        "groundFaceForce.value",
        "trimDepth.value",
        "trimWidth.value",
      ].toSorted(),
    );
  });

  it("leaves the order of steps to the assessment", () => {
    expect(faults({ kind: "debond" })).toEqual({});
    expect(faults({ kind: "dice", planned: "bare" })).toEqual({});
    expect(faults({ planned: "carrier" })).toEqual({});
  });

  it("asks for film and thickness of what is added", () => {
    expect(faults(adds({ film: "" }))["films.0.film"]).toBe("Choose a film.");
    expect(faults(adds({ thickness: { value: "" } }))["films.0.thickness.value"]).toContain(
      "Blank is missing, not zero",
    );
    expect(faults(adds({ thickness: { value: "-3 um" } }))["films.0.thickness.value"]).toContain(
      "is outside 1 nm to 1 mm",
    );
    expect(faults(adds({ thickness: { value: "1 um", tolerance: "2 um" } }))["films.0.thickness.tolerance"]).toContain(
      "as large",
    );
    expect(faults(adds({ coverage: "120 %" }))["films.0.coverage"]).toContain("is outside 0.01 % to 100 %");
    expect(faults(adds())).toEqual({});
  });

  it("takes a removal whole", () => {
    expect(faults({ films: [{ change: "removes", side: "front", film: ID }] })).toEqual({});
    const part = faults({
      films: [{ change: "removes", side: "front", film: ID, thickness: { value: "1 um" }, coverage: "50 %" }],
    });
    expect(Object.keys(part)).toEqual(["films.0.thickness.value", "films.0.coverage"]);
  });

  it("marks a number without a source as assumed", () => {
    const read = stepSchema.parse(step(adds()));
    expect(read.films[0]?.thickness?.source).toBe("assumed");
  });

  it("says everything that is wrong at once", () => {
    expect(Object.keys(faults({ kind: "bond", peakTemperature: "hot", ...adds({ film: "" }) })).toSorted()).toEqual([
      "bondThickness.value",
      "bondingMaterial",
      "carrier",
      "films.0.film",
      "peakTemperature",
    ]);
    expect(faults({ kind: "grind", siliconAfter: { value: "12 parsecs" } })).toEqual({
      "siliconAfter.value": expect.stringContaining("parsecs"),
    });
    expect(faults({ films: "x" })).toHaveProperty("films");
    expect(faults({ films: [undefined, "x"], siliconAfter: "x", trimDepth: [] })).not.toEqual({});
    expect(stepSchema.safeParse(null).success).toBe(false);
  });

  it("keeps forms from filling the database", () => {
    const films = Array.from({ length: 21 }, () => adds().films[0]);
    expect(faults({ films })["films"]).toContain("at most 20 films");
    expect(faults({ title: "x".repeat(121) })["title"]).toContain("under 120 characters");
    expect(faults({ kind: "fly" })["kind"]).toBe("Choose the kind of step.");
    expect(faults({ exposures: ["moonlight"] })).not.toEqual({});
  });
});

describe("a flow's head", () => {
  const head = { name: "Flow", program: ID, silicon: ID, incomingThickness: { value: "725 um", tolerance: "15 um" } };

  it("needs name, program, silicon and thickness", () => {
    const read = flowSchema.safeParse({});
    expect(read.success).toBe(false);
    const fields = new Set(read.error?.issues.map(({ path }) => path[0]));
    expect(fields).toEqual(new Set(["name", "program", "silicon", "incomingThickness"]));
    expect(flowSchema.safeParse(head).success).toBe(true);
  });

  it("refuses a tolerance as large as the wafer", () => {
    const read = flowSchema.safeParse({ ...head, incomingThickness: { value: "20 um", tolerance: "30 um" } });
    expect(read.error?.issues[0]?.path).toEqual(["incomingThickness", "tolerance"]);
  });

  it("may name a stack, a carrier and a bonding material, or none", () => {
    expect(newFlowSchema.parse(head)).toMatchObject({ stack: null, carrier: null, bondingMaterial: null });
    expect(newFlowSchema.parse({ ...head, stack: ID, carrier: "" })).toMatchObject({ stack: ID, carrier: null });
    expect(newFlowSchema.safeParse({ ...head, stack: "x" }).success).toBe(false);
  });
});

describe("how a step is run", () => {
  const PROFILE = "0 25; 30 230; 60 230; 90 25";
  const run = (handling: Record<string, unknown>, rest: Record<string, unknown> = {}) =>
    stepSchema.parse(step({ handling, ...rest }));

  it("takes peak and time at peak from a profile, whatever the fields say", () => {
    const wanted = {
      peakTemperature: expect.closeTo(503.15, 9) as number,
      holdTime: expect.closeTo(1887.8, 1) as number,
    };
    expect(run({ profile: PROFILE }, { peakTemperature: "", holdTime: "" })).toMatchObject(wanted);
    expect(run({ profile: PROFILE }, { holdTime: "5 min" })).toMatchObject(wanted);
    expect(run({ profile: PROFILE }).handling.profile).toHaveLength(4);
  });

  it("asks for a peak where there is no profile, and says where a profile is wrong", () => {
    expect(faults({ peakTemperature: "" })).toEqual({
      peakTemperature: "Type the peak temperature. Blank is missing, not zero.",
    });
    expect(faults({ peakTemperature: "", handling: { profile: "0 25; 30,150" } })).toEqual({
      "handling.profile": "Point 2: “30,150” is one number with decimals or two: type minutes, a blank and °C.",
    });
    expect(faults({ handling: { profile: "x".repeat(3000) } })).toHaveProperty(["handling.profile"]);
  });

  it("takes machine, recipe and side up, blank meaning nothing", () => {
    expect(run({ machine: " oven 3 ", recipe: "", sideUp: "back side" }).handling).toMatchObject({
      machine: "oven 3",
      recipe: null,
      sideUp: "back side",
    });
    expect(faults({ handling: { sideUp: "edge" } })).toEqual({ "handling.sideUp": "Choose one of the list." });
    expect(faults({ handling: { machine: "m".repeat(61), recipe: "r".repeat(121) } })).toEqual({
      "handling.machine": "Keep it under 60 characters.",
      "handling.recipe": "Keep it under 120 characters.",
    });
  });

  it("takes a piece of a carrier at a bond only", () => {
    expect(faults({ handling: { carrierPiece: ID } })).toEqual({
      "handling.carrierPiece": "Only a bond has it: leave it blank.",
    });
    expect(faults({ handling: { carrierPiece: "K-12" } })).toEqual({
      "handling.carrierPiece": "Choose one of the list.",
    });
  });
});
