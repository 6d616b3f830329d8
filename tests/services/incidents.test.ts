import { randomUUID } from "node:crypto";
import sharp from "sharp";
import { beforeAll, describe, expect, test } from "vitest";
import { incidentSchema, type IncidentValues } from "#app/schemas/incident-form.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { heardOf, listen } from "./listening.ts";
import { assessFirstFlow } from "./lot-on-sheet.ts";

const database = useDatabase({ demo: true });

const reporting = () => import("#app/services/incidents/report-incident.server.ts");
const pages = () => import("#app/services/incidents/incident-page.server.ts");
const notes = () => import("#app/services/incidents/follow-up.server.ts");
const photos = () => import("#app/services/incidents/keep-photos.server.ts");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const LONG = { timeout: 60_000 };

let engineer: ActorScope;
let technician: ActorScope;
let lead: ActorScope;
let guest: ActorScope;
let administrator: ActorScope;
let tern = "";
let petrel = "";

beforeAll(async () => {
  await Promise.all([reporting(), pages(), notes(), photos()]);
  await leave(database, "technician", "petrel");
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  lead = await scopeOfPerson(database, "shift-lead");
  guest = await scopeOfPerson(database, "guest");
  administrator = await scopeOfPerson(database, "administrator");
  tern = await assessFirstFlow(database, "tern");
  petrel = await assessFirstFlow(database, "petrel");
}, 90_000);

/** A report as the form sends it. */
function report(changed: Record<string, unknown> = {}): IncidentValues {
  const read = incidentSchema.safeParse({
    id: randomUUID(),
    assessment: tern,
    leg: 0,
    step: 9,
    lot: "T-0412",
    wafer: "7",
    kind: "crack",
    severity: "wafer lost",
    radius: "95",
    azimuth: "270",
    affected: "1",
    broken: "1",
    through: "25",
    words: "Cracked from the edge when it was lifted",
    occurredAt: "2026-11-20 22:15",
    ...changed,
  });
  if (!read.success) throw new Error(read.error.message);
  return read.data;
}

const faultsOf = (changed: Record<string, unknown>) => {
  const read = incidentSchema.safeParse({ ...sent, ...changed });
  return read.success ? [] : read.error.issues.map(({ path }) => path.join("."));
};
const sent = {
  id: randomUUID(),
  assessment: "11111111-1111-4111-8111-111111111111",
  leg: 0,
  step: 9,
  lot: "T-0412",
  kind: "crack",
  severity: "near miss",
  words: "Slipped",
  occurredAt: "2026-11-20 22:15",
};

async function store(scope: ActorScope, values = report(), files: UploadedFile[] = []): Promise<string> {
  const { reportIncident } = await reporting();
  const reported = await reportIncident(scope, values, files);
  if (reported.outcome !== "stored") throw new Error(reported.reasons.join(" "));
  return reported.id;
}

const look = async (scope: ActorScope, id: string) => (await pages()).incidentPage(scope, id);

/** A photo of a fab's wall, with the place where it was taken written into it. */
async function photoWithPlace(width = 3000, height = 2200, shade = 90): Promise<UploadedFile> {
  const data = await sharp({ create: { width, height, channels: 3, background: { r: shade, g: 120, b: 40 } } })
    .withExif({
      IFD0: { Make: "Camera of somebody" },
      IFD3: { GPSLatitudeRef: "N", GPSLatitude: "47/1 22/1 33/1", GPSLongitudeRef: "E", GPSLongitude: "8/1 32/1 10/1" },
    })
    .jpeg()
    .toBuffer();
  return { name: "crack.jpg", bytes: new Uint8Array(data) };
}

