import { entryWords } from "#app/lib/floor/entry-words.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { FloorEntryRow } from "#app/schemas/floor-view.ts";

/** What was entered of a lot, newest first. */
export function FloorEntries({ entries }: { entries: readonly FloorEntryRow[] }) {
  if (entries.length === 0) return null;
  return (
    <section className="mt-5" aria-labelledby="entries">
      <h2 id="entries" className="text-lead font-semibold">
        Entered last
      </h2>
      <ul className="mt-1 border-t border-line">
        {entries.map(({ id, step, content, at, by }) => (
          <li key={id} className="border-b border-line py-2">
            {step !== null && <b>Step {step} </b>}
            <span className="wrap-anywhere">{entryWords(content)}</span>{" "}
            <span className="text-quiet">
              {by}, {minuteOf(at)}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
