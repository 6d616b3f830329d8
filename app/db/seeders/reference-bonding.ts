import type { CarrierMaterial, ReleaseMethod } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { celsius, measured, range } from "./measured.ts";

const PRACTICE = "common practice, no source";
const GPa = 1e9;
const ppm = 1e-6;
const um = 1e-6;

const assumed = (value: number, tolerance: number | null, note = PRACTICE) =>
  measured(value, tolerance, "assumed", note);
const practice = (low: number, high: number, unit: number) => range(low * unit, high * unit, "assumed", PRACTICE);

interface ReferenceCarrier {
  name: string;
  material: CarrierMaterial;
  diameter: number;
  thickness: Measured;
  youngsModulus: Measured;
  poissonsRatio: Measured;
  expansion: Measured | null;
  expansionRange: string;
  /** K */
  meanExpansionFrom: number | null;
  meanExpansionTo: number | null;
  expansionCurve: null;
  density: Measured;
  thicknessVariation: Measured;
  passesUltraviolet: boolean;
  passesInfrared: boolean;
}

const glass = (
  name: string,
  diameter: number,
  youngsModulus: Measured,
  poissonsRatio: number,
  expansion: Measured,
  density: Measured,
  /** °C, over which its expansion is a mean */
  [from, to]: [number, number],
): ReferenceCarrier => ({
  name: `${name}, ${diameter * 1000} mm`,
  material: "glass",
  diameter,
  thickness: measured(700 * um, 20 * um, "handbook", "SEMI 3D2, nominal 700 µm (scope read)"),
  youngsModulus,
  poissonsRatio: measured(poissonsRatio, 0.01, youngsModulus.source, youngsModulus.note),
  expansion,
  expansionRange: `${from} to ${to} °C mean`,
  meanExpansionFrom: celsius(from),
  meanExpansionTo: celsius(to),
  expansionCurve: null,
  density,
  thicknessVariation: assumed(2 * um, 1 * um),
  passesUltraviolet: true,
  passesInfrared: true,
});

const SHEET = "glass wafer data sheet, read";

const silicon = (diameter: number, thickness: number): ReferenceCarrier => ({
  name: `Silicon carrier, ${diameter * 1000} mm`,
  material: "silicon",
  diameter,
  thickness: measured(thickness * um, 20 * um, "handbook", "SEMI M1 nominal, from memory of the named publication"),
  youngsModulus: measured(130 * GPa, 1 * GPa, "handbook", "from the elastic constants of silicon, method page"),
  poissonsRatio: measured(0.2785, 0.002, "handbook", "from the elastic constants of silicon, method page"),
  expansion: null,
  expansionRange: "silicon's own curve",
  meanExpansionFrom: null,
  meanExpansionTo: null,
  expansionCurve: null,
  density: measured(2329, 1, "handbook", "from memory of the named publication"),
  thicknessVariation: assumed(1 * um, 0.5 * um),
  passesUltraviolet: false,
  passesInfrared: true,
});

const borosilicate = (diameter: number) =>
  glass(
    "Borosilicate glass",
    diameter,
    measured(62.75 * GPa, 1 * GPa, "handbook", SHEET),
    0.2,
    measured(3.25 * ppm, 0.05 * ppm, "handbook", SHEET),
    measured(2230, 10, "handbook", SHEET),
    [0, 300],
  );

const matched = (diameter: number) =>
  glass(
    "Aluminosilicate glass matched to silicon",
    diameter,
    practice(78, 82, GPa),
    0.19,
    practice(3.3, 3.6, ppm),
    assumed(2500, 40),
    [30, 300],
  );

/** Its mean lies near silicon's between room temperature and the usual bond: the pair stays the flattest. */
const lowExpansion = (diameter: number) =>
  glass(
    "Aluminosilicate glass, low expansion",
    diameter,
    practice(72, 76, GPa),
    0.22,
    practice(2.9, 3.1, ppm),
    assumed(2450, 40),
    [30, 300],
  );

/** Carriers that a new site may start from. */
export const REFERENCE_CARRIERS: ReferenceCarrier[] = [
  silicon(0.2, 725),
  silicon(0.3, 775),
  borosilicate(0.2),
  borosilicate(0.3),
  matched(0.2),
  matched(0.3),
  lowExpansion(0.2),
  lowExpansion(0.3),
];

interface ReferenceBondingMaterial {
  name: string;
  effectiveModulus: Measured;
  dataSheetModulus: Measured | null;
  poissonsRatio: Measured;
  expansionBelow: Measured;
  expansionAbove: Measured;
  softening: Measured | null;
  flows: boolean;
  bondTemperature: Measured;
  temperatureLimit: Measured;
  leastThickness: number;
  mostThickness: number;
  release: ReleaseMethod;
  releaseTemperature: Measured;
}

