import { beforeAll, describe, expect, test } from "vitest";
import { MONITOR_PARAMETERS, monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import type { ProfileFileValues, TableFileValues } from "#app/schemas/scan-import.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const importing = () => import("#app/services/wafers/import-file.server.ts");
const queue = () => import("#app/services/wafers/waiting.server.ts");
const byHand = () => import("#app/services/wafers/hand-pairing.server.ts");
const undoing = () => import("#app/services/wafers/undo-import.server.ts");
const scans = () => import("#app/services/scans.server.ts");
const loose = () => import("#app/services/wafers/loose-wafers.server.ts");
const lots = () => import("#app/services/wafers/lots.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([importing(), queue(), byHand(), undoing(), scans(), lots(), loose()]), 60_000);

let technician: ActorScope;
let tern = "";
let petrel = "";
beforeAll(async () => {
  await leave(database, "technician", "petrel");
  technician = await scopeOfPerson(database, "technician");
  const programs = await asOwner<{ id: string; slug: string }>(database, "select id, slug from program");
  tern = programs.find(({ slug }) => slug === "tern")?.id ?? "";
  petrel = programs.find(({ slug }) => slug === "petrel")?.id ?? "";
});

const PROFILE: ProfileFileValues["profile"] = {
  columns: [
    { index: 0, role: "position", unit: "mm" },
    { index: 1, role: "height", unit: "µm" },
  ],
};
const DEGREE = Math.PI / 180;

const file = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });
const scanFile = (which: "before" | "after", seed: number) =>
  file(`w${seed}-${which}.csv`, profileCsv(monitorProfile(which, { seed })));

function profileValues(changes: Partial<ProfileFileValues> = {}): ProfileFileValues {
  const { positionUnit: _p, heightUnit: _h, decimalMark: _d, ...parameters } = MONITOR_PARAMETERS;
  const lines = [{ profile: 0, azimuth: 0 }];
  const place = { wafer: "W-1", lot: "", slot: null, side: "before" } as const;
  return { program: tern, film: null, profile: PROFILE, instrument: null, lines, ...parameters, ...place, ...changes };
}

function tableValues(changes: Partial<TableFileValues> = {}): TableFileValues {
  const { edgeExclusion } = MONITOR_PARAMETERS;
  return { program: tern, edgeExclusion, profile: {}, instrument: null, wafer: "", lot: "", slot: null, ...changes };
}

async function bring(which: "before" | "after", seed: number, changes: Partial<ProfileFileValues> = {}) {
  const { importFile } = await importing();
  const values = profileValues({ wafer: `W-${seed}`, side: which, ...changes });
  return importFile(technician, values, scanFile(which, seed));
}
type Answer = Awaited<ReturnType<typeof bring>>;

function onlyPlaced(answer: Answer) {
  if (answer.outcome !== "placed") throw new Error(JSON.stringify(answer));
  const [placed] = answer.placed;
  if (!placed) throw new Error("nothing was placed");
  return placed;
}
function scanOf(answer: Answer): string {
  const placed = onlyPlaced(answer);
  if (placed.outcome !== "scan") throw new Error(placed.outcome);
  return placed.scan;
}
function waiting(answer: Answer): string {
  const placed = onlyPlaced(answer);
  if (placed.outcome !== "waits") throw new Error(placed.outcome);
  return placed.waferScan;
}

const says = (what: RegExp) => expect.stringMatching(what) as string;

const counts = async () =>
  asOwner(
    database,
    `select (select count(*) from scan) scans, (select count(*) from scan_file) files, (select count(*) from wafer) wafers,
       (select count(*) from wafer_scan) placed, (select count(*) from lot) lots`,
  );
const params = (query = "") => ({ query, sort: "since", descending: true, page: 1, filters: {} });

