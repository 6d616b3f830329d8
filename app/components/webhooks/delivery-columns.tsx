import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { eventWords, type DeliveryRow, type DeliveryState } from "#app/schemas/webhook.ts";

/** How far a delivery is, in words. */
export const DELIVERY_STATE_WORDS: Record<DeliveryState, string> = {
  waiting: "Waits",
  sending: "Being sent",
  sent: "Sent",
  parked: "Parked",
};

/** How a delivery stands, in a sentence or the minute at which it was taken. */
export function howItStands({ state, attempts, reason, nextTryAt, sentAt }: DeliveryRow): string {
  if (sentAt !== null) return minuteOf(sentAt);
  if (state !== "waiting" || attempts === 0) return reason;
  const tried = attempts === 1 ? "One attempt" : `${attempts} attempts`;
  return `${tried}, the next at ${minuteOf(nextTryAt)}. ${reason}`;
}

/** Columns of a webhook's log, by the names of their sorts. */
export const DELIVERY_COLUMNS: Column<DeliveryRow>[] = [
  {
    key: "event",
    head: "Event",
    cell: ({ id, event, about }) => (
      <>
        <Link to={`deliveries/${id}`} className="link">
          {eventWords(event)}
          <span className="sr-only">, {about}</span>
        </Link>
        <span className="block text-label wrap-anywhere text-quiet" aria-hidden>
          {about}
        </span>
      </>
    ),
  },
  {
    key: "state",
    head: "State",
    cell: (row) => (
      <>
        <span className={row.state === "parked" ? "font-semibold text-stop" : ""}>
          {DELIVERY_STATE_WORDS[row.state]}
        </span>
        <span className="block text-label wrap-anywhere text-quiet">{howItStands(row)}</span>
      </>
    ),
  },
  { key: "written", head: "Written", sortable: true, wide: true, cell: ({ createdAt }) => minuteOf(createdAt) },
];
