import { describe, expect, it } from "vitest";
import {
  BLANK_CARRIER_HANDLING,
  BLANK_FILM_HANDLING,
  BLANK_MATERIAL_HANDLING,
  BLANK_TOOL_HANDLING,
} from "#app/lib/blank-handling.ts";
import {
  bondingMaterialHandlingOf,
  carrierHandlingOf,
  equipmentHandlingOf,
  filmHandlingOf,
  stressRecordOf,
} from "#app/lib/library-handling.ts";
import {
  bondingMaterialHandling,
  carrierHandling,
  equipmentHandling,
  filmHandling,
} from "#app/schemas/library-handling.ts";
import { property, send, type Sent } from "./forms.ts";

const stated = (value: number) => ({ value, tolerance: null, source: "supplier" as const });

describe("what the rules ask, left blank", () => {
  it("is missing, not no", () => {
    expect(send(carrierHandling, {}).value).toEqual(BLANK_CARRIER_HANDLING);
    expect(send(bondingMaterialHandling, {}).value).toEqual(BLANK_MATERIAL_HANDLING);
    expect(send(equipmentHandling, {}).value).toEqual(BLANK_TOOL_HANDLING);
    expect(send(filmHandling, {}).value).toEqual(BLANK_FILM_HANDLING);
  });

  it("reaches the engine as nothing at all", () => {
    expect(equipmentHandlingOf(BLANK_TOOL_HANDLING)).toEqual({});
    expect(filmHandlingOf(BLANK_FILM_HANDLING)).toEqual({});
    expect(stressRecordOf({ stress: { ...stated(1e6), on: "2026-10-21" }, handling: BLANK_FILM_HANDLING })).toBeNull();
    const always = { thicknessVariationShare: stated(0.05), leastThickness: 20e-6, mostThickness: 80e-6 };
    const material = { ...always, thermalCycles: null, handling: BLANK_MATERIAL_HANDLING };
    expect(bondingMaterialHandlingOf(material)).toEqual(always);
  });
});

describe("a carrier", () => {
  const CARRIER = {
    density: stated(2450),
    thicknessVariation: stated(1.5e-6),
    passesUltraviolet: true,
    passesInfrared: true,
    perforated: false,
    reuseLimit: 20,
  };

  it("tells yes from no from not given", () => {
    const { value } = send(carrierHandling, { conductiveCoating: "yes", seenBySensors: "no", metalInLight: "" });
    expect(value).toEqual({ conductiveCoating: true, seenBySensors: false, metalInLight: null });
    expect(send(carrierHandling, { conductiveCoating: "perhaps" }).errors["conductiveCoating"]?.[0]).toBe(
      "Choose one of the list.",
    );
  });

  it("brings the columns that it had all along, and of the rest what is given", () => {
    const handling = { ...BLANK_CARRIER_HANDLING, conductiveCoating: false };
    expect(carrierHandlingOf({ ...CARRIER, handling })).toEqual({
      density: stated(2450),
      thicknessVariation: stated(1.5e-6),
      passesUltraviolet: true,
      passesInfrared: true,
      perforated: false,
      useLimit: 20,
      conductiveCoating: false,
    });
  });
});

