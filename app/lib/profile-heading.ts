import { excerpt } from "./excerpt.ts";
import { ProfileFileError } from "./profile-text.ts";
import { LENGTH_UNITS, type LengthUnit } from "./scan-file.ts";

/** Units of length as heads of columns write them, with the name that this program uses. */
const SPELLINGS: Record<string, string> = {
  m: "m",
  mm: "mm",
  µm: "µm",
  μm: "µm",
  um: "µm",
  micron: "µm",
  microns: "µm",
  nm: "nm",
  cm: "cm",
  pm: "pm",
  Å: "Å",
  angstrom: "Å",
  inch: "inch",
  in: "inch",
  mil: "mil",
};
const ANY = Object.keys(SPELLINGS).join("|");
/** After a blank, comma or underline only what cannot be the end of a word: 'z_nm', not 'lead in' or 'z_m'. */
const TRAILING = Object.keys(SPELLINGS)
  .filter((unit) => !["m", "in"].includes(unit))
  .join("|");
const PATTERNS = [
  new RegExp(`^(${ANY})$`, "u"),
  new RegExp(`[([]\\s*(${ANY})\\s*[)\\]]`, "u"),
  new RegExp(`/\\s*(${ANY})$`, "u"),
  new RegExp(`[\\s_,](${TRAILING})$`, "u"),
];

/** The unit that the head of a column names, such as 'nm' in 'z (nm)', 'z / nm', 'z_nm' or 'nm' alone; null for none. */
export function unitInHead(head: string): string | null {
  for (const pattern of PATTERNS) {
    const unit = pattern.exec(head.trim())?.[1];
    if (unit !== undefined) return SPELLINGS[unit] ?? null;
  }
  return null;
}

const POSITION = /^(?:x|y|r|pos|position|distance|lateral|radius|scan|scan position)(?![\p{L}\d])/iu;
const HEIGHT = /^(?:z|h|height|heights|topography|level|profile|deflection)(?![\p{L}\d])/iu;

/**
 * Holds the heads of the two columns against what the person has said of them; fewer than two say nothing.
 * @param row number of the row, counted from 1
 * @throws ProfileFileError when it names another unit, or height before position
 */
export function checkHeading(
  cells: readonly string[],
  row: number,
  name: string,
  chosen: { positionUnit: LengthUnit; heightUnit: LengthUnit },
): void {
  const [first, second] = cells.map((cell) => cell.trim());
  if (first === undefined || second === undefined) return;
  if (HEIGHT.test(first) && POSITION.test(second))
    throw new ProfileFileError(
      `${name}, row ${row}: the columns are headed “${excerpt(first, 40)}” and “${excerpt(second, 40)}”. Position must come first, then height.`,
    );
  refuseOtherUnit(first, row, name, "position", chosen.positionUnit);
  refuseOtherUnit(second, row, name, "height", chosen.heightUnit);
}

function refuseOtherUnit(
  head: string,
  row: number,
  name: string,
  column: "position" | "height",
  chosen: LengthUnit,
): void {
  const unit = unitInHead(head);
  if (unit === null || unit === chosen) return;
  const remedy = LENGTH_UNITS.some((offered) => offered === unit)
    ? `Choose ${unit}, or the file that is in ${chosen}.`
    : `${unit} is not read here: export the column in ${LENGTH_UNITS.slice(0, -1).join(", ")} or ${LENGTH_UNITS.at(-1)}.`;
  throw new ProfileFileError(
    `${name}, row ${row}: the ${column} column is headed “${excerpt(head, 40)}”, in ${unit}, but ${chosen} is chosen. ${remedy}`,
  );
}
