import type { EntityManager } from "@mikro-orm/postgresql";
import { FloorEntry } from "#app/db/entities/floor-entry.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { FloorEntryRow, FloorLot, FloorSheet } from "#app/schemas/floor-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { blocksOf, holdsOf } from "./blocks.server.ts";
import { acknowledgement, progressOf } from "./entries.server.ts";
import { lotClocks } from "./lot-clocks.server.ts";
import { findFloorLot, pinsOf, pinView, type Pin } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";

/**
 * A lot as the floor works on it, with one part of its flow: the steps of its sheet, where it is, what blocks it, and its clocks.
 * @param askedLeg number of the leg, as the address gives it; the first one when it names none
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function floorLot(
  scope: ActorScope,
  lotId: string | undefined,
  askedLeg: string | null,
): Promise<FloorLot> {
  return inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId);
    const { id, name, note, program } = lot;
    const statuses = await em.find(Wafer, { lot: id }, { fields: ["status"] });
    const pins = await pinsOf(em, id);
    return {
      id,
      name,
      note,
      program: program.name,
      wafers: { total: statuses.length, inLine: statuses.filter(({ status }) => status === "in line").length },
      holds: await holdsOf(em, scope, lot, program.id),
      sheet: pins[0] ? await floorSheet(em, scope, lot, pins, askedLeg) : null,
      mayHold: mayInProgram(scope.actor, "hold lots and clear what the shift can", program.id),
      person: scope.actor.name,
      personId: scope.actor.id,
      checkedAt: new Date().toISOString(),
    };
  });
}

/** Lots show so many of their entries. */
const ENTRIES = 30;

async function floorSheet(
  em: EntityManager,
  scope: ActorScope,
  lot: Awaited<ReturnType<typeof findFloorLot>>,
  pins: readonly Pin[],
  askedLeg: string | null,
): Promise<FloorSheet | null> {
  const [pin] = pins;
  if (!pin) return null;
  const { revision } = pin;
  const view = await pinView(em, pin, lot.program.slug);
  const { parts, steps: stepsOf } = await sheetParts(em, revision);
  const part = parts.find(({ leg }) => String(leg) === askedLeg) ?? parts[0];
  if (!part) throw new Error("a released revision has at least one paper");
  const { leg, document } = part;
  const steps = stepsOf(leg);
  const progress = await progressOf(em, lot.id, pin, leg, steps);
  const { hands, diameter } = document;
  return {
    pin: view,
    legs: parts.map(({ leg: number, name }) => ({ leg: number, name })),
    leg,
    diameter,
    exaggeration: hands.exaggeration,
    steps,
    support: hands.support,
    cautions: hands.cautions,
    emergency: hands.emergency,
    deviations: hands.deviations,
    progress,
    acknowledgedAt: (await acknowledgement(em, scope, revision.id))?.toISOString() ?? null,
    blocks: await blocksOf(em, scope, {
      lot,
      program: lot.program.id,
      sheet: revision.sheet.id,
      pin: view,
      steps,
    }),
    clocks: await lotClocks(em, lot.id, pins, leg, steps, progress),
    entries: await entriesOf(em, lot.id, leg),
  };
}

async function entriesOf(em: EntityManager, lot: string, leg: number): Promise<FloorEntryRow[]> {
  const entries = await em.find(
    FloorEntry,
    { lot, leg },
    { populate: ["createdBy"], orderBy: { receivedAt: "desc", id: "asc" }, limit: ENTRIES },
  );
  return entries.map(({ id, step, content, at, receivedAt, createdBy }) => ({
    id,
    step: step ?? null,
    content,
    at: at.toISOString(),
    receivedAt: receivedAt.toISOString(),
    by: createdBy.name,
  }));
}
