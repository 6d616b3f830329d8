import { existsSync } from "node:fs";
import { join } from "node:path";
import { packageProgram, root } from "./project.mjs";

/**
 * Types, lint, layout and unused code.
 *
 * @param {import("./checks.mjs").Checks} checks
 */
export async function runStaticChecks(checks) {
  const prettier = ["--config", ".config/prettier.json", "--ignore-path", ".config/prettierignore", "--check", "."];
  const knip = existsSync(join(root, ".config/knip.json")) ? ["--config", ".config/knip.json"] : [];
  // The route types come first: the compiler reads them.
  await checks.run("typegen", [packageProgram("react-router"), "typegen"]);
  await checks.run("tsc", [packageProgram("tsc"), "--noEmit"]);
  await checks.run("eslint", [packageProgram("eslint"), "-c", ".config/eslint.config.js", "--max-warnings", "0", "."]);
  await checks.run("prettier", [packageProgram("prettier"), ...prettier]);
  await checks.run("knip", [packageProgram("knip"), ...knip]);
}
