import { beforeAll, describe, expect, test } from "vitest";
import { MONITOR_PARAMETERS } from "#app/db/seeders/demo-monitor.ts";
import { keptOf, pageOf } from "#app/lib/job-files.ts";
import type { ProfileFileValues } from "#app/schemas/scan-import.ts";
import type { ScanValues } from "#app/schemas/scan.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const pairs = () => import("#app/services/scan-pair-job.server.ts");
const imports = () => import("#app/services/scan-readings/import-files.server.ts");
const jobs = () => import("#app/services/jobs/jobs.server.ts");
const running = () => import("#app/services/jobs/run-job.server.ts");
const placing = () => import("#app/services/wafers/import-file.server.ts");
const scans = () => import("#app/services/scans.server.ts");

let technician: ActorScope;
let values: ScanValues;

beforeAll(async () => {
  await Promise.all([pairs(), imports(), jobs(), running(), scans(), placing()]);
  technician = await scopeOfPerson(database, "technician");
  const program = technician.actor.memberships.find(({ programSlug }) => programSlug === "tern")?.programId ?? "";
  values = { program, label: "M-0400", film: null, ...MONITOR_PARAMETERS };
}, 60_000);

const utf8 = (text: string) => new TextEncoder().encode(text);
const ROWS = 60_000;
const HEAD = "x_mm,z_um\n";
/** A scan over 190 mm in some 1.5 MB, its scatter by sines that share no period with it. */
function largeScan(name: string, curvature: number) {
  const lines = Array.from({ length: ROWS }, (_, n) => {
    const x = -95 + (190 * n) / (ROWS - 1);
    return `${x.toFixed(8)},${((curvature / 2) * x * x + 0.05 * Math.sin(12.9898 * n * n)).toFixed(8)}\n`;
  });
  return { name, bytes: utf8(`${HEAD}${lines.join("")}# ${name}\n`) };
}

async function started(before: { name: string; bytes: Uint8Array<ArrayBuffer> }, after: typeof before, given = values) {
  const uploaded = await (await pairs()).uploadByJob(technician, given, { before, after });
  if (uploaded.outcome !== "job") throw new Error(uploaded.reason);
  return uploaded.id;
}
const run = async (id: string) => (await running()).runJob({ id }, { isLastAttempt: true });
const seen = async (id: string) => (await jobs()).getJob(technician, id);
const stored = () =>
  asOwner<{ table: string; rows: number }>(
    database,
    ["scan", "scan_file", "scan_reading", "job"]
      .map((table) => `select '${table}' as table, count(*)::int as rows from "${table}"`)
      .join(" union all "),
  );

describe("a pair that is too large for a request", () => {
  test("is read by a job, with every point, and the scan is found from it", async () => {
    const [before, after] = [largeScan("before.csv", 0.002), largeScan("after.csv", 0.011)];
    const id = await started(before, after);
    expect(await started(before, after)).toBe(id);
    expect(await seen(id)).toMatchObject({ state: "waiting", total: before.bytes.length + after.bytes.length });
    await run(id);
    const job = await seen(id);
    expect(job).toMatchObject({ state: "done", done: job.total, sentence: "The pair is in." });
    const scan = await (await scans()).getScan(technician, pageOf(job.outcome)?.replace("/scans/", "") ?? "");
    expect(scan).toMatchObject({ label: "M-0400", files: { before: { name: "before.csv" } } });
    expect(scan.result.curvatureChange).toBeCloseTo(0.009, 7);
    // 3 mm to 5 mm of the rim are left out at either end.
    expect(scan.result.used).toBeGreaterThan(0.9 * ROWS);
  });

  test("that was read when its worker died is found, not stored again", async () => {
    const id = await started(largeScan("b2.csv", 0.002), largeScan("a2.csv", 0.011));
    await run(id);
    const rows = await stored();
    await asOwner(database, "update job set state = 'running', outcome = null where id = ?", [id]);
    await run(id);
    expect(await seen(id)).toMatchObject({ state: "done" });
    expect(await stored()).toEqual(rows);
  });

  test("that makes no scan fails with its reason, and no scan is stored", async () => {
    const empty = { name: "no heights.csv", bytes: utf8(HEAD + "12.345678,NaN\n".repeat(100_000)) };
    for (const [after, reason] of [
      [empty, /no heights\.csv: 100000 of 100000 rows are no pair of numbers\. Row 2, height/],
      [largeScan("b3.csv", 0.002), /holds the same bytes as the file before the film/],
    ] as const) {
      const id = await started(largeScan("b3.csv", 0.002), after);
      const [scansBefore] = await stored();
      await run(id);
      expect(await seen(id)).toMatchObject({ state: "failed", sentence: expect.stringMatching(reason) as string });
      expect((await stored())[0]).toEqual(scansBefore);
    }
  });

  test("of somebody who has left the program fails, and a guest starts none", async () => {
    const guest = await scopeOfPerson(database, "guest");
    const files = { before: largeScan("b4.csv", 0.002), after: largeScan("a4.csv", 0.011) };
    await expect((await pairs()).uploadByJob(guest, values, files)).rejects.toMatchObject({ init: { status: 404 } });
    const lead = await scopeOfPerson(database, "shift-lead");
    const uploaded = await (await pairs()).uploadByJob(lead, values, files);
    if (uploaded.outcome !== "job") throw new Error(uploaded.reason);
    await leave(database, "shift-lead", "tern");
    await run(uploaded.id);
    expect(await seen(uploaded.id)).toMatchObject({ state: "failed" });
  });
});

