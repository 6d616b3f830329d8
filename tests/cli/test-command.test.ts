import { existsSync, readdirSync } from "node:fs";
import { dirname } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { Command, StubProject } from "./stub-project.ts";

describe("npm test", { timeout: 60_000 }, () => {
  let project: StubProject;

  beforeEach(() => {
    project = new StubProject();
    for (const name of ["tsc", "eslint", "prettier", "knip"]) project.program(name, "");
  });

  afterEach(() => project.remove());

  function run(...args: string[]): Command {
    return new Command(project, process.execPath, ["app/cli/test.mjs", ...args], { TMPDIR: dirname(project.folder) });
  }

  it("counts each check once, alone on the last line", async () => {
    const command = run("static");
    expect(await command.ends()).toBe(0);
    expect(command.output).toMatch(/\n5 passed, 0 failed\n$/);
  });

  it("goes on after a failure, and fails", async () => {
    project.write("node_modules/stubs/tsc.mjs", "process.exit(2);");
    const command = run("static");
    expect(await command.ends()).toBe(1);
    expect(command.output).toMatch(/\n4 passed, 1 failed\n$/);
  });

  it("stops what runs when it is told to, and counts nothing then", async () => {
    project.write("node_modules/stubs/eslint.mjs", 'console.log("linting"); setInterval(() => {}, 1000);');
    const command = run("static");
    await command.prints("linting");
    command.child.kill("SIGINT");
    expect(await command.ends()).toBe(130);
    expect(command.output).not.toContain("passed");
    expect(project.processes()).toEqual([]);
  });

  it("refuses a part that there is not", async () => {
    const command = run("everything");
    expect(await command.ends()).toBe(1);
    expect(command.output).toBe('There is no part "everything" of the tests; the parts are static, unit, browser.\n');
  });

  it("gives the tests a database to copy, and leaves nothing behind", async () => {
    // Vitest's stand-in copies the template as tests do, and passes when the copy lets the plain role in.
    project.program(
      "vitest",
      `import { spawnSync } from "node:child_process";
       import { writeFileSync } from "node:fs";
       const { TEST_DATABASE_ADMIN_URL, TEST_DATABASE_TEMPLATE, TEST_DATABASE_APP_URL, DATABASE_URL } = process.env;
       const sql = (url, text) => spawnSync("psql", ["-XqAt", "-c", text, url], { encoding: "utf8" }).stdout;
       sql(TEST_DATABASE_ADMIN_URL, "create database copy template " + TEST_DATABASE_TEMPLATE + " owner planeward_owner");
       const user = sql(TEST_DATABASE_APP_URL.replace(TEST_DATABASE_TEMPLATE, "copy"), "select current_user").trim();
       const numPassedTests = Number(user === "planeward_app" && !DATABASE_URL);
       writeFileSync("vitest-tmpdir.txt", process.env.TMPDIR);
       const report = { numPassedTests, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] };
       writeFileSync(process.argv.find((a) => a.startsWith("--outputFile.json=")).slice(18), JSON.stringify(report));`,
    );
    const command = run("unit");
    expect(await command.ends()).toBe(0);
    expect(command.output).toMatch(/\n1 passed, 0 failed\n$/);
    expect(project.processes()).toEqual([]);
    const temporaryFolder = dirname(project.read("vitest-tmpdir.txt"));
    expect(temporaryFolder).toMatch(/\/planeward-test-\w+$/);
    expect(existsSync(temporaryFolder)).toBe(false);
    expect(readdirSync(dirname(project.folder))).toEqual(["a project"]);
  });
});