describe("a file of a profile", () => {
  test("waits for its partner, whichever comes first, and makes the scan with it", async () => {
    const first = await bring("after", 61, { lot: "L-61", slot: 4, filmThickness: 5e-6, sinceCure: 26 * 3600 });
    expect(onlyPlaced(first)).toMatchObject({ outcome: "waits", label: "W-61, lot L-61, slot 4, 0°" });
    const { listWaiting } = await queue();
    expect((await listWaiting(technician, params("l-61"))).rows).toMatchObject([
      { side: "after", file: { name: "w61-after.csv" } },
    ]);
    // Names are told apart without regard to capitals, lines to two degrees, and the other way round is the same line.
    const turned = { wafer: "w-61", lot: "l-61", lines: [{ profile: 0, azimuth: 1 * DEGREE }] };
    const id = scanOf(await bring("before", 61, turned));
    const { getScan } = await scans();
    const { result, label, parameters } = await getScan(technician, id);
    expect(parameters).toMatchObject({ siliconThicknessFrom: "measured", sinceCure: 26 * 3600 });
    expect(label).toBe("W-61, lot L-61, slot 4, 1°");
    expect(Math.abs(result.stress - 31e6)).toBeLessThan(3 * result.stressUncertainty);
    expect((await listWaiting(technician, params("l-61"))).total).toBe(0);
    const [kept] = await asOwner(
      database,
      "select wafer_id is not null as wafer, azimuth, before_scan_id is not null as placed from scan where id = ?",
      [id],
    );
    expect(kept).toEqual({ wafer: true, azimuth: 1 * DEGREE, placed: true });
  });

  test("run the other way gives the same stress", async () => {
    const same = scanOf(await both(62, 0));
    const { getScan } = await scans();
    const straight = (await getScan(technician, same)).result;
    await bring("before", 63);
    const after = monitorProfile("after", { seed: 63 }).map(({ x, z }) => ({ x: -x, z }));
    const { importFile } = await importing();
    const lines = [{ profile: 0, azimuth: Math.PI }];
    const values = profileValues({ wafer: "W-63", side: "after", lines });
    const answer = await importFile(technician, values, file("turned.csv", profileCsv(after.toReversed())));
    const turned = (await getScan(technician, scanOf(answer))).result;
    expect(Math.abs(turned.stress - straight.stress)).toBeLessThan(2 * turned.stressUncertainty);
    expect(turned.rms).toBeLessThan(1.5 * straight.rms);
  });

  test("brought in again is known, by whom and where it lies; on another wafer it is refused", async () => {
    const id = scanOf(await both(64, 0));
    const before = await counts();
    expect(onlyPlaced(await bring("after", 64))).toMatchObject({ outcome: "already", scan: id });
    // Read with another rim, it is the same file still.
    expect(onlyPlaced(await bring("after", 64, { edgeExclusion: 6e-3 }))).toMatchObject({ outcome: "already" });
    expect(await bring("after", 64, { wafer: "W-64b" })).toMatchObject({
      outcome: "refused",
      reason: says(/was imported on \d{4}-.* as W-64, 0°\./),
    });
    expect(await counts()).toEqual(before);
  });

  test("after one film may lie before the next", async () => {
    await both(65, 0);
    expect(onlyPlaced(await bring("after", 65, { side: "before" }))).toMatchObject({ outcome: "waits" });
  });

  test("without thicknesses waits, and asks for them when its partner comes", async () => {
    const bare = { filmThickness: null, siliconThickness: null };
    waiting(await bring("before", 66, bare));
    const before = await counts();
    expect(await bring("after", 66, bare)).toMatchObject({
      outcome: "fields",
      errors: { filmThickness: [says(/^Type the film thickness/)] },
    });
    expect(await counts()).toEqual(before);
    scanOf(await bring("after", 66));
  });

  test("that contradicts lot, slot or diameter is refused and leaves nothing behind", async () => {
    waiting(await bring("before", 67, { lot: "L-67", slot: 2 }));
    const before = await counts();
    expect(await bring("after", 67, { lot: "L-67", slot: 3 })).toMatchObject({
      reason: says(/known in slot 2, not 3/),
    });
    expect(await bring("after", 67, { wafer: "W-68", lot: "L-67", slot: 2 })).toMatchObject({
      reason: says(/Slot 2 of lot L-67 holds wafer W-67/),
    });
    expect(await bring("after", 67, { lot: "L-67", diameter: 0.3 })).toMatchObject({ outcome: "refused" });
    expect(await bring("after", 67, { wafer: "" })).toMatchObject({
      reason: "Name the wafer, or its lot and its slot.",
    });
    expect(await counts()).toEqual(before);
  });

  test("and its partner brought in at the same moment meet", async () => {
    const answers = await Promise.all([bring("before", 69), bring("after", 69)]);
    expect(answers.map((answer) => onlyPlaced(answer).outcome).toSorted()).toEqual(["scan", "waits"]);
  });

  test("goes into no program of others", async () => {
    await expect(bring("before", 70, { program: petrel })).rejects.toMatchObject({ init: { status: 404 } });
  });
});

