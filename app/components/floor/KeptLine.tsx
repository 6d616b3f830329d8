import { minuteOf } from "#app/lib/minute-of.ts";

/** Shown on a list that this device kept: how old it is, and what can't be done meanwhile. */
export function KeptLine({ checkedAt, what }: { checkedAt: string; what: string }) {
  return (
    <p role="alert" className="kept-only mb-4 border-2 border-stop bg-raised p-4 text-lead">
      <b className="text-stop">No connection.</b> This is as it was at {minuteOf(checkedAt)}. {what}
    </p>
  );
}
