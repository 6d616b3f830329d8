import type { SolventFamily } from "#app/engine/flow/handling-inputs.ts";
import type { CarrierMaterial, ReleaseMethod } from "#app/engine/flow/model.ts";
import type { CarrierUnitState } from "#app/lib/carrier-units.ts";
import type { BondingMaterialHandlingValues } from "#app/schemas/library-handling.ts";

/** Carriers of the invented pilot line: µm, mm, GPa, ppm/K (null: silicon's own curve), kg/m³, °C. */
export interface DemoCarrier {
  name: string;
  material: CarrierMaterial;
  thickness: number;
  diameter: number;
  youngsModulus: number;
  poissonsRatio: number;
  expansion: number | null;
  density: number;
  thicknessVariation: number;
  passesUltraviolet: boolean;
  perforated: boolean;
  limit: number;
  reuseLimit: number;
  pieces?: DemoPiece[];
}

/** One piece of a carrier, by its mark. */
interface DemoPiece {
  mark: string;
  uses: number;
  state: CarrierUnitState;
  lastUsedOn: string | null;
}

export const DEMO_CARRIERS: DemoCarrier[] = [
  {
    name: "Silicon carrier 775 µm",
    material: "silicon",
    thickness: 775,
    diameter: 300,
    youngsModulus: 130.0,
    poissonsRatio: 0.2786,
    expansion: null,
    density: 2329,
    thicknessVariation: 1.0,
    passesUltraviolet: false,
    perforated: false,
    limit: 400,
    reuseLimit: 50,
    pieces: [
      { mark: "S775-0102", uses: 31, state: "in use", lastUsedOn: "2026-11-20" },
      { mark: "S775-0107", uses: 14, state: "cleaned", lastUsedOn: "2026-11-02" },
    ],
  },
  {
    name: "Glass carrier 3.0 ppm",
    material: "glass",
    thickness: 700,
    diameter: 300,
    youngsModulus: 74.0,
    poissonsRatio: 0.22,
    expansion: 3.0,
    density: 2450,
    thicknessVariation: 1.5,
    passesUltraviolet: true,
    perforated: false,
    limit: 400,
    reuseLimit: 20,
    pieces: [
      { mark: "G30-0411", uses: 7, state: "in use", lastUsedOn: "2026-11-18" },
      { mark: "G30-0412", uses: 12, state: "cleaned", lastUsedOn: "2026-11-09" },
      { mark: "G30-0419", uses: 20, state: "cleaned", lastUsedOn: "2026-10-30" },
      { mark: "G30-0427", uses: 20, state: "scrapped", lastUsedOn: "2026-10-12" },
      { mark: "G30-0433", uses: 0, state: "cleaned", lastUsedOn: null },
    ],
  },
  {
    name: "Glass carrier 3.3 ppm",
    material: "glass",
    thickness: 700,
    diameter: 300,
    youngsModulus: 74.0,
    poissonsRatio: 0.22,
    expansion: 3.3,
    density: 2450,
    thicknessVariation: 1.5,
    passesUltraviolet: true,
    perforated: false,
    limit: 400,
    reuseLimit: 20,
  },
  {
    name: "Glass carrier 7.2 ppm",
    material: "glass",
    thickness: 1100,
    diameter: 300,
    youngsModulus: 73.0,
    poissonsRatio: 0.23,
    expansion: 7.2,
    density: 2500,
    thicknessVariation: 3.0,
    passesUltraviolet: true,
    perforated: false,
    limit: 400,
    reuseLimit: 15,
  },
  {
    name: "Perforated glass carrier 3.3 ppm",
    material: "glass",
    thickness: 700,
    diameter: 300,
    youngsModulus: 60.0,
    poissonsRatio: 0.22,
    expansion: 3.3,
    density: 2230,
    thicknessVariation: 3.0,
    passesUltraviolet: true,
    perforated: true,
    limit: 400,
    reuseLimit: 10,
  },
];

/** Bonding materials of the invented pilot line: GPa, ppm/K, °C, µm. */
export interface DemoBondingMaterial {
  name: string;
  effectiveModulus: number;
  dataSheetModulus: number;
  poissonsRatio: number;
  expansionBelow: number;
  expansionAbove: number;
  softening: number | null;
  flows: boolean;
  bond: number;
  limit: number;
  thickness: [number, number];
  thicknessVariation: number;
  release: ReleaseMethod;
  releaseAt: number;
  thermalCycles: number | null;
  vacuum: string;
  solvent: string;
  acid: string;
  base: string;
  /** those words as the handling rules take them; weight loss that is only given as 'less than' stays out where a limit lies on it */
  stands: Partial<Pick<BondingMaterialHandlingValues, "vacuum" | "solvent" | "acid" | "base">>;
  attackedBy?: SolventFamily[];
  /** °C */
  vacuumLimit?: number;
  /** fraction */
  weightLoss?: number;
}