async function both(seed: number, azimuth: number) {
  const lines = [{ profile: 0, azimuth }];
  await bring("before", seed, { lines });
  return bring("after", seed, { lines });
}

describe("by hand", () => {
  test("a file is moved to another wafer, where its partner waits", async () => {
    const wrong = waiting(await bring("before", 71, { wafer: "W-17" }));
    waiting(await bring("after", 71));
    const { moveWaiting } = await byHand();
    const place = { wafer: "W-71", lot: "", slot: null, azimuth: 0, side: "before" } as const;
    expect(await moveWaiting(technician, wrong, place)).toMatchObject({ outcome: "scan" });
    // The wafer that was named by mistake is gone with its only file.
    expect(await asOwner(database, "select name from wafer where name in ('W-17', 'W-71')")).toEqual([
      { name: "W-71" },
    ]);
    await expect(moveWaiting(technician, wrong, place)).rejects.toMatchObject({ init: { status: 404 } });
  });

  test("two files of different wafers are put together; what does not go together stays as it is", async () => {
    const before = waiting(await bring("before", 72));
    const after = waiting(await bring("after", 72, { wafer: "W-27" }));
    const other = waiting(await bring("before", 73));
    const { pairByHand } = await byHand();
    const { program: _, ...subject } = profileValues();
    const values = { ...subject, filmThickness: 5e-6, siliconThickness: 725e-6 };
    expect(await pairByHand(technician, before, { ...values, partner: other })).toMatchObject({ field: "partner" });
    expect(await pairByHand(technician, before, { ...values, diameter: 0.1, partner: after })).toMatchObject({
      outcome: "refused",
    });
    const { getWaiting } = await queue();
    expect((await getWaiting(technician, before)).partners.map(({ id }) => id)).toContain(after);
    expect(await pairByHand(technician, before, { ...values, partner: after })).toMatchObject({ outcome: "scan" });
  });
});

describe("an import is undone", () => {
  test("whole, or so that its files wait again", async () => {
    const id = scanOf(await both(74, 0));
    const { undoScan } = await undoing();
    expect(await undoScan(technician, id, "wait again")).toMatchObject({ outcome: "undone" });
    const { listWaiting } = await queue();
    expect((await listWaiting(technician, params("W-74"))).total).toBe(2);
    const again = scanOf(await both(75, 0));
    const before = await asOwner<{ files: string }>(database, "select count(*) as files from scan_file");
    expect(await undoScan(technician, again, "leave")).toMatchObject({ outcome: "undone" });
    expect(await asOwner(database, "select 1 from wafer where name = 'W-75'")).toEqual([]);
    expect(await asOwner(database, "select count(*) as files from scan_file")).toEqual(before);
    scanOf(await both(75, 0));
  });

  test("not once it is used, and says by what", async () => {
    const id = scanOf(await both(76, 0));
    await asOwner(
      database,
      "update scan set film_id = (select id from film where name = 'Polymer dielectric A') where id = ?",
      [id],
    );
    const { acceptScan, acceptance } = await import("#app/services/films/accept-scan.server.ts");
    const owner = await scopeOfPerson(database, "process-owner");
    const version = (await acceptance(owner, id)).film?.version ?? null;
    const values = { reason: "Steady process", instrument: "", measuredAt: new Date("2026-11-20"), use: false };
    expect((await acceptScan(owner, id, { version, values })).outcome).toBe("saved");
    const { undoScan } = await undoing();
    expect(await undoScan(technician, id, "leave")).toEqual({
      outcome: "used",
      sentence: "This scan is used: its stress stands in the history of its film. Take it out there first.",
    });
    const guest = await scopeOfPerson(database, "guest");
    await expect(undoScan(guest, id, "leave")).rejects.toMatchObject({ init: { status: 404 } });
  });
});