describe("a report", () => {
  test("stands beside what the assessment says of the step, with a number of its program", LONG, async () => {
    const id = await store(technician);
    const incident = await look(engineer, id);
    expect(incident).toMatchObject({
      number: "TERN-I001",
      program: "Tern",
      step: 9,
      kind: "crack",
      state: "open",
      affected: 1,
      broken: 1,
      through: 25,
      reportedBy: technician.actor.name,
      occurredAt: "2026-11-20T22:15:00.000Z",
    });
    expect(incident.spot?.radius).toBeCloseTo(0.95, 12);
    expect(incident.spot?.azimuth).toBeCloseTo(1.5 * Math.PI, 12);
    expect(incident.lot.name).toBe("T-0412");
    expect(incident.wafer).not.toBeNull();
    const [stored] = await asOwner<{ result: { steps: { number: number; title: string; silicon: number }[] } }>(
      database,
      "select result from assessment where id = ?",
      [tern],
    );
    const step = stored?.result.steps.find(({ number }) => number === 9);
    expect(incident.prediction).toMatchObject({ stepTitle: step?.title, silicon: step?.silicon });
    expect(incident.prediction.films).toMatch(/^device side: /);
    expect((await look(engineer, await store(lead, report({ wafer: "" })))).number).toBe("TERN-I002");
  });

  test("that comes twice is one; nobody else takes its number", LONG, async () => {
    const once = report({ lot: "T-0600" });
    const id = await store(technician, once);
    expect(await store(technician, once)).toBe(id);
    const numbers = await asOwner(database, "select number from incident where id = ?", [id]);
    expect(numbers).toHaveLength(1);
    await expect(store(lead, once)).rejects.toEqual(status(409));
  });

  test("finds the lot and the wafer that are known", LONG, async () => {
    const first = await look(engineer, await store(engineer, report({ lot: "T-0500", wafer: "slot 3" })));
    const again = await look(engineer, await store(engineer, report({ lot: "t-0500", wafer: "3" })));
    expect(again.lot).toEqual(first.lot);
    expect(again.wafer).toEqual(first.wafer);
  });

  test("is told at once to who follows it up, and to everybody where a wafer was lost", LONG, async () => {
    const told = async (id: string) =>
      (
        await asOwner<{ name: string }>(
          database,
          "select p.name from mail_outbox m join person p on p.id = m.person_id where m.kind = 'incident' and m.key = ?",
          [id],
        )
      ).map(({ name }) => name);
    await listen(database, "engineer", "tern");
    const id = await store(engineer, report({ severity: "near miss", broken: "0" }));
    const small = await told(id);
    expect(await heardOf(database, id)).toMatchObject([
      { event: "incident.reported", program: { slug: "tern" }, data: { incident_id: id, severity: "near miss" } },
    ]);
    expect(small).not.toContain(technician.actor.name);
    expect(small).not.toContain(guest.actor.name);
    expect(small.length).toBeGreaterThan(0);
    expect(await told(await store(engineer))).toContain(technician.actor.name);
  });

  test("of a step that the flow does not have is refused at its field, and nothing is made", LONG, async () => {
    const { reportIncident } = await reporting();
    const refused = await reportIncident(engineer, report({ step: 199, lot: "T-nowhere" }), []);
    expect(refused).toMatchObject({ outcome: "refused", field: "step" });
    expect(await asOwner(database, "select id from lot where name = 'T-nowhere'")).toEqual([]);
  });

  test("is not taken from a guest, an administrator or somebody of another program", LONG, async () => {
    const { reportIncident } = await reporting();
    await expect(reportIncident(guest, report(), [])).rejects.toEqual(status(404));
    await expect(reportIncident(administrator, report(), [])).rejects.toEqual(status(404));
    await expect(reportIncident(technician, report({ assessment: petrel }), [])).rejects.toEqual(status(404));
    const id = await store(engineer);
    await expect(look(guest, id)).rejects.toEqual(status(404));
    const foreign = await store(engineer, report({ assessment: petrel, lot: "P-1", step: 3 }));
    await expect(look(technician, foreign)).rejects.toEqual(status(404));
  });

  test("must agree with itself", () => {
    expect(faultsOf({})).toEqual([]);
    expect(faultsOf({ affected: "2", broken: "3" })).toEqual(["broken"]);
    expect(faultsOf({ affected: "5", through: "4" })).toEqual(["through"]);
    expect(faultsOf({ severity: "wafer lost" })).toEqual(["broken"]);
    expect(faultsOf({ radius: "80" })).toEqual(["azimuth"]);
    expect(faultsOf({ azimuth: "80" })).toEqual(["radius"]);
    expect(faultsOf({ radius: "0" })).toEqual([]);
    expect(faultsOf({ radius: "101", azimuth: "3" })).toContain("radius");
    expect(faultsOf({ occurredAt: "2026-02-31 10:00x" })).toEqual(["occurredAt"]);
    expect(faultsOf({ occurredAt: "2999-01-01 10:00" })).toEqual(["occurredAt"]);
    expect(faultsOf({ words: " ", lot: " ", kind: "explosion" })).toEqual(["lot", "kind", "words"]);
  });
});

