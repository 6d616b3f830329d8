import { randomUUID } from "node:crypto";
import { readFileSync } from "node:fs";
import { MikroORM } from "@mikro-orm/postgresql";
import type { APIRequestContext } from "@playwright/test";
import sharp from "sharp";
import { databaseOptions } from "#app/db/options.ts";
import { TERN } from "./flow-pages.ts";
import { longProfile } from "./long-profile.ts";

/** What stands for the parameters of an address, by their names in the table of routes. */
export type DoorIds = Record<string, string>;

/** Parameters that name something of one program; every other one names something of the whole site. */
export const WALLED: readonly string[] = [
  "flowId",
  "stepId",
  "assessmentId",
  "stackId",
  "scanId",
  "fileId",
  "readingId",
  "jobId",
  "waferId",
  "waferScanId",
  "lotId",
  "revisionId",
  "incidentId",
  "photoId",
  "handOverId",
  "webhookId",
  "deliveryId",
];

type Query = <Row>(sql: string, params?: unknown[]) => Promise<Row[]>;

/** Lets the callback ask the database as its owner, whom no wall stops. */
export async function asOwner<Result>(ask: (query: Query) => Promise<Result>): Promise<Result> {
  const url = process.env["DATABASE_OWNER_URL"];
  if (!url) throw new Error("DATABASE_OWNER_URL is not set: run the browser tests through npm test.");
  const orm = await MikroORM.init({ ...databaseOptions(url), pool: { min: 0, max: 1 } });
  try {
    const connection = orm.em.fork().getConnection();
    return await ask(<Row>(sql: string, params: unknown[] = []) => connection.execute<Row[]>(sql, params));
  } finally {
    await orm.close();
  }
}

async function idOf(query: Query, sql: string, params: unknown[] = []): Promise<string> {
  const [row] = await query<{ id: string }>(sql, params);
  if (!row) throw new Error(`The demo data has no row for: ${sql}`);
  return row.id;
}

const fixture = (name: string) => ({
  name,
  mimeType: "text/csv",
  buffer: readFileSync(new URL(`../../fixtures/scans/${name}`, import.meta.url)),
});

