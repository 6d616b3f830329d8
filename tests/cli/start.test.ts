import { once } from "node:events";
import { createServer } from "node:net";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Command, StubProject, freePort } from "./stub-project.ts";

/** The real command and a real database server, in a small project of its own. */
describe("npm start", { timeout: 60_000 }, () => {
  let project: StubProject;
  let port = 0;

  beforeAll(async () => {
    project = new StubProject();
    port = await freePort();
  });

  afterAll(() => project.remove());

  function start(env: NodeJS.ProcessEnv = {}): Command {
    return new Command(project, process.execPath, ["app/cli/start.mjs"], { PORT: String(port), ...env });
  }

  /** Starts, waits until it serves, and tells how often this database has been prepared. */
  async function serve(): Promise<{ command: Command; runs: number }> {
    const command = start();
    await command.prints(`Planeward runs at http://127.0.0.1:${port}`);
    return { command, runs: Number(project.read("runs.txt")) };
  }

  it("sets up, serves with the plain role alone, and prints the demo accounts", async () => {
    const { command, runs } = await serve();
    await command.prints("planeward_app of demo 1  engineer@kestrel-ridge.example  only-here\n");
    const answer = await fetch(`http://127.0.0.1:${port}/`);
    expect(await answer.json()).toEqual({ role: "planeward_app", NODE_ENV: "production" });
    expect(runs).toBe(1);

    const second = start();
    expect(await second.ends()).toBe(1);
    expect(second.output).toMatch(new RegExp(`^Planeward runs at http://127.0.0.1:${port} .*\\n$`));
    expect((await fetch(`http://127.0.0.1:${port}/`)).status).toBe(200);

    command.child.kill("SIGTERM");
    expect(await command.ends()).toBe(0);
    expect(project.processes()).toEqual([]);
  });

  it("builds again only when the sources have changed", async () => {
    const { command } = await serve();
    command.child.kill("SIGINT");
    expect(await command.ends()).toBe(0);
    expect(project.read("builds.log")).toBe("built\n");

    project.write("app/new.ts", "export {};");
    const { command: again } = await serve();
    again.child.kill("SIGHUP");
    expect(await again.ends()).toBe(0);
    expect(project.read("builds.log")).toBe("built\nbuilt\n");
    expect(project.processes()).toEqual([]);
  });

  it.each([
    ["the command", ["start.mjs"]],
    ["the database server", [".planeward/postgres"]],
    ["both servers", ["build/server", ".planeward/postgres"]],
    ["the command and its guard", ["guard.mjs", "start.mjs"]],
    ["everything", [""]],
  ])("loses nothing and starts again after a kill -9 of %s", async (_what, parts) => {
    const { command, runs } = await serve();
    // The command's own line does not name the folder.
    if (parts.includes("start.mjs") || parts.includes("")) command.child.kill("SIGKILL");
    project.kill(...parts.filter((part) => part !== "start.mjs"));
    await command.ends();
    if (!parts.includes("guard.mjs")) await project.isStill();

    const next = await serve();
    expect(next.runs).toBe(runs + 1);
    next.command.child.kill("SIGTERM");
    expect(await next.command.ends()).toBe(0);
    expect(project.processes()).toEqual([]);
  });

  it("serves again at the same place when the server is killed, and stops in order after it", async () => {
    const { command } = await serve();
    const server = () => project.processes("build/server").map(({ pid }) => pid);
    const answers = () =>
      fetch(`http://127.0.0.1:${port}/`).then(
        ({ status }) => status,
        () => null,
      );
    for (const _round of [1, 2]) {
      const [first] = server();
      project.kill("build/server");
      await expect.poll(() => server().filter((pid) => pid !== first), { timeout: 30_000 }).toHaveLength(1);
      await expect.poll(answers, { timeout: 30_000 }).toBe(200);
    }
    command.child.kill("SIGTERM");
    expect(await command.ends()).toBe(0);
    expect(project.processes()).toEqual([]);
  });

  it("runs a worker with the plain role alone, and starts it again when it is killed", async () => {
    const { command } = await serve();
    const worker = () => project.processes("app/jobs/worker.ts").map(({ pid }) => pid);
    await expect.poll(worker, { timeout: 30_000 }).toHaveLength(1);
    const told = () => project.read("workers.log").trimEnd().split("\n");
    await expect
      .poll(() => JSON.parse(told().at(-1) ?? "") as object)
      .toEqual({
        role: "planeward_app",
        NODE_ENV: "production",
      });
    const [first] = worker();
    project.kill("app/jobs/worker.ts");
    await expect.poll(() => worker().filter((pid) => pid !== first), { timeout: 30_000 }).toHaveLength(1);
    expect((await fetch(`http://127.0.0.1:${port}/`)).status).toBe(200);
    command.child.kill("SIGTERM");
    expect(await command.ends()).toBe(0);
    expect(project.processes()).toEqual([]);
  });

  it("stops when npm is killed, be there a shell in between or not", async () => {
    for (const script of ["exec node app/cli/start.mjs", "node app/cli/start.mjs; exit"]) {
      const manifest = JSON.parse(project.read("package.json")) as object;
      project.write("package.json", JSON.stringify({ ...manifest, scripts: { start: script } }));
      const npm = new Command(project, "npm", ["start"], { PORT: String(port) });
      await npm.prints("Planeward runs at");
      npm.child.kill("SIGKILL");
      await project.isStill();
    }
  });

  it("names a taken port in one sentence", async () => {
    const other = createServer().listen(port, "127.0.0.1");
    await once(other, "listening");
    const command = start();
    expect(await command.ends()).toBe(1);
    expect(command.output).toBe(
      `Port ${port} is taken by another program; choose another one with PORT, for example: PORT=3100 npm start\n`,
    );
    other.close();
    await once(other, "close");
  });

  it.each([
    [{ PORT: "many" }, 'PORT is "many", and must be a whole number from 1 to 65535.\n'],
    [
      { DATABASE_URL: "postgresql://app@db.example/planeward" },
      /^DATABASE_URL is set, but not DATABASE_OWNER_URL: .*\n$/,
    ],
    [{ DATABASE_URL: "db", DATABASE_OWNER_URL: "db" }, /^DATABASE_URL is no PostgreSQL address; .*\n$/],
  ])("refuses %o in one sentence", async (env, sentence) => {
    const command = start(env);
    expect(await command.ends()).toBe(1);
    expect(command.output).toMatch(sentence);
  });
});
