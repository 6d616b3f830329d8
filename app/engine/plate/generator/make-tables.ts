import type { ShapeTable } from "../table/shape-table.ts";
import { buildTable, solveFamily } from "./build-table.ts";
import { ISOTROPIC_SIZE, isotropicFamilies, SILICON_SIZE, siliconFamilies } from "./families.ts";
import type { Keep } from "./keep.ts";

/** The table of isotropic plates; `progress` is told what is solved. */
export function makeIsotropicTable(keep: Keep, progress: (done: string) => void): ShapeTable {
  const families = isotropicFamilies().map((family) => {
    const name = `ν = ${family.poissonsRatio.toFixed(4)}`;
    const solved = keep(`isotropic, ${name}`, () => solveFamily(family, ISOTROPIC_SIZE));
    progress(`${name}, ${solved.states.length} shapes`);
    return solved;
  });
  return buildTable(families, ISOTROPIC_SIZE);
}

/** The tables of silicon (001). */
export function makeSiliconTables(
  keep: Keep,
  progress: (done: string) => void,
): { soft: ShapeTable; hard: ShapeTable } {
  const { soft, hard } = siliconFamilies();
  const table = (name: string, family: typeof soft) => {
    const solved = keep(`silicon, ${name}`, () => solveFamily(family, SILICON_SIZE));
    progress(`${name}, ${solved.states.length} shapes`);
    return buildTable([solved], SILICON_SIZE);
  };
  return { soft: table("<100>", soft), hard: table("<110>", hard) };
}
