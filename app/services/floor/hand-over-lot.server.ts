import type { EntityManager } from "@mikro-orm/postgresql";
import { FloorEntry } from "#app/db/entities/floor-entry.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import type { StepResult } from "#app/schemas/assessment-result.ts";
import { entryWords } from "#app/lib/floor/entry-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { stepOfLeg } from "#app/lib/step-prediction.ts";
import type { HandOverLot } from "#app/schemas/hand-over.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { blocksOf, holdsOf } from "./blocks.server.ts";
import { progressOf } from "./entries.server.ts";
import { lotClocks } from "./lot-clocks.server.ts";
import { pinsOf, pinView, type findFloorLot, type Pin } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";

type FoundLot = Awaited<ReturnType<typeof findFloorLot>>;
type Standing = Omit<HandOverLot, "on" | "remark">;

/** A shift, and what the one before it left untold. */
const HOURS = 12;

/** A lot as it stands now, in the words of a hand-over. */
export async function lotStanding(em: EntityManager, scope: ActorScope, lot: FoundLot, now: Date): Promise<Standing> {
  const statuses = await em.find(Wafer, { lot: lot.id }, { fields: ["status"] });
  const pins = await pinsOf(em, lot.id);
  const wafers = { total: statuses.length, inLine: statuses.filter(({ status }) => status === "in line").length };
  const about = { id: lot.id, name: lot.name, wafers };
  const [pin] = pins;
  if (!pin) {
    const holds = await holdsOf(em, scope, lot, lot.program.id);
    return { ...about, sheet: null, at: [], clocks: [], blocks: holds.map(({ what }) => what), odd: [] };
  }
  return { ...about, ...(await onSheet(em, scope, lot, [pin, ...pins.slice(1)], now)) };
}

async function onSheet(
  em: EntityManager,
  scope: ActorScope,
  lot: FoundLot,
  pins: readonly [Pin, ...Pin[]],
  now: Date,
): Promise<Omit<Standing, "id" | "name" | "wafers">> {
  const [pin] = pins;
  const view = await pinView(em, pin, lot.program.slug);
  const { parts, steps: stepsOf, result } = await sheetParts(em, pin.revision);
  const at: string[] = [];
  const blocks = new Set<string>();
  const clocks = new Map<string, Standing["clocks"][number]>();
  for (const { leg, name } of parts) {
    const steps = stepsOf(leg);
    const progress = await progressOf(em, lot.id, pin, leg, steps);
    const step = steps.find(({ number }) => number === progress.here);
    const which = parts.length > 1 ? `${name}: ` : "";
    const state = progress.underWay === null ? "is next" : "is under way";
    at.push(which + (step ? `step ${step.number}, ${step.title}, ${state}` : "the last step is done"));
    const asked = { lot, program: lot.program.id, sheet: pin.revision.sheet.id, pin: view, steps };
    for (const block of await blocksOf(em, scope, asked))
      if (block.kind !== "assessment" || block.step === progress.here) blocks.add(block.what);
    for (const clock of await lotClocks(em, lot.id, pins, leg, steps, progress))
      clocks.set(`${clock.name} ${clock.since}`, clock);
  }
  const since = new Date(now.getTime() - HOURS * 3600e3);
  const entries = await em.find(
    FloorEntry,
    { lot: lot.id, kind: { $in: ["measured", "observed"] }, receivedAt: { $gte: since, $lte: now } },
    { orderBy: { receivedAt: "asc", id: "asc" } },
  );
  const odd = entries.flatMap(({ step, leg, revision, content, at: when }) => {
    const of = step && revision.id === pin.revision.id ? stepOfLeg(result, leg, step) : undefined;
    const words = oddWords(content, of);
    return words === null ? [] : [`${step ? `Step ${step}: ` : ""}${words}, ${minuteOf(when.toISOString())}`];
  });
  return {
    sheet: `${view.number} ${view.letter}`,
    at,
    clocks: [...clocks.values()],
    blocks: [...blocks],
    odd,
  };
}

/**
 * What the next shift has to know of an entry; null for a reading that its step stands. How the wafer was loaded is not asked: a reading
 * counts against the tighter of the tool's limits.
 */
function oddWords(content: FloorEntry["content"], step: StepResult | undefined): string | null {
  if (content.kind === "observed") return entryWords(content);
  if (content.kind !== "measured") return null;
  const limits = [step?.equipment?.edgesUp, step?.equipment?.edgesDown].filter((limit) => typeof limit === "number");
  return limits.length > 0 && Math.abs(content.value) > Math.min(...limits)
    ? `${entryWords(content)}, over what its tool takes`
    : null;
}
