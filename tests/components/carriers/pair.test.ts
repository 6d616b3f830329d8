import { describe, expect, it } from "vitest";
import { pairCut } from "#app/components/carriers/pair-cut.ts";
import { pairAnswer, whyPairBow } from "#app/components/carriers/pair-words.ts";
import { BLANK_CARRIER_HANDLING } from "#app/lib/blank-handling.ts";
import type { TriedPair } from "#app/lib/pair-trial.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";

/** Lengths in m, temperatures in K; bow: standard, device side up. The pair lies carrier down, back side up. */
const stated = (value: number) => ({ value, tolerance: null, source: "supplier" as const });

const PAIR: TriedPair = {
  lies: "edges down",
  regime: "linear",
  warp: 343e-6,
  bow: -343e-6,
  rollRadius: null,
  uncertainty: 60e-6,
  perTenthPpm: 128e-6,
  locksAt: 423.15,
  budget: [],
  wafer: { name: "Silicon (001), 300 mm", diameter: 0.3, thickness: 775e-6 },
  siliconLeft: 50e-6,
  material: { name: "Adhesive B", effectiveModulus: { ...stated(0.15e9), source: "assumed" }, bondTemperature: 453.15 },
  bondThickness: 50e-6,
  cannotRelease: null,
};

const CARRIER: LibraryRecords["carrier"] = {
  id: "c",
  name: "Glass carrier 3.0 ppm",
  note: "",
  material: "glass",
  diameter: 0.3,
  thickness: stated(700e-6),
  youngsModulus: stated(74e9),
  poissonsRatio: stated(0.22),
  expansion: { ...stated(3e-6), tolerance: 0.1e-6 },
  expansionRange: "25 to 150 °C mean",
  meanExpansionFrom: null,
  meanExpansionTo: null,
  expansionCurve: null,
  density: stated(2450),
  thicknessVariation: stated(1.5e-6),
  temperatureLimit: stated(673.15),
  passesUltraviolet: true,
  passesInfrared: true,
  perforated: false,
  reuseLimit: 20,
  handling: BLANK_CARRIER_HANDLING,
};

const plain = (text: string) => text.replaceAll("\u00A0", " ");

describe("the words of a pair", () => {
  it("say the shape as loaded, with its expanded uncertainty", () => {
    expect(plain(pairAnswer(PAIR))).toBe(
      "Bonded to 50 µm of blank silicon with Adhesive B, the pair lies edges down, 340 ± 120 µm.",
    );
  });

  it("say what a tenth of a ppm does, and that no window of ppm decides", () => {
    const words = plain(whyPairBow(PAIR));
    expect(words).toContain("never by a window of ppm");
    expect(words).toContain("0.1 ppm/K of the carrier’s expansion moves a 300 mm pair by 128 µm");
  });

  it("give no figure per ppm to a carrier that expands as the wafer does", () => {
    const words = whyPairBow({ ...PAIR, perTenthPpm: null });
    expect(words).toContain("expands as the wafer does");
    expect(words).not.toContain("0.1 ppm/K");
  });

  it("do not dress up a bow of nothing", () => {
    const flat = { ...PAIR, lies: "flat" as const, warp: 1e-10, bow: 0, uncertainty: 2e-8 };
    expect(plain(pairAnswer(flat))).toContain("the pair lies flat within 1 µm.");
    expect(plain(pairAnswer({ ...flat, warp: 9.7e-6, uncertainty: 2e-6 }))).toContain("lies flat, 9.7 ± 4.0 µm.");
  });

  it("never give a bow to a pair that rolls up", () => {
    const rolled = { ...PAIR, lies: "rolls up" as const, regime: "curled" as const, rollRadius: 0.31, warp: 0.012 };
    const words = plain(pairAnswer(rolled));
    expect(words).toContain("rolls up, radius about 0.31 m, and its edges lift 12 mm");
    expect(words).not.toContain("±");
  });
});

describe("the cut of a pair", () => {
  const { layers, top, bottom, shape } = pairCut(CARRIER, PAIR);

  it("lies back side up: silicon, bonding material, carrier", () => {
    expect(layers.map(({ role, kind }) => [role, kind])).toEqual([
      ["silicon", "silicon"],
      ["adhesive", "adhesive"],
      ["carrier", "glass"],
    ]);
    expect([top.words, bottom.words]).toEqual(["Back side, up on the tool", "Carrier, down"]);
  });

  it("is bent as it lies: edges down is a centre that is high as drawn", () => {
    expect(shape?.shape).toEqual({ kind: "bowed", bow: 343e-6 });
    expect(shape).toMatchObject({ deviceSideUp: false, holding: "carrier", note: "edges down, ×200" });
    const edgesUp = pairCut(CARRIER, { ...PAIR, lies: "edges up", bow: 200e-6 });
    expect(edgesUp.shape?.shape).toEqual({ kind: "bowed", bow: -200e-6 });
  });

  it("marks what is assumed, and only that", () => {
    expect(layers.map(({ assumed }) => assumed ?? false)).toEqual([false, true, false]);
  });

  it("draws a rolled pair at its true scale", () => {
    const rolled = pairCut(CARRIER, { ...PAIR, lies: "rolls up", regime: "curled", rollRadius: 0.31 });
    expect(rolled.shape).toMatchObject({ shape: { kind: "rolled", radius: 0.31 }, note: "rolls up, ×1" });
  });
});
