import { spawn, type ChildProcess } from "node:child_process";
import { once } from "node:events";
import {
  chmodSync,
  cpSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { expect } from "vitest";

const realRoot = fileURLToPath(new URL("../..", import.meta.url));

/** The server's stand-in: says which connection it was given, and that it is well. */
const server = `
import { createServer } from "node:http";
const { DATABASE_URL, DATABASE_OWNER_URL, HOST, NODE_ENV, PORT } = process.env;
const role = new URL(DATABASE_URL).username;
const listener = createServer((request, response) => response.end(JSON.stringify({ role, DATABASE_OWNER_URL, NODE_ENV })));
listener.listen(Number(PORT), HOST);
process.once("SIGTERM", () => listener.close());
`;

/** The bundler's stand-in: its "build" makes the file that is served and counts how often it was called. */
const bundler = `
import { appendFileSync, mkdirSync, writeFileSync } from "node:fs";
mkdirSync("build/server", { recursive: true });
if (process.argv[2] === "build") {
  writeFileSync("build/server/index.js", "");
  appendFileSync("builds.log", "built\\n");
}
`;

/** Preparing the database: each run leaves one more line in it, so that lost data show. */
const prepare = `
import { spawnSync } from "node:child_process";
import { existsSync, writeFileSync } from "node:fs";
const { DATABASE_OWNER_URL, APP_ROLE, DEMO, DEMO_ACCOUNTS_FILE } = process.env;
const sql = "create table if not exists run (at timestamptz default now()); insert into run default values; select count(*) from run;";
const { status, stdout, stderr } = spawnSync("psql", ["-XqAt", "-v", "ON_ERROR_STOP=1", "-c", sql, String(DATABASE_OWNER_URL)], { encoding: "utf8" });
if (status !== 0) throw new Error(stderr);
writeFileSync("runs.txt", stdout.trim());
const account = { role: APP_ROLE + " of demo " + DEMO, email: "engineer@kestrel-ridge.example", password: "only-here" };
if (!existsSync(String(DEMO_ACCOUNTS_FILE))) writeFileSync(String(DEMO_ACCOUNTS_FILE), JSON.stringify([account]));
`;

/** The worker's stand-in: says which connection it was given, then waits to be stopped. */
const worker = `
import { appendFileSync } from "node:fs";
const { DATABASE_URL, DATABASE_OWNER_URL, NODE_ENV } = process.env;
appendFileSync("workers.log", JSON.stringify({ role: new URL(DATABASE_URL).username, DATABASE_OWNER_URL, NODE_ENV }) + "\\n");
const waiting = setInterval(() => undefined, 1000);
process.once("SIGTERM", () => clearInterval(waiting));
`;

/** A small project in a temporary folder, blank in its name, that the real commands set up, serve and test. */
export class StubProject {
  readonly folder = join(mkdtempSync(join(tmpdir(), "planeward-cli-")), "a project");

  constructor() {
    // The account that runs the database server passes through.
    chmodSync(dirname(this.folder), 0o711);
    cpSync(join(realRoot, "app/cli"), join(this.folder, "app/cli"), { recursive: true });
    cpSync(join(realRoot, "package.json"), join(this.folder, "package.json"));
    this.write("package-lock.json", JSON.stringify({ packages: { "": {} } }));
    this.write("node_modules/.package-lock.json", JSON.stringify({ packages: {} }));
    symlinkSync(join(realRoot, "node_modules/tsx"), join(this.folder, "node_modules/tsx"));
    this.write("app/db/prepare.ts", prepare);
    this.write("app/jobs/worker.ts", worker);
    this.program("react-router", bundler);
    this.program("react-router-serve", server);
  }

  write(file: string, content: string): void {
    mkdirSync(dirname(join(this.folder, file)), { recursive: true });
    writeFileSync(join(this.folder, file), content);
  }

  read(file: string): string {
    return readFileSync(join(this.folder, file), "utf8");
  }

  /** Puts a program where packages put theirs. */
  program(name: string, content: string): void {
    this.write(`node_modules/stubs/${name}.mjs`, content);
    mkdirSync(join(this.folder, "node_modules/.bin"), { recursive: true });
    symlinkSync(`../stubs/${name}.mjs`, join(this.folder, "node_modules/.bin", name));
  }

  /** Processes that work for this project, by their command lines. */
  processes(part = ""): { pid: number; command: string }[] {
    return readdirSync("/proc")
      .filter((entry) => /^\d+$/.test(entry))
      .map((entry) => ({ pid: Number(entry), command: commandLine(entry) }))
      .filter(({ command }) => command.includes(this.folder) && command.includes(part));
  }

  /** Waits until nothing works for this project any more. */
  async isStill(): Promise<void> {
    await expect.poll(() => this.processes(), { timeout: 30_000, interval: 50 }).toEqual([]);
  }

  kill(...parts: string[]): void {
    for (const part of parts) for (const { pid } of this.processes(part)) process.kill(pid, "SIGKILL");
  }

  remove(): void {
    this.kill();
    rmSync(dirname(this.folder), { recursive: true, force: true });
  }
}

function commandLine(pid: string): string {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, "utf8").replaceAll("\0", " ");
  } catch {
    return "";
  }
}

/** A running command and what it has printed so far. */
export class Command {
  output = "";
  readonly child: ChildProcess;
  readonly #ended: Promise<unknown>;

  constructor(project: StubProject, program: string, args: string[], env: NodeJS.ProcessEnv = {}) {
    const cleared = { DATABASE_URL: undefined, DATABASE_OWNER_URL: undefined, npm_lifecycle_event: undefined };
    this.child = spawn(program, args, {
      cwd: project.folder,
      env: { ...process.env, ...cleared, ...env },
      stdio: ["ignore", "pipe", "pipe"],
    });
    for (const stream of [this.child.stdout, this.child.stderr])
      stream?.setEncoding("utf8").on("data", (text: string) => (this.output += text));
    this.#ended = once(this.child, "close");
  }

  /** Waits until the command has printed something; what it printed instead is shown when it does not. */
  async prints(text: string): Promise<void> {
    await expect.poll(() => this.output, { timeout: 30_000, interval: 50 }).toContain(text);
  }

  /** Waits for its end. */
  async ends(): Promise<number | null> {
    await this.#ended;
    return this.child.exitCode;
  }
}

/** A port that is free right now. */
export async function freePort(): Promise<number> {
  const listener = createServer().listen(0, "127.0.0.1");
  await once(listener, "listening");
  const address = listener.address();
  listener.close();
  await once(listener, "close");
  if (typeof address !== "object" || !address) throw new Error("No port.");
  return address.port;
}
