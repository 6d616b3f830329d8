import { Link } from "react-router";
import { minuteOf } from "#app/lib/minute-of.ts";
import { eventWords, type WebhookRow } from "#app/schemas/webhook.ts";
import { stateWords } from "./state-words.ts";

/** Webhooks by their names, each with where it goes and how it stands. */
export function WebhookList({ rows }: { rows: WebhookRow[] }) {
  return (
    <section aria-labelledby="webhooks" className="frame">
      <h2 id="webhooks" className="px-4 pt-3 pb-2 font-semibold">
        Webhooks
      </h2>
      <ul>
        {rows.map((row) => {
          const { id, name, program, address, events, madeBy, lastSentAt } = row;
          const { words, tone } = stateWords(row);
          return (
            <li
              key={id}
              className="flex flex-wrap items-baseline gap-x-4 gap-y-1 border-t border-line px-4 py-3 tablet:grid tablet:grid-cols-[minmax(0,1fr)_220px]"
            >
              <div className="min-w-0 basis-full">
                <p className="wrap-anywhere">
                  <Link to={`/webhooks/${id}`} className="link font-semibold">
                    {name}
                  </Link>
                  , {program}, made by {madeBy}
                </p>
                <p className="wrap-anywhere text-quiet">
                  <code>{address}</code> {events.map(eventWords).join("; ")}
                </p>
              </div>
              <p>
                {lastSentAt ? `Last taken ${minuteOf(lastSentAt)}` : "Nothing taken yet"}
                <span className={`block text-label ${tone}`}>{words}</span>
              </p>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
