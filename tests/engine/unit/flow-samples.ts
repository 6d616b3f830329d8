import { assessFlow } from "#app/engine/flow/assess.ts";
import type {
  BondingMaterialInput,
  CarrierInput,
  EquipmentInput,
  FilmAddition,
  FilmInput,
  FlowInput,
  StepInput,
} from "#app/engine/flow/model.ts";
import type { Resistances } from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import { defaultLimits, type SiteLimits } from "#app/engine/rules/limits.ts";

/** Small flows for the tests of single rules. Everything SI; what a test does not name does not matter to it. */

export const um = (micrometres: number) => micrometres / 1e6;
export const celsius = (temperature: number) => temperature + 273.15;

export const exact = (value: number, tolerance: number | null = null): Measured => ({
  value,
  tolerance,
  source: "measured here",
});

export function tool(overrides: Partial<EquipmentInput> = {}): EquipmentInput {
  return {
    id: "tool",
    name: "Tool",
    warpLimitEdgesUp: exact(um(1000)),
    warpLimitEdgesDown: exact(um(1000)),
    leastUnsupportedThickness: null,
    atPeak: "held",
    largestDiameter: exact(0.3),
    ...overrides,
  };
}

export function film(overrides: Partial<FilmInput> = {}): FilmInput {
  return {
    id: "film",
    name: "Film",
    kind: "inorganic",
    youngsModulus: exact(70e9),
    poissonsRatio: exact(0.2),
    expansion: exact(2e-6),
    yieldStress: null,
    temperatureLimit: null,
    ...overrides,
  };
}

export function addition(overrides: Partial<FilmAddition> = {}): FilmAddition {
  return { side: "front", film: film(), thickness: exact(um(1)), stress: exact(100e6), coverage: 1, ...overrides };
}

export function carrier(overrides: Partial<CarrierInput> = {}): CarrierInput {
  return {
    id: "carrier",
    name: "Silicon carrier",
    material: "silicon",
    thickness: exact(um(725)),
    diameter: 0.2,
    youngsModulus: exact(130e9),
    poissonsRatio: exact(0.28),
    expansion: null,
    temperatureLimit: exact(celsius(400)),
    thicknessVariation: exact(um(0.5)),
    passesInfrared: true,
    ...overrides,
  };
}

const resists = { word: "resists" } as const;
export const STANDS_ALL: Resistances = {
  vacuum: resists,
  solvent: resists,
  acid: resists,
  base: resists,
  ultraviolet: resists,
};

export function adhesive(overrides: Partial<BondingMaterialInput> = {}): BondingMaterialInput {
  return {
    id: "adhesive",
    name: "Adhesive",
    effectiveModulus: exact(0.1e9),
    poissonsRatio: exact(0.38),
    expansionBelow: exact(60e-6),
    expansionAbove: exact(180e-6),
    softening: null,
    flows: false,
    bondTemperature: exact(celsius(150)),
    temperatureLimit: exact(celsius(250)),
    release: "laser through glass",
    releaseTemperature: exact(celsius(25)),
    resistances: STANDS_ALL,
    thicknessVariationShare: exact(0.02),
    ...overrides,
  };
}

/** A step that does nothing at room temperature, held by nothing. */
export function step(overrides: Partial<StepInput> = {}): StepInput {
  return {
    kind: "measure",
    title: "Measure",
    peakTemperature: celsius(25),
    holdTime: null,
    equipment: tool(),
    exposures: [],
    planned: "bare",
    siliconAfter: null,
    adds: [],
    removes: [],
    edgeTrim: null,
    bond: null,
    groundFaceForce: null,
    ...overrides,
  };
}

export const bondStep = (overrides: Partial<StepInput> = {}, material = adhesive(), onto = carrier()): StepInput =>
  step({
    kind: "bond",
    title: "Bond",
    peakTemperature: celsius(150),
    planned: "carrier",
    bond: { carrier: onto, material, thickness: exact(um(40)) },
    ...overrides,
  });

export const tapeStep = (overrides: Partial<StepInput> = {}): StepInput =>
  step({ kind: "laminate tape", title: "Laminate tape", planned: "grinding tape", ...overrides });

export const grindStep = (micrometres: number, tolerance: number | null, overrides: Partial<StepInput> = {}) =>
  step({
    kind: "grind",
    title: "Grind",
    planned: "grinding tape",
    siliconAfter: exact(um(micrometres), tolerance === null ? null : um(tolerance)),
    ...overrides,
  });

export const frameStep = (overrides: Partial<StepInput> = {}): StepInput =>
  step({ kind: "mount on frame", title: "Mount on frame", planned: "film frame", ...overrides });

export const debondStep = (overrides: Partial<StepInput> = {}): StepInput =>
  step({ kind: "debond", title: "Debond", planned: "film frame", ...overrides });

export function flow(
  steps: StepInput[],
  {
    thickness = 725,
    tolerance = 0,
    diameter = 0.2,
  }: { thickness?: number; tolerance?: number | null; diameter?: number } = {},
): FlowInput {
  return {
    name: "Flow",
    wafer: {
      name: "Silicon (001)",
      diameter,
      orientation: "100",
      thickness: exact(um(thickness), tolerance === null ? null : um(tolerance)),
    },
    steps,
  };
}

/** Edge trim and stress relief around a grind, for flows in which nothing but one thing is wrong. */
export const trimStep = (overrides: Partial<StepInput> = {}): StepInput =>
  step({ kind: "edge trim", title: "Trim", edgeTrim: { width: exact(7e-4), depth: exact(um(200)) }, ...overrides });

export const reliefStep = (overrides: Partial<StepInput> = {}): StepInput =>
  step({ kind: "stress relief", title: "Relieve", planned: "grinding tape", ...overrides });

/** What one rule finds at one step (from 1; by default the last). */
export function findings(
  input: FlowInput,
  rule: number,
  { at = input.steps.length, limits = defaultLimits() }: { at?: number; limits?: SiteLimits } = {},
): Finding[] {
  return assessFlow(input, limits).findings.filter((found) => found.rule === rule && found.step === at);
}

/** Outcomes of the same. */
export const outcomes = (...of: Parameters<typeof findings>) => findings(...of).map(({ outcome }) => outcome);
