import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { FloorEntry } from "#app/db/entities/floor-entry.ts";
import { runningClocks, type Clock, type ClockMove } from "#app/lib/floor/clocks.ts";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import { stepOfLeg } from "#app/lib/step-prediction.ts";
import type { LotProgress } from "#app/lib/floor/lot-progress.ts";
import { readLimits } from "../limits.server.ts";
import type { Pin } from "./lot-sheet.server.ts";

/** The clocks of a lot that run. A grind that was done by a sheet that the lot is not on any more counts as well. */
export async function lotClocks(
  em: EntityManager,
  lot: string,
  pins: readonly Pin[],
  leg: number,
  steps: readonly FloorStep[],
  { here }: LotProgress,
): Promise<Clock[]> {
  const [current] = pins;
  const entries = await em.find(
    FloorEntry,
    { lot, kind: { $in: ["started", "done"] } },
    { orderBy: { receivedAt: "asc", id: "asc" } },
  );
  const assessments = new Map(pins.map(({ revision }) => [revision.id, revision.assessment.id]));
  const results = await em.find(Assessment, { id: { $in: [...assessments.values()] } }, { fields: ["result"] });
  const moves = entries.flatMap((entry): ClockMove[] => {
    const { revision, step: number, kind, at } = entry;
    if (revision.id === current?.revision.id && entry.leg !== leg) return [];
    const whole = results.find(({ id }) => id === assessments.get(revision.id))?.result;
    const step = whole && number ? stepOfLeg(whole, entry.leg, number) : undefined;
    if (!step || (kind !== "started" && kind !== "done")) return [];
    return [{ kind, stepKind: step.kind, planned: step.planned, at: at.toISOString() }];
  });
  const ahead = steps.filter(({ number }) => here !== null && number >= here);
  const tape = steps.find(({ number }) => number === here)?.tapeTime ?? null;
  return runningClocks(
    moves,
    ahead.map(({ kind }) => kind),
    await readLimits(em),
    tape,
  );
}
