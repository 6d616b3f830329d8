import type { EntityManager } from "@mikro-orm/postgresql";
import { LotHold } from "#app/db/entities/lot-hold.ts";
import { StepStop } from "#app/db/entities/step-stop.ts";
import { BLOCK_CAUSES, whoClears, type BlockCause } from "#app/lib/floor/block-causes.ts";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import { concernsStep } from "#app/lib/floor/same-step.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { FloorBlock, PinnedSheet } from "#app/schemas/floor-view.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** Whether a person may clear a hold or stop of this cause. */
export function mayClear(actor: Actor, programId: string, cause: BlockCause): boolean {
  if (mayInProgram(actor, "clear every hold and stop", programId)) return true;
  return (
    BLOCK_CAUSES[cause] === "shift lead" && mayInProgram(actor, "hold lots and clear what the shift can", programId)
  );
}

interface Asked {
  lot: { id: string; name: string };
  program: string;
  sheet: string;
  pin: PinnedSheet;
  steps: readonly FloorStep[];
}

/** Everything that keeps a lot, or one of its steps, from going on now. */
export async function blocksOf(em: EntityManager, scope: ActorScope, asked: Asked): Promise<FloorBlock[]> {
  return [
    ...revisionBlock(asked.pin),
    ...(await holdsOf(em, scope, asked.lot, asked.program)),
    ...(await stopsOf(em, scope, asked)),
    ...asked.steps.filter(({ stopped }) => stopped).map(assessmentBlock),
  ];
}

function revisionBlock({ state, successor, number, letter }: PinnedSheet): FloorBlock[] {
  if (state === "released") return [];
  return [
    {
      kind: "revision",
      id: null,
      step: null,
      what: successor
        ? `Sheet ${number} ${letter} is ${state} by ${successor.letter}.`
        : `Sheet ${number} ${letter} is ${state}, and no other is in force.`,
      remedy: successor
        ? `Start nothing by it. An engineer or process owner has to move the lot to ${successor.letter}.`
        : "Start nothing by it. Call the process owner.",
      opened: null,
      mayClear: false,
    },
  ];
}

const assessmentBlock = ({ number, title }: FloorStep): FloorBlock => ({
  kind: "assessment",
  id: null,
  step: number,
  what: `The assessment stops step ${number}, ${title}, and no deviation in force lets it run.`,
  remedy: "Do not start it. Call the process owner.",
  opened: null,
  mayClear: false,
});

const OPEN = { clearedAt: null };
const ORDER = { populate: ["openedBy"] as const, orderBy: { openedAt: "asc" as const, id: "asc" as const } };

/** The holds of a lot that are open. */
export async function holdsOf(
  em: EntityManager,
  { actor }: ActorScope,
  lot: { id: string; name: string },
  program: string,
): Promise<FloorBlock[]> {
  const holds = await em.find(LotHold, { lot: lot.id, ...OPEN }, ORDER);
  return holds.map(({ id, cause, reason, openedAt, openedBy }) => ({
    kind: "hold",
    id,
    step: null,
    what: `Lot ${lot.name} is held: ${cause}.`,
    remedy: `It goes nowhere until the ${whoClears(cause)} has cleared it.`,
    opened: { cause, reason, by: openedBy.name, at: openedAt.toISOString() },
    mayClear: mayClear(actor, program, cause),
  }));
}

/** The open stops of a sheet, at the steps of a revision of it that they concern. */
async function stopsOf(
  em: EntityManager,
  { actor }: ActorScope,
  { sheet, pin, steps, program }: Asked,
): Promise<FloorBlock[]> {
  const stops = await em.find(StepStop, { sheet, ...OPEN }, ORDER);
  return stops.flatMap((stop) => {
    const { id, cause, reason, openedAt, openedBy } = stop;
    const stopped = { revision: stop.revision.id, step: stop.step, title: stop.title };
    return steps
      .filter((step) => concernsStep(stopped, pin.revision, step, steps))
      .map(({ number, title }): FloorBlock => ({
        kind: "stop",
        id,
        step: number,
        what: `Step ${number}, ${title}, is stopped for every lot: ${cause}.`,
        remedy: `No lot starts it until the ${whoClears(cause)} has cleared it.`,
        opened: { cause, reason, by: openedBy.name, at: openedAt.toISOString() },
        mayClear: mayClear(actor, program, cause),
      }));
  });
}