describe("files of an import that are too large for a request", () => {
  const lines = [{ profile: 0, azimuth: 0 }];
  const profile: ProfileFileValues["profile"] = {};
  async function imported(
    side: "before" | "after",
    wafer: string,
    file: ReturnType<typeof largeScan>,
    changes: Partial<ProfileFileValues> = {},
  ) {
    const { decimalMark: _d, positionUnit: _p, heightUnit: _h, ...parameters } = MONITOR_PARAMETERS;
    const place = { program: values.program, film: null, instrument: null, lot: "", slot: null, wafer, side };
    return (await placing()).importFile(technician, { ...parameters, ...place, profile, lines, ...changes }, file);
  }
  async function jobOf(...given: Parameters<typeof imported>) {
    const answer = await imported(...given);
    if (answer.outcome !== "job") throw new Error(JSON.stringify(answer));
    await run(answer.job);
    return seen(answer.job);
  }

  test("are read and placed by jobs, and the scan is made of every point", async () => {
    const first = await jobOf("before", "W-80", largeScan("w80 before.csv", 0.002));
    expect(first).toMatchObject({ state: "done", sentence: "One waits for its partner." });
    expect(pageOf(first.outcome)).toMatch(/^\/scans\/waiting\//);
    const second = await jobOf("after", "W-80", largeScan("w80 after.csv", 0.011));
    expect(second).toMatchObject({ state: "done", sentence: "One scan made." });
    const { result } = await (await scans()).getScan(technician, pageOf(second.outcome)?.replace("/scans/", "") ?? "");
    expect(result.curvatureChange).toBeCloseTo(0.009, 7);
    expect(result.used).toBeGreaterThan(0.9 * ROWS);
    expect(result.before.averagedTo).toBeUndefined();
  });

  test("are found where they lie when they come again, and when their worker died", async () => {
    const first = await jobOf("before", "W-81", largeScan("w81 before.csv", 0.002));
    const rows = await stored();
    await asOwner(database, "update job set state = 'running', outcome = null where id = ?", [first.id]);
    await run(first.id);
    const again = await seen(first.id);
    expect(keptOf(again.outcome)).toMatchObject({ placed: [{ outcome: "already", scan: null }] });
    expect(again.sentence).toBe("One had been imported before.");
    expect(await stored()).toEqual(rows);
  });

  test("of which a thickness is missing fail with what to type, and wait for nobody", async () => {
    const unknown = { filmThickness: null };
    await jobOf("before", "W-82", largeScan("w82 before.csv", 0.002), unknown);
    const job = await jobOf("after", "W-82", largeScan("w82 after.csv", 0.011), unknown);
    expect(job).toMatchObject({
      state: "failed",
      sentence: "Type the film thickness: W-82, 0° has both of its scans now.",
    });
  });

  test("that cannot be read are refused at their beginning, and nothing is stored", async () => {
    const rows = await stored();
    const words = { name: "words.csv", bytes: utf8("one,two\n".repeat(200_000)) };
    expect(await imported("before", "W-83", words)).toMatchObject({ outcome: "refused" });
    expect(await stored()).toEqual(rows);
  });

  test("below a megabyte too are fitted at every point", async () => {
    const some = (name: string, curvature: number) => {
      const { bytes } = largeScan(name, curvature);
      const text = new TextDecoder().decode(bytes).split("\n");
      return { name, bytes: utf8(text.filter((_, n) => n === 0 || n % 3 === 1).join("\n")) };
    };
    expect(await imported("before", "W-84", some("w84 before.csv", 0.002))).toMatchObject({ outcome: "placed" });
    const made = await imported("after", "W-84", some("w84 after.csv", 0.011));
    const [placed] = made.outcome === "placed" ? made.placed : [];
    if (placed?.outcome !== "scan") throw new Error(JSON.stringify(made));
    const { result } = await (await scans()).getScan(technician, placed.scan);
    expect(result.before.averagedTo).toBeUndefined();
    expect(result.used).toBeGreaterThan(0.9 * (ROWS / 3));
  });
});

/** Processor time, s, so that other work on the machine does not count. */
const SECONDS = 2;
const processorTime = () => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
};