/** Ids of the program Tern, to which every role belongs. The engineer adds an assessment and a scan to the demo's own data. */
export async function ternIds(engineer: APIRequestContext): Promise<DoorIds> {
  const known = await asOwner(async (query) => {
    const flowId = await idOf(query, "select id from flow where name = ?", [TERN]);
    return {
      flowId,
      program: await idOf(query, "select id from program where slug = 'tern'"),
      stepId: await idOf(query, "select id from flow_step where flow_id = ? and position = 1", [flowId]),
      stackId: await idOf(
        query,
        "select s.id from stack s join program p on p.id = s.program_id where p.slug = 'tern'",
      ),
      filmId: await idOf(query, "select id from film where name = 'Polymer dielectric A'"),
      stepTemplateId: await idOf(query, "select id from step_template order by name limit 1"),
      flowTemplateId: await idOf(query, "select id from flow_template order by name limit 1"),
      materialId: await idOf(query, "select id from bonding_material order by name limit 1"),
      instrumentId: await idOf(query, "select id from import_profile order by name limit 1"),
      waferId: await idOf(
        query,
        "select w.id from wafer w join program p on p.id = w.program_id where p.slug = 'tern'",
      ),
      personId: await idOf(query, "select id from person where email = 'guest@kestrel-ridge.example'"),
      recordId: await idOf(query, "select id from carrier order by name limit 1"),
    };
  });
  const added = async (path: string, options: Parameters<APIRequestContext["post"]>[1]) => {
    const { location } = (await engineer.post(path, { ...options, maxRedirects: 0 })).headers();
    const id = location?.split("/").at(-1);
    if (!id) throw new Error(`A post to ${path} led nowhere.`);
    return id;
  };
  const assessmentId = await added(`/flows/${known.flowId}`, { form: { intent: "assess" } });
  const scanId = await added("/scans/new", {
    multipart: {
      program: known.program,
      label: "M-door",
      film: known.filmId,
      orientation: "100",
      filmThickness: "5 um",
      siliconThickness: "725 um",
      diameter: "200 mm",
      edgeExclusion: "5 mm",
      positionUnit: "mm",
      heightUnit: "µm",
      decimalMark: "point",
      before: fixture("monitor-200mm-725um-before-film-seed-7.csv"),
      after: fixture("monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv"),
    },
  });
  const fileId = await asOwner((query) => idOf(query, "select before_id as id from scan where id = ?", [scanId]));
  const readingId = await added("/api/v1/scans", {
    multipart: { program: "tern", file: fixture("monitor-200mm-725um-before-film-seed-7.csv") },
  });
  const jobId = await added("/api/v1/scans", { multipart: { program: "tern", file: longProfile("door.csv", 60_000) } });
  const answer = await engineer.post("/scans/import/file", {
    multipart: {
      program: known.program,
      wafer: "M-door",
      lot: "L-door",
      side: "before",
      lines: "[[0,0]]",
      profile: "{}",
      orientation: "100",
      diameter: "200 mm",
      edgeExclusion: "5 mm",
      file: fixture("monitor-200mm-725um-before-film-seed-7.csv"),
    },
  });
  if (!answer.ok()) throw new Error(`A file was not imported: ${await answer.text()}`);
  const placed = await asOwner(async (query) => ({
    waferScanId: await idOf(
      query,
      "select s.id from wafer_scan s join wafer w on w.id = s.wafer_id where w.name = 'M-door' order by s.created_at limit 1",
    ),
    lotId: await idOf(query, "select id from lot where name = 'L-door'"),
  }));
  await engineer.post(`/assessments/${assessmentId}/review`, { form: { intent: "ask" } });
  const revisionId = await asOwner((query) =>
    idOf(
      query,
      "select r.id from sheet_revision r join sheet s on s.id = r.sheet_id where s.flow_id = ? order by r.asked_at desc",
      [known.flowId],
    ),
  );
  const incident = await reportedIncident(engineer, assessmentId);
  const webhook = await webhookOf(known.program);
  return {
    ...known,
    ...placed,
    ...incident,
    ...webhook,
    revisionId,
    token: "of-no-sheet-whatsoever",
    assessmentId,
    scanId,
    fileId,
    readingId,
    jobId,
    kind: "carriers",
    number: "1",
    "*": "nowhere/at/all",
  };
}

/** An incident with a photo, reported as its form does. */
async function reportedIncident(engineer: APIRequestContext, assessment: string) {
  const answer = await engineer.post("/incidents/new", {
    multipart: {
      assessment,
      leg: "0",
      step: "3",
      lot: "L-door",
      kind: "chip",
      severity: "near miss",
      words: "At the door",
      id: randomUUID(),
      occurredAt: "2026-11-20 10:00",
      photos: {
        name: "door.png",
        mimeType: "image/png",
        buffer: await sharp({ create: { width: 8, height: 8, channels: 3, background: "#345" } })
          .png()
          .toBuffer(),
      },
    },
  });
  if (!answer.ok()) throw new Error(`No incident was reported: ${await answer.text()}`);
  return asOwner(async (query) => {
    const incidentId = await idOf(
      query,
      "select id from incident where words = 'At the door' order by created_at desc",
    );
    return {
      incidentId,
      photoId: await idOf(query, "select id from incident_photo where incident_id = ?", [incidentId]),
      handOverId: await idOf(
        query,
        `insert into hand_over (id, program_id, given, place, remark, lots, given_at, given_by_id)
           select gen_random_uuid(), program_id, gen_random_uuid(), 'At the door', '', '[]', now(), created_by_id
             from incident where id = ? returning id`,
        [incidentId],
      ),
    };
  });
}