describe("a bonding material", () => {
  const SENT: Sent = {
    "vacuum.word": "resists",
    "base.word": "resists",
    "base.longest": "30 min",
    "acid.word": "attacked",
    "plasma.word": "unknown",
    ...property("vacuumTemperatureLimit", "180 °C"),
    ...property("weightLoss", "0.3 %"),
    ...property("thermalTime", "6 h"),
    ...property("peelForce", "40 N/m"),
    ...property("peelRadius", "60 mm"),
  };

  it("is read in SI; a time belongs to its word", () => {
    const { value, errors } = send(bondingMaterialHandling, SENT);
    expect(errors).toEqual({});
    expect(value).toMatchObject({
      vacuum: { word: "resists" },
      base: { word: "resists", longest: 1800 },
      acid: { word: "attacked" },
      plasma: { word: "unknown" },
      solvent: null,
      vacuumTemperatureLimit: { value: expect.closeTo(453.15, 6) },
      weightLoss: { value: expect.closeTo(0.003, 9) },
      thermalTime: { value: 21_600 },
      peelForce: { value: 40 },
      peelRadius: { value: expect.closeTo(0.06, 9) },
    });
  });

  it.each([
    [{ "acid.word": "", "acid.longest": "10 min" }, "acid.word", "Say what it does for that time"],
    [{ "base.longest": "12 parsecs" }, "base.longest", "parsecs is not a unit of time"],
    [{ "base.longest": "-5 min" }, "base.longest", "outside 1 s to 30 days"],
    [{ "weightLoss.value": "120 %" }, "weightLoss.value", "outside 0 to 100 %"],
    [{ "vacuumTemperatureLimit.value": "180" }, "vacuumTemperatureLimit.value", "180 what?"],
    [{ "peelRadius.value": "0 mm" }, "peelRadius.value", "outside 0.1 mm to 10 m"],
    [{ attackedBy: "water" }, "attackedBy[0]", "Choose from the list."],
  ])("refuses %j", (change, at, words) => {
    expect(send(bondingMaterialHandling, { ...SENT, ...change }).errors[at]?.[0]).toContain(words);
  });

  it("takes one solvent as well as several", () => {
    expect(send(bondingMaterialHandling, { attackedBy: "ketone" }).value?.attackedBy).toEqual(["ketone"]);
    const several = { "attackedBy[0]": "ketone", "attackedBy[1]": "alcohol" };
    expect(send(bondingMaterialHandling, several).value?.attackedBy).toEqual(["ketone", "alcohol"]);
  });

  it("gives the engine its resistances together, and its count of heatings without a source", () => {
    const handling = {
      ...BLANK_MATERIAL_HANDLING,
      base: { word: "resists" as const, longest: 1800 },
      attackedBy: ["ketone" as const],
      remover: "ketone" as const,
    };
    const always = { thicknessVariationShare: stated(0.04), leastThickness: 20e-6, mostThickness: 80e-6 };
    expect(bondingMaterialHandlingOf({ ...always, thermalCycles: 5, handling })).toMatchObject({
      resistances: { base: { word: "resists", longest: 1800 }, attackedBy: ["ketone"] },
      remover: "ketone",
      thermalCycles: { value: 5, source: "assumed" },
      thicknessVariationShare: { value: 0.04 },
    });
  });
});

describe("a tool", () => {
  it("touches a face with something, and only a vacuum chuck has a seal", () => {
    const sent = { clamping: "vacuum", seal: "compliant", contactFace: "back", contactMeans: "pin", ioniser: "no" };
    const { value } = send(equipmentHandling, { ...sent, ...property("weightLimit", "300 g") });
    if (!value) throw new Error("refused");
    expect(equipmentHandlingOf(value)).toMatchObject({
      clamping: "vacuum",
      seal: "compliant",
      contact: { face: "back", means: "pin" },
      ioniser: false,
      weightLimit: { value: 0.3 },
    });
    expect(equipmentHandlingOf(value)).not.toHaveProperty("contactFace");
  });

  it.each([
    [{ contactFace: "back" }, "contactMeans", "what it touches that face with"],
    [{ contactMeans: "pad" }, "contactFace", "the face that it touches"],
    [{ clamping: "boat", seal: "plain" }, "clamping", "Only a vacuum chuck has a seal"],
    [property("sealGap", "1 mm"), "clamping", "Only a vacuum chuck has a seal"],
    [property("weightLimit", "300 µm"), "weightLimit.value", "not of mass"],
    [property("weightLimit", "0 g"), "weightLimit.value", "outside 1 g to 10 kg"],
    [property("slotClearance", "-1 mm"), "slotClearance.value", "outside 0 to 20 mm"],
  ])("refuses %j", (sent, at, words) => {
    expect(send(equipmentHandling, sent as Sent).errors[at]?.[0]).toContain(words);
  });
});

describe("a film", () => {
  it("says what its stress was measured on, with the day of the stress itself", () => {
    const { value } = send(filmHandling, { stressState: "as deposited", stressFilmThickness: "5 µm" });
    if (!value) throw new Error("refused");
    expect(stressRecordOf({ stress: { ...stated(31e6), on: "2026-10-21" }, handling: value })).toEqual({
      on: "2026-10-21",
      state: "as deposited",
      filmThickness: expect.closeTo(5e-6, 12),
    });
  });

  it("melts at its solder's temperature where that is given", () => {
    const { value } = send(filmHandling, property("solderMelting", "221 °C"));
    if (!value) throw new Error("refused");
    expect(filmHandlingOf(value)).toMatchObject({ solderMelting: { value: expect.closeTo(494.15, 6) } });
  });
});