const CALIBRATE = "common practice, no source; to be calibrated on measured pairs";

/** Classes of temporary bonding material, each with ranges of the trade. */
export const REFERENCE_BONDING_MATERIALS: ReferenceBondingMaterial[] = [
  {
    name: "Thermoplastic, thermal slide (class)",
    effectiveModulus: measured(0.1 * GPa, 0.05 * GPa, "assumed", CALIBRATE),
    dataSheetModulus: practice(1, 2.5, GPa),
    poissonsRatio: assumed(0.38, 0.03),
    expansionBelow: practice(50, 80, ppm),
    expansionAbove: practice(150, 250, ppm),
    softening: assumed(celsius(120), 30),
    flows: true,
    bondTemperature: assumed(celsius(180), 10),
    temperatureLimit: assumed(celsius(200), null),
    leastThickness: 10 * um,
    mostThickness: 30 * um,
    release: "thermal slide",
    releaseTemperature: assumed(celsius(200), 20),
  },
  {
    name: "Laser release on thermoset (class)",
    effectiveModulus: measured(0.1 * GPa, 0.05 * GPa, "assumed", CALIBRATE),
    dataSheetModulus: practice(0.5, 3, GPa),
    poissonsRatio: assumed(0.38, 0.03),
    expansionBelow: practice(40, 80, ppm),
    expansionAbove: practice(150, 200, ppm),
    softening: assumed(celsius(150), 30),
    flows: false,
    bondTemperature: assumed(celsius(180), 10),
    temperatureLimit: assumed(celsius(250), null),
    leastThickness: 20 * um,
    mostThickness: 80 * um,
    release: "laser through glass",
    releaseTemperature: assumed(celsius(25), 5),
  },
  {
    name: "Elastomer with release layer, peel (class)",
    effectiveModulus: measured(0.005 * GPa, 0.004 * GPa, "assumed", CALIBRATE),
    dataSheetModulus: practice(0.001, 0.01, GPa),
    poissonsRatio: assumed(0.49, 0.005),
    expansionBelow: practice(200, 300, ppm),
    expansionAbove: practice(200, 300, ppm),
    softening: null,
    flows: false,
    bondTemperature: assumed(celsius(150), 10),
    temperatureLimit: assumed(celsius(250), null),
    leastThickness: 30 * um,
    mostThickness: 100 * um,
    release: "mechanical peel",
    releaseTemperature: assumed(celsius(25), 5),
  },
  {
    name: "Solvent release, perforated carrier (class)",
    effectiveModulus: measured(0.1 * GPa, 0.05 * GPa, "assumed", CALIBRATE),
    dataSheetModulus: practice(1, 2.5, GPa),
    poissonsRatio: assumed(0.38, 0.03),
    expansionBelow: practice(50, 80, ppm),
    expansionAbove: practice(150, 250, ppm),
    softening: assumed(celsius(140), 30),
    flows: true,
    bondTemperature: assumed(celsius(170), 10),
    temperatureLimit: assumed(celsius(180), null),
    leastThickness: 10 * um,
    mostThickness: 30 * um,
    release: "solvent through perforated carrier",
    releaseTemperature: assumed(celsius(40), 10),
  },
  {
    name: "Wax (class)",
    effectiveModulus: measured(0.01 * GPa, 0.005 * GPa, "assumed", CALIBRATE),
    dataSheetModulus: practice(0.1, 1, GPa),
    poissonsRatio: assumed(0.4, 0.03),
    expansionBelow: practice(80, 200, ppm),
    expansionAbove: practice(200, 400, ppm),
    softening: assumed(celsius(65), 15),
    flows: true,
    bondTemperature: assumed(celsius(90), 10),
    temperatureLimit: assumed(celsius(80), null),
    leastThickness: 5 * um,
    mostThickness: 20 * um,
    release: "thermal slide",
    releaseTemperature: assumed(celsius(90), 10),
  },
];

const nominal = (diameter: number, thickness: number) => ({
  diameter: diameter / 1000,
  thickness: measured(
    thickness * um,
    20 * um,
    "handbook",
    "SEMI M1 nominal thickness; tolerance from memory of the named publication",
  ),
});

/** Nominal wafers: diameter in mm, thickness in µm. */
export const REFERENCE_SILICON = ([["100"], ["111"]] as const).flatMap(([orientation]) =>
  [nominal(100, 525), nominal(150, 675), nominal(200, 725), nominal(300, 775)].map((wafer) => ({
    ...wafer,
    orientation,
    name: `Silicon (${orientation === "100" ? "001" : "111"}), ${Math.round(wafer.diameter * 1000)} mm, ${Math.round(wafer.thickness.value * 1e6)} µm`,
  })),
);
