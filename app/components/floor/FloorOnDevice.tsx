import { useEffect, useState, type ReactNode } from "react";
import { useRevalidator } from "react-router";
import { FLOOR_DEEDS, floorPath } from "#app/lib/floor/floor-path.ts";
import type { QueuedEntry } from "#app/lib/floor/floor-store.ts";
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
  /** somebody may be typing: the page stays as it came */
  isForm: boolean;
  /** draws the screen with the lot as it is once what waits is counted in, and with what there is to say of that */
  children: (lot: FloorLot, notices: ReactNode) => ReactNode;
}

/** What this device does for a lot beside showing it: keeps its pages, and holds what was entered until the server has it. */
export function FloorOnDevice({ lot, step, isForm, children }: Props) {
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
  const unseen = useUnseen(outbox.sent, isForm);
  const counted = sheet && { ...sheet, ...withQueued(sheet, [...unseen, ...outbox.queued]) };
  const notices = (
    <>
      <KeptNotice checkedAt={checkedAt} />
      <FloorQueue outbox={outbox} />
    </>
  );
  return (
    <OutboxContext value={{ outbox, person: personId, lot: id }}>
      {children({ ...lot, sheet: counted }, notices)}
    </OutboxContext>
  );
}

/** Asks for the lot anew when entries have gone out. @returns those that what is shown was read before, to be counted in still */
function useUnseen(sent: QueuedEntry[], isForm: boolean): QueuedEntry[] {
  const { revalidate } = useRevalidator();
  const [seen, setSeen] = useState(0);
  const count = sent.length;
  useEffect(() => {
    if (count === 0 || isForm) return;
    void revalidate().then(() => {
      setSeen(count);
      // A page that this device had kept is no older than any other now.
      delete document.documentElement.dataset["keptAt"];
    });
  }, [count, isForm, revalidate]);
  return sent.slice(seen);
}
