import { DIMENSIONS, type DimensionDefinition } from "../dimensions.ts";
import { convert } from "./mathjs-unit.ts";

/** Every unit of the dimensions by the package's name, with the SI unit of its dimension. */
function bases(): [base: string, si: string][] {
  const found = Object.values<DimensionDefinition>(DIMENSIONS).flatMap(({ si, units }) =>
    units.flatMap(({ base }): [string, string][] => (base === null || si === null ? [] : [[base, si]])),
  );
  return [...new Map(found)];
}

/** The step of a scale that does not begin at absolute zero, as a unit that does. */
const STEPS: Record<string, string> = { degC: "K", degF: "degR" };

/** Text of the table of factors, a TypeScript file. */
export function factorsText(): string {
  const sizes = bases().map(([base, si]) => ({
    base,
    zero: convert(0, base, si),
    size: convert(1, STEPS[base] ?? base, si),
  }));
  const name = (base: string) => (/^\w+$/.test(base) ? base : JSON.stringify(base));
  const entry = (base: string, value: number) => `  ${name(base)}: ${value},`;
  return [
    "/* Made by `npm run unit-table` from the units package; not to be edited. */",
    "",
    "/** How many of its dimension's SI unit each unit is, by the package's name. */",
    "export const FACTORS: Readonly<Record<string, number>> = {",
    ...sizes.map(({ base, size }) => entry(base, size)),
    "};",
    "",
    "/** Where the scales that do not begin at absolute zero have their zero, K. */",
    "export const ZEROS: Readonly<Record<string, number>> = {",
    ...sizes.filter(({ zero }) => zero !== 0).map(({ base, zero }) => entry(base, zero)),
    "};",
    "",
  ].join("\n");
}
