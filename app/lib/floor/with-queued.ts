import type { QueuedEntry } from "./floor-store.ts";
import { lotProgress, type LotProgress, type Move } from "./lot-progress.ts";

interface Shown {
  pin: { revision: string; fromStep: number };
  leg: number;
  steps: readonly { number: number }[];
  progress: LotProgress;
  acknowledgedAt: string | null;
}

/** Where a lot is once what waits to be sent is counted in, and whether its sheet is acknowledged by then. */
export function withQueued({ pin, leg, steps, progress, acknowledgedAt }: Shown, queued: readonly QueuedEntry[]) {
  const moves: Move[] = [
    ...progress.done.map((step): Move => ({ kind: "done", step })),
    ...(progress.underWay === null ? [] : [{ kind: "started" as const, step: progress.underWay }]),
  ];
  let acknowledged = acknowledgedAt;
  for (const { fields, refused, at } of queued) {
    const field = new Map(fields);
    if (refused !== null || field.get("revision") !== pin.revision || Number(field.get("leg") ?? 0) !== leg) continue;
    const kind = field.get("kind");
    if (kind === "acknowledged") acknowledged ??= at;
    if (kind === "started" || kind === "done") moves.push({ kind, step: Number(field.get("step")) });
  }
  return {
    progress: lotProgress(
      steps.map(({ number }) => number),
      pin.fromStep,
      moves,
    ),
    acknowledgedAt: acknowledged,
  };
}
