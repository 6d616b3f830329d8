import type { Extent } from "../table/chebyshev.ts";
import { borderRate } from "../table/coordinates.ts";
import type { ShapeTable } from "../table/shape-table.ts";
import { membraneStiffness } from "../shear-ratios.ts";
import { fitEnergy, fitMeasure, MEASURE_FITS, type SolvedFamily } from "./fit.ts";
import { solveStates, type StateFamily } from "./states.ts";

/** Raised with every change that can move a coefficient. */
export const GENERATOR = 1;

/** How finely a table is sampled and how many terms it keeps. */
export interface TableSize {
  along: number;
  across: number;
  energy: Extent;
  measures: Extent;
}

const ENERGY_QUANTUM = 1e-6;
const MEASURE_QUANTUM = 1e-5;

export function solveFamily(family: StateFamily, size: TableSize): SolvedFamily {
  return {
    ...family,
    lambda: membraneStiffness(family.ratios),
    rate: borderRate(family.poissonsRatio),
    states: solveStates(family, size.along, size.across),
  };
}

/** Fits a table to solved families. */
export function buildTable(families: readonly SolvedFamily[], size: TableSize): ShapeTable {
  const rounded = (values: Float64Array, quantum: number) =>
    Array.from(values, (value) => Math.round(value / quantum) + 0);
  return {
    generator: GENERATOR,
    energy: {
      extent: size.energy,
      quantum: ENERGY_QUANTUM,
      values: rounded(fitEnergy(size.energy, families), ENERGY_QUANTUM),
    },
    measures: {
      extent: size.measures,
      quantum: MEASURE_QUANTUM,
      values: MEASURE_FITS.map((fit) => rounded(fitMeasure(size.measures, families, fit), MEASURE_QUANTUM)),
    },
  };
}
