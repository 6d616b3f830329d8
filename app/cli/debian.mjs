import { existsSync, mkdirSync, readdirSync, rmdirSync, rmSync, writeFileSync } from "node:fs";
import { isRoot } from "./project.mjs";
import { Sentence } from "./sentence.mjs";

/**
 * Installs packages of Debian's when this is root; anybody else is told the command.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {string} product what the reader knows it by
 * @param {string[]} packages
 */
export async function installDebianPackages(keeper, product, packages) {
  if (!existsSync("/usr/bin/apt-get"))
    throw new Sentence(`${product} is not installed, and this is no Debian system: install it, then try again.`);
  const command = `apt-get install -y ${packages.join(" ")}`;
  if (!isRoot) throw new Sentence(`${product} is not installed: run "sudo ${command}", then try again.`);
  console.log(`Installing ${product} from Debian's packages…`);
  const options = {
    env: { ...process.env, DEBIAN_FRONTEND: "noninteractive" },
    // A package manager that is cut short leaves a half-installed system: it is given time.
    stop: /** @type {[NodeJS.Signals, number][]} */ ([
      ["SIGTERM", 60_000],
      ["SIGKILL", 5_000],
    ]),
  };
  const wait = ["-o", "DPkg::Lock::Timeout=300"];
  // An update that fails is no reason to stop: the lists at hand may do, and the installation says so if not.
  await keeper.outcome("apt-get", [...wait, "update"], { ...options, stdio: "ignore" });
  await keeper.run("apt-get", [...wait, "install", "-y", "--no-install-recommends", ...packages], {
    ...options,
    failure: `${product} could not be installed: ${command} failed.`,
  });
}

/**
 * Keeps Debian, for the time of an installation, from creating and starting a database cluster of its own.
 *
 * @param {() => Promise<void>} install
 */
export async function withoutDebiansCluster(install) {
  const folder = "/etc/postgresql-common/createcluster.d";
  const file = `${folder}/planeward.conf`;
  const hadFolder = existsSync(folder);
  if (isRoot) {
    mkdirSync(folder, { recursive: true });
    writeFileSync(file, "create_main_cluster = false\n");
  }
  try {
    await install();
  } finally {
    if (isRoot) {
      rmSync(file, { force: true });
      if (!hadFolder && readdirSync(folder).length === 0) rmdirSync(folder);
    }
  }
}
