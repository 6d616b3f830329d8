import { existsSync, readFileSync } from "node:fs";
import { basename, join } from "node:path";
import { root } from "./project.mjs";

/**
 * @typedef {{ version?: string, integrity?: string, link?: boolean, optional?: boolean, devOptional?: boolean }} LockedPackage
 */

/**
 * @param {string} file a package-lock.json, or the one npm leaves in node_modules when an installation is complete
 * @returns {Record<string, LockedPackage>} by place in the project
 */
function lockedPackages(file) {
  const { packages } = JSON.parse(readFileSync(file, "utf8"));
  // The project itself, which only the first of the two files lists.
  delete packages[""];
  return packages;
}

/** Whether node_modules holds exactly what package-lock.json asks for; packages for other machines may be missing. */
function isInstalled() {
  const installedFile = join(root, "node_modules", ".package-lock.json");
  if (!existsSync(installedFile)) return false;
  const locked = lockedPackages(join(root, "package-lock.json"));
  const installed = lockedPackages(installedFile);
  return (
    Object.entries(locked).every(([place, entry]) => installed[place] || entry.optional || entry.devOptional) &&
    Object.entries(installed).every(
      ([place, entry]) => locked[place]?.version === entry.version && locked[place]?.integrity === entry.integrity,
    )
  );
}

/**
 * Installs the packages of package-lock.json when they are missing or it has changed.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 */
export async function ensureDependencies(keeper) {
  if (isInstalled()) return;
  console.log("Installing packages…");
  // The npm that runs this script, else the one in PATH.
  const npm = process.env.npm_execpath;
  const [program, ...first] =
    npm && basename(npm) === "npm-cli.js" ? [process.execPath, npm] : /** @type {[string]} */ (["npm"]);
  // Building needs the development packages too, even where the environment says production.
  await keeper.run(program, [...first, "ci", "--include=dev", "--no-audit", "--no-fund"], {
    cwd: root,
    failure: "The packages could not be installed: npm ci failed.",
  });
}