describe("following up", () => {
  test("is for engineers and process owners, and moves the state with a note", LONG, async () => {
    const { followUp } = await notes();
    const id = await store(technician);
    await expect(followUp(technician, id, { state: "closed", text: "Done" })).rejects.toEqual(status(403));
    await expect(followUp(lead, id, { state: "closed", text: "Done" })).rejects.toEqual(status(403));
    await expect(followUp(guest, id, { state: "closed", text: "Done" })).rejects.toEqual(status(404));
    expect(await followUp(engineer, id, { state: "followed up", text: "Edge grip checked" })).toBeNull();
    expect(await followUp(engineer, id, { state: "open", text: "Back" })).toContain("does not become open");
    expect(await followUp(engineer, id, { state: "closed", text: "Grip replaced" })).toBeNull();
    expect(await followUp(engineer, id, { state: "closed", text: "Again" })).toContain("is closed by now");
    expect(await followUp(engineer, id, { state: "open", text: "It happened again" })).toBeNull();
    const incident = await look(technician, id);
    expect(incident.state).toBe("open");
    expect(incident.notes.map(({ state }) => state)).toEqual(["followed up", "closed", "open"]);
  });

  test("changes nothing else: the database refuses, even its owner", LONG, async () => {
    const id = await store(technician);
    const refused = (sql: string, words: RegExp) => expect(asOwner(database, sql, [id])).rejects.toThrow(words);
    const copied = (changes: string) =>
      `insert into incident select changed.* from incident original, jsonb_populate_record(original,
         '${changes}'::jsonb || jsonb_build_object('id', gen_random_uuid(), 'number', 9999)) changed where original.id = ?`;
    await refused("update incident set broken = 0 where id = ?", /never changes/);
    await refused("update incident set words = 'nothing' where id = ?", /never changes/);
    await refused("update incident set state = 'closed' where id = ?", /with a note/);
    await refused("delete from incident where id = ?", /never deleted/);
    await refused(copied('{"broken": 4}'), /of those are broken/);
    await refused(copied('{"state": "closed"}'), /begins open/);
    await refused(copied('{"radius": 1.2}'), /lies on the wafer/);
    await refused(copied('{"kind": "explosion"}'), /known kinds/);
    const [other] = await asOwner<{ id: string }>(database, "select id from program where slug = 'petrel'");
    await refused(copied(`{"program_id": "${other?.id}"}`), /of one program/);
    const { followUp } = await notes();
    await followUp(engineer, id, { state: "closed", text: "Done" });
    await refused(
      `insert into incident_note select gen_random_uuid(), program_id, id, 'closed', 'more', now(), created_by_id from incident where id = ?`,
      /that is closed/,
    );
    await refused("update incident_note set text = 'x' where incident_id = ?", /never changed/);
  });
});

