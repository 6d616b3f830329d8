/**
 * `npm run test:reference`: the outside check. The engine's answers to the cases of tests/reference/cases.json beside those
 * of NumPy, SciPy and a general finite-element program, which Debian brings; what passed and failed stands on the last line.
 *
 * The solver works in a temporary folder, which is removed.
 */
import { execFileSync } from "node:child_process";
import { closeSync, existsSync, mkdirSync, mkdtempSync, openSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Checks } from "./checks.mjs";
import { runCommand } from "./command.mjs";
import { installDebianPackages } from "./debian.mjs";
import { ensureDependencies } from "./dependencies.mjs";
import { checkNodeVersion } from "./node-version.mjs";
import { root } from "./project.mjs";
import { Sentence, printFailure } from "./sentence.mjs";

const python = "/usr/bin/python3";
const solver = "/usr/bin/ccx";
const packages = ["calculix-ccx", "python3-numpy", "python3-scipy"];
const sources = join(root, "tests", "reference");

/** Whether Debian's programs are there. */
function hasTools() {
  if (!existsSync(python) || !existsSync(solver)) return false;
  try {
    execFileSync(python, ["-Bs", "-c", "import numpy, scipy.integrate"], { stdio: "ignore" });
    return true;
  } catch {
    return false;
  }
}

/** @param {import("./keeper.mjs").Keeper} keeper */
async function ensureTools(keeper) {
  if (hasTools()) return;
  await installDebianPackages(keeper, "CalculiX with NumPy and SciPy", packages);
  if (!hasTools()) throw new Sentence(`Debian's packages ${packages.join(", ")} brought no ${solver} or no NumPy.`);
}

/**
 * @param {Checks} checks
 * @param {string} file where the engine's answers go
 */
async function askEngine(checks, file) {
  const output = openSync(file, "w");
  const args = ["--import", "tsx", join(sources, "engine-cases.ts")];
  const code = await checks.program(args, { stdio: ["ignore", output, "inherit"] });
  closeSync(output);
  if (code !== 0) throw new Sentence("The engine could not answer the cases of the outside check.");
}

/**
 * @param {Checks} checks
 * @param {string} folder
 * @returns {Promise<import("./tally.mjs").Tally>}
 */
async function compare(checks, folder) {
  const [engine, work, report] = ["engine.json", "solver", "report.json"].map((name) => join(folder, name));
  await askEngine(checks, engine);
  mkdirSync(work);
  // Debian's own Python and packages, and nothing left behind in the project.
  await checks.keeper.outcome(python, ["-Bs", join(sources, "run.py"), engine, work, report], { env: checks.env });
  if (!existsSync(report)) throw new Sentence("The outside check did not come to its end.");
  return JSON.parse(readFileSync(report, "utf8"));
}

try {
  checkNodeVersion();
  const folder = mkdtempSync(join(tmpdir(), "planeward-reference-"));
  await runCommand(join(folder, "run.json"), async (keeper) => {
    keeper.removeAtEnd(folder);
    const checks = new Checks(keeper, process.env);
    const isReady = await checks.need("packages", async () => {
      await ensureDependencies(keeper);
      await ensureTools(keeper);
      return true;
    });
    if (isReady) await checks.count("outside check", () => compare(checks, folder));
    checks.print();
    return checks.sum().failed ? 1 : 0;
  });
} catch (error) {
  printFailure(error);
  process.exitCode = 1;
}
