import { packIntegers } from "../../packed-integers.ts";
import { overBow, type ShapeTable } from "../table/shape-table.ts";
import type { Errors, ErrorsByClass, OnsetErrors } from "./check.ts";

/** Characters of a packed list in a line. */
const WIDTH = 100;

/** A list of integers as packed text, filled into lines. */
function filled(values: readonly number[], indent: string): string {
  const lines = packIntegers(values).match(new RegExp(`.{1,${WIDTH}}`, "g")) ?? [""];
  return lines.map((line) => `${indent}"${line}"`).join(" +\n");
}

function literal(table: ShapeTable, indent: string): string {
  const { energy, measures } = table;
  const inner = `${indent}  `;
  const head = (one: { extent: readonly number[]; quantum: number }) =>
    `${inner}  extent: [${one.extent.join(", ")}],\n${inner}  quantum: ${one.quantum},\n`;
  const lists = overBow(measures.values).map((values) => `${filled(values, `${inner}    `)},\n`);
  return [
    `unpackTable({\n${inner}generator: ${table.generator},\n`,
    `${inner}energy: {\n${head(energy)}${inner}  values:\n${filled(energy.values, `${inner}    `)},\n${inner}},\n`,
    `${inner}measures: {\n${head(measures)}${inner}  values: [\n${lists.join("")}${inner}  ],\n${inner}},\n`,
    `${indent}})`,
  ].join("");
}

/** Source text of a file that holds one table, or several by name. */
export function tableText(name: string, about: string, tables: ShapeTable | Record<string, ShapeTable>): string {
  const several = !("generator" in tables);
  const type = several
    ? `{ ${Object.keys(tables)
        .map((key) => `${key}: ShapeTable`)
        .join("; ")} }`
    : "ShapeTable";
  const body = several
    ? `{\n${Object.entries(tables as Record<string, ShapeTable>)
        .map(([key, table]) => `  ${key}: ${literal(table, "  ")},\n`)
        .join("")}}`
    : literal(tables as ShapeTable, "");
  return `import { unpackTable, type ShapeTable } from "./shape-table.ts";

/**
 * ${about}
 * Made by \`npm run plate-table\`, which also measures the error and writes it into errors.ts: not to be edited.
 */
export const ${name}: ${type} = ${body};
`;
}

/** Two significant digits, rounded up: a bound. */
export function upTo(value: number): number {
  if (value === 0) return 0;
  const unit = 10 ** (Math.floor(Math.log10(value)) - 1);
  return Number((Math.ceil(value / unit - 1e-9) * unit).toPrecision(2));
}

/** Source text of the file that holds the largest errors found, by material and kind of load. */
export function errorsText(generator: number, byMaterial: Record<string, ErrorsByClass>, onset: OnsetErrors): string {
  const entry = ([key, value]: [string, number]) => `      ${key}: ${key === "points" ? value : upTo(value)},\n`;
  const group = ([sort, errors]: [string, Errors]) =>
    `    ${/\W/.test(sort) ? `"${sort}"` : sort}: {\n${Object.entries(errors).map(entry).join("")}    },\n`;
  const material = ([name, classes]: [string, ErrorsByClass]) =>
    `  ${name}: {\n${Object.entries(classes).map(group).join("")}  },\n`;
  return `/**
 * Largest errors of the tables of generator ${generator} at random loads between their own points, each solved in full with a finer
 * basis; what each number means is said at \`Errors\` in generator/check.ts. Made by \`npm run plate-table\`: not to be edited.
 */
export const SHAPE_ERRORS = {
  onset: {
    bowl: ${upTo(onset.bowl)},
    saddle: ${upTo(onset.saddle)},
  },
${Object.entries(byMaterial).map(material).join("")}} as const;
`;
}
