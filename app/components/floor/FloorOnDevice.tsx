import type { ReactNode } from "react";
import { FLOOR_DEEDS, floorPath } from "#app/lib/floor/floor-path.ts";
import { withQueued } from "#app/lib/floor/with-queued.ts";
import type { FloorLot } from "#app/schemas/floor-view.ts";
import { FloorQueue } from "./FloorQueue.tsx";
import { KeptNotice } from "./KeptNotice.tsx";
import { OutboxContext, useFloorOutbox } from "./use-floor-outbox.ts";
import { useFloorWorker } from "./use-floor-worker.ts";

interface Props {
  lot: FloorLot;
  /** number of the step on the screen; null on the lot's own */
  step: number | null;
  /** draws the screen with the lot as it is once what waits is counted in, and with what there is to say of that */
  children: (lot: FloorLot, notices: ReactNode) => ReactNode;
}

/** What this device does for a lot beside showing it: keeps its pages, and holds what was entered until the server has it. */
export function FloorOnDevice({ lot, step, children }: Props) {
  const { id, personId, sheet, checkedAt } = lot;
  const outbox = useFloorOutbox(personId, id);
  const leg = sheet?.leg ?? 0;
  const here = floorPath(id, null, leg);
  const numbers = (sheet?.steps ?? []).map(({ number }) => number);
  // Forms are kept of the step that is worked on and of the next one: those of all steps would be hundreds.
  const worked = numbers.indexOf(step ?? sheet?.progress.here ?? -1);
  const near = worked < 0 ? [] : numbers.slice(worked, worked + 2);
  useFloorWorker([
    here,
    ...numbers.map((number) => floorPath(id, number, leg)),
    ...near.flatMap((number) => FLOOR_DEEDS.map((deed) => floorPath(id, number, leg, deed))),
  ]);
  const counted = sheet && { ...sheet, ...withQueued(sheet, outbox.queued) };
  const notices = (
    <>
      <KeptNotice checkedAt={checkedAt} />
      <FloorQueue outbox={outbox} here={here} />
    </>
  );
  return (
    <OutboxContext value={{ outbox, person: personId, lot: id }}>
      {children({ ...lot, sheet: counted }, notices)}
    </OutboxContext>
  );
}