describe("photos", () => {
  test("lose the place where they were taken, and are made smaller", LONG, async () => {
    const { photoFile } = await photos();
    const file = await photoWithPlace();
    const before = await sharp(file.bytes).metadata();
    expect(before.exif).toBeDefined();
    expect(Buffer.from(file.bytes).includes("Camera of somebody")).toBe(true);
    const id = await store(technician, report(), [file]);
    const { photos: kept } = await look(engineer, id);
    expect(kept).toHaveLength(1);
    expect(Math.max(kept[0]?.width ?? 0, kept[0]?.height ?? 0)).toBe(2000);
    const { bytes, type } = await photoFile(engineer, id, kept[0]?.id);
    expect(type).toBe("image/jpeg");
    const after = await sharp(bytes).metadata();
    expect([after.exif, after.xmp, after.iptc, after.icc]).toEqual([undefined, undefined, undefined, undefined]);
    expect(Buffer.from(bytes).includes("Camera of somebody")).toBe(false);
    expect(Buffer.from(bytes).includes("Exif")).toBe(false);
    await expect(photoFile(guest, id, kept[0]?.id)).rejects.toEqual(status(404));
    await expect(photoFile(technician, await store(engineer), kept[0]?.id)).rejects.toEqual(status(404));
  });

  test("are told by their content, not by their name", LONG, async () => {
    const { reportIncident } = await reporting();
    const named = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });
    const refusal = async (file: UploadedFile) => {
      const reported = await reportIncident(technician, report({ lot: "T-none" }), [file]);
      return reported.outcome === "refused" ? reported.reasons.join(" ") : "stored";
    };
    expect(await refusal(named("wafer.jpg", "<svg onload='alert(1)'>"))).toContain("neither a JPEG nor a PNG");
    expect(await refusal(named("wafer.jpg", "\0\0\0\x18ftypheic\0\0\0\0mif1heic"))).toContain("export it as JPEG");
    const jpeg = (await photoWithPlace(400, 300)).bytes;
    expect(await refusal({ name: "cut.jpg", bytes: jpeg.slice(0, 300) })).toContain("damaged");
    expect(await asOwner(database, "select id from lot where name = 'T-none'")).toEqual([]);
    const png = await sharp({ create: { width: 20, height: 10, channels: 4, background: "#0000" } })
      .png()
      .toBuffer();
    const id = await store(technician, report(), [{ name: "drawing.heic", bytes: new Uint8Array(png) }]);
    expect((await look(engineer, id)).photos).toMatchObject([{ width: 20, height: 10 }]);
  });

  test("are up to six of an incident, the same one once, and none once it is closed", LONG, async () => {
    const { addPhotos } = await photos();
    const { followUp } = await notes();
    const file = await photoWithPlace(40, 30);
    const id = await store(technician, report(), [file, file]);
    expect((await look(engineer, id)).photos).toHaveLength(1);
    expect(await addPhotos(technician, id, [file])).toEqual([]);
    expect(await addPhotos(technician, id, [])).toEqual(["Choose a photo first."]);
    const others = await Promise.all([10, 60, 120, 180, 240].map((shade) => photoWithPlace(40, 30, shade)));
    expect(await addPhotos(lead, id, others)).toEqual([]);
    expect((await look(engineer, id)).photos).toHaveLength(6);
    const [refused] = await addPhotos(technician, id, [await photoWithPlace(41, 30)]);
    expect(refused).toContain("up to 6");
    await expect(addPhotos(guest, id, [file])).rejects.toEqual(status(404));
    await followUp(engineer, id, { state: "closed", text: "Done" });
    expect((await addPhotos(technician, id, [file]))[0]).toContain("is closed");
    await expect(
      asOwner(
        database,
        `insert into incident_photo select gen_random_uuid(), program_id, incident_id, type, width, height, size, 'other', bytes, now(), created_by_id
           from incident_photo where incident_id = ? limit 1`,
        [id],
      ),
    ).rejects.toThrow(/six photos/);
  });
});
