import type { EntityManager } from "@mikro-orm/postgresql";
import { FloorEntry } from "#app/db/entities/floor-entry.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import { lotProgress, type LotProgress, type Move } from "#app/lib/floor/lot-progress.ts";
import type { FloorContent, FloorEntryForm } from "#app/schemas/floor-entry.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { lockSheetOf } from "../sheets/revision.server.ts";
import { blocksOf } from "./blocks.server.ts";
import { compareReading } from "./compare-reading.server.ts";
import { findFloorLot, pinsOf, pinView, type Pin } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";

/** What became of an entry: it stands, as it did before if it was sent again, or it is refused with what to do. */
export type Entered = { outcome: "stored" } | { outcome: "refused"; sentence: string };

const refused = (sentence: string): Entered => ({ outcome: "refused", sentence });

/** The beginnings and ends of steps among entries, in the order in which they came in. */
export function movesOf(entries: readonly Pick<FloorEntry, "kind" | "step">[]): Move[] {
  return entries.flatMap(({ kind, step }) =>
    (kind === "started" || kind === "done") && typeof step === "number" ? [{ kind, step }] : [],
  );
}

/** Where a lot is by one revision of its sheet, in one part of its flow. */
export async function progressOf(
  em: EntityManager,
  lot: string,
  pin: Pin,
  leg: number,
  steps: readonly { number: number }[],
): Promise<LotProgress> {
  const entries = await em.find(
    FloorEntry,
    { lot, revision: pin.revision.id, leg, receivedAt: { $gte: pin.createdAt } },
    { orderBy: { receivedAt: "asc", id: "asc" } },
  );
  return lotProgress(
    steps.map(({ number }) => number),
    pin.fromStep,
    movesOf(entries),
  );
}

/**
 * Takes what somebody on the floor says of a lot. Sent again it counts once. What is refused is not stored, and the sentence says what
 * to do; a step is not begun while anything blocks it, and what was done or seen is taken in any case.
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function enter(scope: ActorScope, lotId: string | undefined, form: FloorEntryForm): Promise<Entered> {
  return inScope(scope, async (em): Promise<Entered> => {
    const lot = await findFloorLot(em, scope, lotId, undefined, true);
    const { id, revision, leg, step, at, ...content } = form;
    if (await em.findOne(FloorEntry, { id })) return { outcome: "stored" };
    const pins = await pinsOf(em, lot.id);
    const pin = pins.find((each) => each.revision.id === revision);
    if (!pin) return refused("The lot was never on this sheet. Open the lot again, and enter it there.");
    await lockSheetOf(em, pin.revision.sheet.flow.id);
    await em.refresh(pin.revision);
    const parts = await sheetParts(em, pin.revision);
    const steps = parts.steps(leg);
    const here = steps.find(({ number }) => number === step) ?? null;
    if (step !== null && !here) return refused(`Step ${step} is not on this sheet. Open the lot again.`);
    const asked: Asked = { pin, newest: pins[0] ?? pin, leg, here, steps, content };
    if (content.kind === "acknowledged" && (await acknowledgement(em, scope, revision))) return { outcome: "stored" };
    const sentence = await whyNot(em, scope, lot, asked);
    if (sentence !== null) return refused(sentence);
    const now = new Date();
    // A clock that runs ahead would make every other one wrong.
    const when = at === null || at > now ? now : at;
    em.create(FloorEntry, {
      id,
      program: lot.program.id,
      lot: lot.id,
      revision,
      leg,
      step,
      kind: content.kind,
      content,
      at: when,
      receivedAt: now,
      createdBy: scope.actor.id,
    });
    if (content.kind === "measured" && step !== null) {
      const { done } = await progressOf(em, lot.id, pin, leg, steps);
      const assessment = { id: pin.revision.assessment.id, result: parts.result };
      const isDone = done.includes(step);
      const by = scope.actor.id;
      const program = lot.program.id;
      compareReading(em, { id, program, lot: lot.name, assessment, leg, step, isDone, content, at: when, by });
    }
    await em.flush();
    return { outcome: "stored" };
  });
}

/** When a person acknowledged a revision; null before. */
export async function acknowledgement(
  em: EntityManager,
  { actor }: ActorScope,
  revision: string,
): Promise<Date | null> {
  const entry = await em.findOne(FloorEntry, { revision, kind: "acknowledged", createdBy: actor.id });
  return entry?.at ?? null;
}

interface Asked {
  pin: Pin;
  /** the one that counts */
  newest: Pin;
  leg: number;
  here: FloorStep | null;
  steps: readonly FloorStep[];
  content: FloorContent;
}

type FoundLot = Awaited<ReturnType<typeof findFloorLot>>;

/** Why an entry is not taken, and what to do; null when it is. */
async function whyNot(em: EntityManager, scope: ActorScope, lot: FoundLot, asked: Asked): Promise<string | null> {
  const { content, here } = asked;
  switch (content.kind) {
    case "observed":
      return null;
    case "measured":
      return here ? null : "Say at which step it was measured. Open the step, and enter it there.";
    case "acknowledged":
      return notCurrent(asked);
    case "done":
      return notDone(em, lot, asked);
    case "started":
      return notCurrent(asked) ?? notStarted(em, scope, lot, asked);
  }
}

function notCurrent({ pin, newest }: Asked): string | null {
  if (newest.revision.id !== pin.revision.id)
    return `The lot has been moved to revision ${revisionLetters(newest.revision.number ?? 1)}. Open it again, and work by that one.`;
  if (pin.revision.state !== "released")
    return `This sheet is ${pin.revision.state}: start nothing by it. Call an engineer or the process owner to move the lot.`;
  return null;
}

async function notDone(em: EntityManager, lot: FoundLot, { pin, leg, here, steps }: Asked): Promise<string | null> {
  if (!here) return "Say which step is done. Open the step, and enter it there.";
  const { underWay } = await progressOf(em, lot.id, pin, leg, steps);
  if (underWay === here.number) return null;
  return underWay === null
    ? `Step ${here.number} has not been started. Start it first, or write what was done as an observation.`
    : `Step ${underWay} is under way, not step ${here.number}. Open step ${underWay}.`;
}

async function notStarted(
  em: EntityManager,
  scope: ActorScope,
  lot: FoundLot,
  { pin, leg, here, steps }: Asked,
): Promise<string | null> {
  if (!here) return "Say which step begins. Open the step, and start it there.";
  if (!(await acknowledgement(em, scope, pin.revision.id)))
    return "You have not acknowledged this sheet. Read it on the lot’s page, acknowledge it, and start then.";
  const { underWay } = await progressOf(em, lot.id, pin, leg, steps);
  if (underWay !== null) return `Step ${underWay} is under way. Enter that it is done before another one starts.`;
  const { program } = lot;
  const view = await pinView(em, pin, program.slug);
  const blocks = await blocksOf(em, scope, {
    lot,
    program: program.id,
    sheet: pin.revision.sheet.id,
    pin: view,
    steps,
  });
  const block = blocks.find(({ step }) => step === null || step === here.number);
  return block ? `${block.what} ${block.remedy}` : null;
}