const SUMMARY = [
  "Lot;Slot;Wafer;Bow (µm);Warp (µm);Thk_ctr (µm)",
  "L-80;1;A-1;-41,5;60;725",
  "L-80;2;;-39;58;724",
].join("\n");
const HOW = { sideUp: "device", support: "three points", gravity: "compensated" } as const;

describe("a table", () => {
  test("of a lot is kept wafer by wafer with how it was measured, and known the next time", async () => {
    const { importFile } = await importing();
    const values = tableValues({ profile: { measured: HOW, decimalMark: "comma" } });
    const answer = await importFile(technician, values, file("lot.csv", SUMMARY));
    expect(answer).toMatchObject({ outcome: "measured", kind: "summary", wafers: 2, lots: [{ name: "L-80" }] });
    const again = await importFile(technician, { ...values, edgeExclusion: 3e-3 }, file("lot.csv", SUMMARY));
    expect(again).toMatchObject({ outcome: "known table" });
    const { getLot } = await lots();
    const lotId = answer.outcome === "measured" ? answer.lots[0]?.id : undefined;
    const lot = await getLot(technician, lotId);
    expect(lot.wafers.map(({ name, slot, figures }) => [name, slot, figures.bow?.value, figures.warp?.value])).toEqual([
      ["A-1", 1, -41.5e-6, 60e-6],
      ["slot 2", 2, -39e-6, 58e-6],
    ]);
    expect(lot.wafers[0]?.figures.bow?.how).toBe("device side up, on three points, gravity compensated");
    // A wafer that was known by its slot alone takes its name.
    await bring("before", 81, { wafer: "A-2", lot: "L-80", slot: 2 });
    expect((await getLot(technician, lotId)).wafers.map(({ name }) => name)).toEqual(["A-1", "A-2"]);
    const { undoTable } = await undoing();
    const reading = answer.outcome === "measured" ? answer.reading : "";
    expect(await undoTable(technician, reading)).toMatchObject({ outcome: "undone" });
    expect((await getLot(technician, lotId)).wafers.map(({ name }) => name)).toEqual(["A-2"]);
  });

  test("of sites is a map of the wafer that it names, or that is named for it", async () => {
    const { importFile } = await importing();
    const map = ["x (mm),y (mm),thickness (µm)", "0,0,50", "40,0,51", "-40,0,50.5", "0,40,49.5", "0,-40,50.2"].join(
      "\n",
    );
    const values = tableValues({ profile: { underneath: "nothing" } });
    expect(await importFile(technician, values, file("map.csv", map))).toMatchObject({
      outcome: "refused",
      reason: "Name the wafer, or its lot and its slot.",
    });
    expect(await importFile(technician, { ...values, wafer: "T-1", lot: "L-82" }, file("map.csv", map))).toMatchObject({
      outcome: "measured",
      kind: "thickness map",
      wafers: 1,
      only: says(/^[0-9a-f-]{36}$/),
    });
  });

  test("of no lot is found by its wafer, and by nobody of another program", async () => {
    const { listLots } = await lots();
    const { looseWafers } = await loose();
    waiting(await bring("before", 83));
    expect((await looseWafers(technician, params("w-83"))).rows).toMatchObject([{ name: "W-83", program: "Tern" }]);
    const found = await listLots(technician, params("T0412-07"));
    expect(found.rows).toMatchObject([{ name: "T-0412", wafers: 25, program: "Tern" }]);
    expect((await listLots({ ...technician, actor: { ...technician.actor, id: petrel } }, params())).total).toBe(0);
  });
});