const RESISTS = { word: "resists" } as const;
const ATTACKED = { word: "attacked" } as const;
const MINUTE = 60;

export const DEMO_BONDING_MATERIALS: DemoBondingMaterial[] = [
  {
    name: "Thermoplastic slide adhesive A",
    effectiveModulus: 0.15,
    dataSheetModulus: 1.6,
    poissonsRatio: 0.38,
    expansionBelow: 60,
    expansionAbove: 190,
    softening: 120,
    flows: true,
    bond: 180,
    limit: 200,
    thickness: [10, 40],
    thicknessVariation: 5,
    release: "thermal slide",
    releaseAt: 200,
    thermalCycles: null,
    vacuum: "ok below 180 °C, weight loss < 0.5 %",
    solvent: "dissolved by its remover",
    acid: "ok",
    base: "ok",
    stands: { vacuum: RESISTS, solvent: RESISTS, acid: RESISTS, base: RESISTS },
    attackedBy: ["bonding material remover"],
    vacuumLimit: 180,
  },
  {
    name: "Laser-release adhesive B",
    effectiveModulus: 0.15,
    dataSheetModulus: 1.2,
    poissonsRatio: 0.38,
    expansionBelow: 65,
    expansionAbove: 180,
    softening: 150,
    flows: false,
    bond: 180,
    limit: 280,
    thickness: [20, 80],
    thicknessVariation: 4,
    release: "laser through glass",
    releaseAt: 25,
    thermalCycles: 5,
    vacuum: "ok to 250 °C, weight loss < 0.3 %",
    solvent: "resists litho solvents",
    acid: "ok",
    base: "ok 30 min",
    stands: { vacuum: RESISTS, solvent: RESISTS, acid: RESISTS, base: { ...RESISTS, longest: 30 * MINUTE } },
    vacuumLimit: 250,
    weightLoss: 0.003,
  },
  {
    name: "Peel adhesive C with release layer",
    effectiveModulus: 0.005,
    dataSheetModulus: 0.005,
    poissonsRatio: 0.49,
    expansionBelow: 250,
    expansionAbove: 250,
    softening: null,
    flows: false,
    bond: 150,
    limit: 250,
    thickness: [30, 100],
    thicknessVariation: 5,
    release: "mechanical peel",
    releaseAt: 25,
    thermalCycles: 3,
    vacuum: "ok to 200 °C",
    solvent: "swells in hydrocarbon solvents",
    acid: "ok",
    base: "ok",
    stands: { vacuum: RESISTS, solvent: RESISTS, acid: RESISTS, base: RESISTS },
    attackedBy: ["hydrocarbon"],
    vacuumLimit: 200,
  },
  {
    name: "Light-cured adhesive D",
    effectiveModulus: 0.1,
    dataSheetModulus: 0.8,
    poissonsRatio: 0.4,
    expansionBelow: 100,
    expansionAbove: 200,
    softening: 80,
    flows: false,
    bond: 25,
    limit: 150,
    thickness: [20, 60],
    thicknessVariation: 6,
    release: "laser through glass then peel",
    releaseAt: 25,
    thermalCycles: 2,
    vacuum: "not above 120 °C",
    solvent: "swells in ketones",
    acid: "ok",
    base: "attacked > 10 min",
    stands: { vacuum: RESISTS, solvent: RESISTS, acid: RESISTS, base: { ...ATTACKED, longest: 10 * MINUTE } },
    attackedBy: ["ketone"],
    vacuumLimit: 120,
  },
  {
    name: "Solvent-release adhesive E",
    effectiveModulus: 0.15,
    dataSheetModulus: 1.5,
    poissonsRatio: 0.38,
    expansionBelow: 60,
    expansionAbove: 190,
    softening: 140,
    flows: true,
    bond: 170,
    limit: 200,
    thickness: [10, 30],
    thicknessVariation: 5,
    release: "solvent through perforated carrier",
    releaseAt: 40,
    thermalCycles: null,
    vacuum: "ok below 180 °C",
    solvent: "dissolves: no solvent step while bonded",
    acid: "ok",
    base: "ok",
    stands: { vacuum: RESISTS, solvent: ATTACKED, acid: RESISTS, base: RESISTS },
    vacuumLimit: 180,
  },
  {
    name: "Wax F",
    effectiveModulus: 0.01,
    dataSheetModulus: 0.5,
    poissonsRatio: 0.4,
    expansionBelow: 150,
    expansionAbove: 300,
    softening: 60,
    flows: true,
    bond: 90,
    limit: 80,
    thickness: [5, 20],
    thicknessVariation: 10,
    release: "thermal slide",
    releaseAt: 90,
    thermalCycles: null,
    vacuum: "not",
    solvent: "dissolves",
    acid: "ok",
    base: "ok",
    stands: { vacuum: ATTACKED, solvent: ATTACKED, acid: RESISTS, base: RESISTS },
  },
];