/** A webhook of somebody of another account than all visitors, with a delivery that ended. */
function webhookOf(program: string) {
  return asOwner(async (query) => {
    const webhookId = await idOf(
      query,
      `insert into webhook (id, program_id, name, address, events, sealed_secret, secret_made_at, state, off_reason, failures, created_at,
                            created_by_id)
         select gen_random_uuid(), ?, 'At the door', 'https://receiver.example/', '[]', '', now(), 'off', '', 0, now(), p.id
           from person p where p.email = 'second-process-owner@kestrel-ridge.example' returning id`,
      [program],
    );
    const deliveryId = await idOf(
      query,
      `insert into webhook_delivery (id, program_id, webhook_id, event, key, event_id, about, body, state, attempts, tries, next_try_at,
                                     reason, created_at, by_hand)
         values (gen_random_uuid(), ?, ?, 'test', 'door', gen_random_uuid(), '', '{}', 'parked', 0, '[]', now(), '', now(), false)
         returning id`,
      [program, webhookId],
    );
    return { webhookId, deliveryId };
  });
}

/** Copies of the same rows in a program of their own, to which nobody belongs. */
export function strangeIds(own: DoorIds): Promise<DoorIds> {
  return asOwner(async (query) => {
    const name = `heron-${randomUUID()}`;
    const program = await idOf(
      query,
      `insert into program (id, name, slug, purpose, diameter, created_at)
         values (gen_random_uuid(), ?, ?, 'Nobody belongs to it', 0.2, now()) returning id`,
      [name, name],
    );
    const copy = (table: string, id: string | undefined, changes: Record<string, unknown> = {}) =>
      idOf(
        query,
        `insert into "${table}" select changed.* from "${table}" original,
           jsonb_populate_record(original, ?::jsonb || jsonb_build_object('id', gen_random_uuid())) changed
           where original.id = ? returning id`,
        [JSON.stringify({ program_id: program, ...changes }), id],
      );
    const flowId = await copy("flow", own["flowId"]);
    const fileId = await copy("scan_file", own["fileId"]);
    const readingId = await copy("scan_reading", own["readingId"], { file_id: fileId });
    const lotId = await copy("lot", own["lotId"]);
    const assessmentId = await copy("assessment", own["assessmentId"], { flow_id: flowId });
    const sheetId = await idOf(
      query,
      `insert into sheet (id, program_id, flow_id, number, created_at, created_by_id)
         select gen_random_uuid(), program_id, flow_id, 1, created_at, created_by_id from assessment where id = ? returning id`,
      [assessmentId],
    );
    const wafer = await idOf(
      query,
      `insert into wafer (id, program_id, lot_id, name, created_at, created_by_id)
         select gen_random_uuid(), program_id, id, 'M-door', created_at, created_by_id from lot where id = ? returning id`,
      [lotId],
    );
    const incidentId = await copy("incident", own["incidentId"], {
      assessment_id: assessmentId,
      lot_id: lotId,
      wafer_id: null,
    });
    const webhookId = await copy("webhook", own["webhookId"]);
    return {
      ...own,
      webhookId,
      deliveryId: await copy("webhook_delivery", own["deliveryId"], { webhook_id: webhookId }),
      flowId,
      fileId,
      incidentId,
      photoId: await copy("incident_photo", own["photoId"], { incident_id: incidentId }),
      stepId: await copy("flow_step", own["stepId"], { flow_id: flowId }),
      assessmentId,
      revisionId: await copy("sheet_revision", own["revisionId"], { sheet_id: sheetId, assessment_id: assessmentId }),
      stackId: await copy("stack", own["stackId"]),
      readingId,
      lotId,
      handOverId: await copy("hand_over", own["handOverId"]),
      waferScanId: await copy("wafer_scan", own["waferScanId"], { wafer_id: wafer, reading_id: readingId }),
      jobId: await copy("job", own["jobId"]),
      waferId: await copy("wafer", own["waferId"], { lot_id: null }),
      scanId: await copy("scan", own["scanId"], { before_id: fileId, after_id: fileId }),
    };
  });
}
