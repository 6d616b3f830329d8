/**
 * `npm run plate-table`: solves the free plate in full, fits the tables of the engine to it, solves several hundred shapes
 * between the tables' points with a finer basis, prints the errors and stores both. A quarter of an hour on one core; what is solved
 * is kept under node_modules/.cache, from where a run that was cut short goes on. Raise GENERATOR after a change of the solver.
 * The files that it writes are part of the project; nothing of the engine imports the generator.
 */
import { appendFileSync, existsSync, mkdirSync, readFileSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { GENERATOR } from "./build-table.ts";
import { convergence } from "./convergence.ts";
import { makeIsotropicTable, makeSiliconTables } from "./make-tables.ts";
import { offGridPoints, OFF_GRID_PLAN } from "./off-grid.ts";
import { fixtureOf, pointsOf } from "./off-grid-fixture.ts";
import { errorsText, tableText } from "./table-text.ts";

const inTable = (name) => fileURLToPath(new URL(`../table/${name}`, import.meta.url));
const fixture = fileURLToPath(new URL("../../../../fixtures/plate-shapes.json", import.meta.url));
const say = (line) => process.stdout.write(`${line}\n`);

const cache = fileURLToPath(new URL("../../../../node_modules/.cache/", import.meta.url));
const kept = `${cache}plate-table-${GENERATOR}.jsonl`;
mkdirSync(cache, { recursive: true });
// A last line that was cut short was not kept.
const whole = existsSync(kept) ? readFileSync(kept, "utf8").split("\n").slice(0, -1) : [];
writeFileSync(kept, whole.map((line) => `${line}\n`).join(""));
const known = new Map(whole.map((line) => JSON.parse(line)));
const keep = (name, make) => {
  if (!known.has(name)) {
    known.set(name, make());
    appendFileSync(kept, `${JSON.stringify([name, known.get(name)])}\n`);
  }
  return known.get(name);
};

say("Convergence, ν = 0.28: degree, critical load, bow and centre curvature across the roll at 5 and 20 times that");
for (const row of convergence()) say(row.map((value) => String(value).padStart(10)).join(""));

const isotropic = makeIsotropicTable(keep, (done) => say(`isotropic plates: ${done}`));
writeFileSync(
  inTable("isotropic.ts"),
  tableText("ISOTROPIC", "Shapes of isotropic free plates, ν from 0 to 0.5.", isotropic),
);
const silicon = makeSiliconTables(keep, (done) => say(`silicon (001): ${done}`));
const about = "Shapes of free wafers of silicon (001), rolled about <100> (soft) and about <110> (hard).";
writeFileSync(inTable("silicon-100.ts"), tableText("SILICON_100", about, silicon));

const points = offGridPoints(OFF_GRID_PLAN, keep, (done, total) => {
  if (done % 25 === 0) say(`shapes between the points of the tables: ${done} of ${total}`);
});
writeFileSync(fixture, fixtureOf(points));
// Only now, so that the check reads the tables just written, at the fixture's own precision.
const { errorsByMaterial, onsetErrors } = await import("./check.ts");
const errors = errorsByMaterial(pointsOf(fixtureOf(points)));
const onset = onsetErrors(20);
writeFileSync(inTable("errors.ts"), errorsText(GENERATOR, errors, onset));
say(JSON.stringify({ onset, ...errors }, null, 2));