describe("a hostile file is turned down in under two seconds, and nothing of it is stored", () => {
  const MEGABYTES = 45e6;
  const wide = (cell: string) => utf8(`${cell.repeat(300_000)}\n`.repeat(MEGABYTES / (300_000 * cell.length)));
  const long = (text: string) => utf8(text.repeat(Math.ceil(MEGABYTES / text.length)));
  const zip = new Uint8Array(MEGABYTES);
  zip.set([0x50, 0x4b, 3, 4]);

  test.each<[what: string, bytes: () => Uint8Array<ArrayBuffer>, says: RegExp]>([
    ["one line", () => new Uint8Array(MEGABYTES).fill(0x37), /row 1 has more than 1000000 characters/],
    ["a zip", () => zip, /is a zip archive/],
    ["a million columns", () => long(`${"1,".repeat(1e6)}\n`), /row 1 has more than 1000000 characters/],
    ["many columns", () => wide("1,"), /row 1 has 300001 columns/],
    ["formulas", () => utf8(HEAD + "=1+1,@SUM(A1)\n".repeat(1e6)), /a formula\. Export the values/],
    [
      "quotes that never close",
      () => long(`${HEAD}1,"${'"",""'.repeat(2e6)}`),
      /has no row of numbers\. .* its first line is “x_mm,z_um”/,
    ],
    ["missing values only", () => long("NaN,NaN\n"), /no row of numbers/],
    ["a program", () => long("\u0001\u0002MZ\n"), /is not a text file/],
    ["numbers of no wafer", () => utf8("1e300,1e300\n".repeat(500_000)), /columns|unit|wafer|numbers/],
  ])(
    "%s",
    async (_, bytes, says) => {
      const file = { name: "M-0388.csv", bytes: bytes() };
      const good = largeScan("good.csv", 0.002);
      const rows = await stored();
      const start = processorTime();
      const settings = { profile: {}, edgeExclusion: 0.005 };
      const imported = await (
        await imports()
      ).importScanFiles(technician, { program: values.program, files: [file], settings });
      const uploaded = await (await pairs()).uploadByJob(technician, values, { before: good, after: file });
      expect(processorTime() - start).toBeLessThan(2 * SECONDS);
      expect(imported).toMatchObject({ outcome: "refused", reason: expect.stringMatching(says) as string });
      if (uploaded.outcome === "refused") expect(uploaded.field).toBe("after");
      else await expectFailed(uploaded.id);
      expect((await stored()).slice(0, 1)).toEqual(rows.slice(0, 1));
      if (uploaded.outcome === "refused") expect(await stored()).toEqual(rows);
    },
    60_000,
  );

  async function expectFailed(id: string) {
    await run(id);
    expect(await seen(id)).toMatchObject({ state: "failed" });
  }
});
