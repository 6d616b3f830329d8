import { z } from "zod";
import { FloorEntry } from "#app/db/entities/floor-entry.ts";
import { Lot } from "#app/db/entities/lot.ts";
import { WAFER_STATUSES } from "#app/lib/wafer-status.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { assignSheet } from "../../floor/assign-sheet.server.ts";
import { enter } from "../../floor/entries.server.ts";
import { lotDesk } from "../../floor/lot-desk.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { getLot } from "../../wafers/lots.server.ts";
import { makeLots } from "../../wafers/new-lots.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { ApiRefused, refusedAt } from "../refused.server.ts";
import { id, idParam, moment, programQuery, programSlug } from "../shapes.ts";
import { programNamed } from "./stacks.server.ts";

const row = z.object({ id, name: z.string(), note: z.string(), program: programSlug, created_at: moment });
const lot = z.object({
  id,
  name: z.string(),
  note: z.string(),
  program: z.string(),
  wafers: z.array(z.object({ id, name: z.string(), slot: z.int().nullable(), status: z.enum(WAFER_STATUSES) })),
  sheet: z
    .object({ revision_id: id, number: z.string(), letter: z.string(), state: z.string(), from_step: z.int() })
    .nullable(),
  places: z
    .array(
      z.object({
        leg: z.int(),
        name: z.string(),
        here: z.object({ step: z.int(), title: z.string(), under_way: z.boolean() }).nullable(),
        steps_done: z.int(),
        steps: z.int(),
      }),
    )
    .describe("Where it is, by part of its flow; empty before it is on a sheet."),
  blocks: z.array(z.object({ kind: z.string(), step: z.int().nullable(), what: z.string(), remedy: z.string() })),
});

async function lotJson(scope: ActorScope, lotId: string): Promise<z.input<typeof lot>> {
  const found = await getLot(scope, lotId);
  const desk = await lotDesk(scope, lotId);
  return {
    id: found.id,
    name: found.name,
    note: found.note,
    program: found.program.name,
    wafers: found.wafers.map(({ id: wafer, name, slot, status }) => ({ id: wafer, name, slot, status })),
    sheet: desk.pin && {
      revision_id: desk.pin.revision,
      number: desk.pin.number,
      letter: desk.pin.letter,
      state: desk.pin.state,
      from_step: desk.pin.fromStep,
    },
    places: desk.parts.map(({ leg, name, here, done, total }) => ({
      leg,
      name,
      here: here && { step: here.number, title: here.title, under_way: here.underWay },
      steps_done: done,
      steps: total,
    })),
    blocks: desk.blocks.map(({ kind, step, what, remedy }) => ({ kind, step, what, remedy })),
  };
}

