import { minuteOf } from "#app/lib/minute-of.ts";
import type { FloorOutbox } from "./use-floor-outbox.ts";

/** What was entered and the server does not have: what waits, what it did not take, and what went out since. */
export function FloorQueue({ outbox: { queued, sent, drop, observe } }: { outbox: FloorOutbox }) {
  const waiting = queued.filter(({ refused }) => refused === null);
  const refused = queued.filter((entry) => entry.refused !== null);
  return (
    <>
      {sent.length > 0 && (
        <p role="status" className="mb-4 border-l-4 border-clear bg-raised p-3 text-lead">
          {sent.length === 1
            ? "1 entry that waited has been sent."
            : `${sent.length} entries that waited have been sent.`}
        </p>
      )}
      {waiting.length > 0 && (
        <section
          role="status"
          aria-label="Entries that wait"
          className="mb-4 border-2 border-caution bg-raised p-4 text-lead"
        >
          <p className="font-semibold">
            {waiting.length === 1 ? "1 entry waits" : `${waiting.length} entries wait`} for the connection. A hold, a
            stop or an incident tells nobody before it is sent: call.
          </p>
          <ul className="list-disc pl-5">
            {waiting.map(({ id, words, at }) => (
              <li key={id}>
                {words}, {minuteOf(at)}
              </li>
            ))}
          </ul>
        </section>
      )}
      {refused.map((entry) => (
        <section key={entry.id} role="alert" className="mb-4 border-2 border-stop bg-raised p-4 text-lead">
          <p className="font-semibold text-stop">
            Not taken: {entry.words}, entered {minuteOf(entry.at)}
          </p>
          <p>{entry.refused}</p>
          <div className="mt-2 flex flex-wrap gap-3">
            {entry.fields.length > 0 && (
              <button type="button" className="btn min-h-14" onClick={() => void observe(entry)}>
                Keep it as an observation
              </button>
            )}
            <button type="button" className="btn btn-remove min-h-14" onClick={() => void drop(entry.id)}>
              Drop it
            </button>
          </div>
        </section>
      ))}
    </>
  );
}