const lotBody = z.strictObject({
  program: programSlug.max(80),
  name: z
    .string()
    .trim()
    .min(1)
    .max(80)
    .regex(/^[^;\t\r\n"]*$/, "may not hold a semicolon, a quote or a line break"),
  wafers: z
    .array(
      z.strictObject({
        slot: z.int().min(1).max(25).optional(),
        name: z
          .string()
          .trim()
          .max(80)
          .regex(/^[^;\t\r\n"]*$/, "may not hold a semicolon, a quote or a line break"),
      }),
    )
    .max(25),
});

/** The wafers as the table that the service reads, so that one reader has all the rules. */
const tableOf = (wafers: z.output<typeof lotBody>["wafers"]) =>
  ["slot;wafer", ...wafers.map(({ slot, name }) => `${slot ?? ""};${name}`)].join("\n");

const assignBody = z.strictObject({
  revision_id: id,
  from_step: z.int().min(1).max(999),
  reason: z.string().trim().max(1000).optional().describe("Needed where the lot is on another revision already."),
});

const entry = z.object({
  id,
  lot_id: id,
  revision_id: id,
  leg: z.int(),
  step: z.int().nullable(),
  kind: z.string(),
  content: z.record(z.string(), z.unknown()).describe("What was entered; lengths in m."),
  at: moment.describe("By the clock of the device."),
  received_at: moment,
});
const entryJson = (found: FloorEntry): z.input<typeof entry> => ({
  id: found.id,
  lot_id: found.lot.id,
  revision_id: found.revision.id,
  leg: found.leg,
  step: found.step ?? null,
  kind: found.kind,
  content: { ...found.content },
  at: found.at.toISOString(),
  received_at: found.receivedAt.toISOString(),
});

const observationBody = z.strictObject({
  id: id.describe("Made by who sends it, so that it counts once."),
  revision_id: id.describe("The revision by which the lot is worked."),
  leg: z.int().min(0).max(25).optional(),
  step: z.int().min(1).max(999).optional(),
  text: z.string().trim().min(1).max(1000),
  wafers: z.int().min(0).max(999).optional().describe("How many it was seen on."),
  at: moment.optional(),
});

const one = idParam("lot_id");

export const lotOperations = [
  operation({
    id: "listLots",
    method: "GET",
    path: "/lots",
    scope: "lots:read",
    group: "Lots",
    summary: "Lots, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery }),
    answer: pageOf(row),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const program = programFilter(scope.actor, "see the work", query.program);
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, Lot, { program }, "createdAt", query, { populate: ["program"] }),
      );
      const data = rows.map(({ id: lotId, name, note, program: of, createdAt }) => ({
        id: lotId,
        name,
        note,
        program: of.slug,
        created_at: createdAt.toISOString(),
      }));
      return { answer: { data, next_cursor } };
    },
  }),
  operation({
    id: "getLot",
    method: "GET",
    path: "/lots/{lot_id}",
    scope: "lots:read",
    group: "Lots",
    summary: "One lot: its wafers, its sheet, where it is and what holds it",
    params: one,
    answer: lot,
    handle: async ({ scope, params }) => ({ answer: await lotJson(scope, params.lot_id) }),
  }),
  operation({
    id: "createLot",
    method: "POST",
    path: "/lots",
    scope: "lots:write",
    group: "Lots",
    summary: "Make a lot with its wafers",
    body: lotBody,
    answer: lot,
    status: 201,
    handle: async ({ scope, body }) => {
      const program = programNamed(scope, body.program);
      const wafers = body.wafers.length === 0 ? "" : tableOf(body.wafers);
      const made = await makeLots(scope, { program, name: body.name, wafers });
      if (made.outcome === "refused")
        throw new ApiRefused(
          422,
          "The lot was not made.",
          made.faults.map((detail) => ({ pointer: "", detail })),
        );
      if (made.only === null) throw refusedAt("/name", "One lot is made at a time.");
      const answer = await lotJson(scope, made.only);
      return { answer, status: 201, headers: { Location: `/api/v1/lots/${made.only}` } };
    },
  }),
  operation({
    id: "assignSheet",
    method: "POST",
    path: "/lots/{lot_id}/sheet",
    scope: "lots:write",
    group: "Lots",
    summary: "Put a lot on a released revision of a sheet, or move it to another one",
    params: one,
    body: assignBody,
    answer: lot,
    handle: async ({ scope, params, body }) => {
      const assigned = await assignSheet(scope, params.lot_id, {
        revision: body.revision_id,
        fromStep: body.from_step,
        reason: body.reason ?? "",
      });
      const pointers = { intent: "", revision: "/revision_id", fromStep: "/from_step", reason: "/reason" };
      if (assigned.outcome === "refused") throw refusedAt(pointers[assigned.field], assigned.sentence);
      return { answer: await lotJson(scope, params.lot_id) };
    },
  }),
  operation({
    id: "listFloorEntries",
    method: "GET",
    path: "/floor-entries",
    scope: "floor:read",
    group: "Floor",
    summary: "What the floor entered, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery, lot_id: id.optional() }),
    answer: pageOf(entry),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const where = {
        program: programFilter(scope.actor, "see the work", query.program),
        ...(query.lot_id !== undefined && { lot: query.lot_id }),
      };
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, FloorEntry, where, "receivedAt", query),
      );
      return { answer: { data: rows.map(entryJson), next_cursor } };
    },
  }),
  operation({
    id: "recordObservation",
    method: "POST",
    path: "/lots/{lot_id}/observations",
    scope: "floor:write",
    group: "Floor",
    summary: "Write down what was seen of a lot",
    params: one,
    body: observationBody,
    answer: entry,
    status: 201,
    handle: async ({ scope, params, body }) => {
      const entered = await enter(scope, params.lot_id, {
        kind: "observed",
        id: body.id,
        revision: body.revision_id,
        leg: body.leg ?? 0,
        step: body.step ?? null,
        at: body.at === undefined ? null : new Date(body.at),
        text: body.text,
        count: body.wafers ?? null,
      });
      if (entered.outcome === "refused") throw refusedAt("", entered.sentence);
      const found = await inScope(scope, (em) => em.findOne(FloorEntry, { id: body.id, lot: params.lot_id }));
      if (!found) throw refusedAt("/id", "That id is of another entry. Make a new one.");
      return { answer: entryJson(found), status: 201 };
    },
  }),
];
