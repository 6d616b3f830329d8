import { useId } from "react";
import { Form } from "react-router";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { HandOverRow } from "#app/schemas/hand-over.ts";
import { FloorHead } from "./FloorHead.tsx";
import { KeptLine } from "./KeptLine.tsx";

interface Props {
  query: string;
  rows: readonly HandOverRow[];
  /** whether one has just been given */
  given: boolean;
  person: { id: string; name: string };
  /** ISO, when all this was so */
  checkedAt: string;
}

/** What was handed over at which place: first what waits to be taken, then what was. */
export function HandOverList({ query, rows, given, person, checkedAt }: Props) {
  const id = useId();
  const waiting = rows.filter(({ taken, replaced }) => taken === null && !replaced);
  const past = rows.filter((row) => !waiting.includes(row));
  return (
    <>
      <FloorHead person={person.name} personId={person.id} />
      <main id="main" className="mx-auto max-w-240 px-4 py-6 tablet:px-6">
        <KeptLine checkedAt={checkedAt} what="A place is handed over and taken with a connection, or on paper." />
        <h1 className="text-answer font-medium">Hand-overs</h1>
        {given && (
          <p role="status" className="mt-3 border-l-4 border-clear pl-3 text-lead">
            The place is handed over. You answer for it until somebody of the next shift has taken it.
          </p>
        )}
        <a
          href="/floor/hand-overs/new"
          className="btn btn-primary fresh-only mt-4 min-h-27 w-full text-figure tablet:w-100"
        >
          Hand a place over
        </a>
        <Form method="get" discover="none" className="mt-4 flex flex-wrap items-end gap-3">
          <div className="min-w-60 flex-1">
            <label htmlFor={id} className="block text-lead">
              Place
            </label>
            <input
              id={id}
              name="place"
              defaultValue={query}
              key={query}
              autoComplete="off"
              className="input mt-1 min-h-14 text-lead"
            />
          </div>
          <button type="submit" className="btn min-h-14 min-w-40 text-lead">
            Find
          </button>
        </Form>
        {rows.length === 0 && (
          <p role="status" className="mt-6 text-lead text-quiet">
            {query === ""
              ? "Nothing has been handed over yet. What a shift leaves at a place will stand here, until the next one has taken it and after."
              : `No place called “${query}” has been handed over.`}
          </p>
        )}
        <Rows title="To be taken" rows={waiting} />
        <Rows title="Before" rows={past} />
      </main>
    </>
  );
}

function Rows({ title, rows }: { title: string; rows: readonly HandOverRow[] }) {
  if (rows.length === 0) return null;
  return (
    <section className="mt-6">
      <h2 className="text-lead font-semibold">{title}</h2>
      <ul className="mt-2 border-t border-ink">
        {rows.map((row) => (
          <li key={row.id} className="border-b border-line">
            <a
              href={`/floor/hand-overs/${row.id}`}
              className="flex min-h-20 flex-wrap items-center gap-x-4 px-2 py-2 no-underline"
            >
              <span className="text-figure font-semibold wrap-anywhere">{row.place}</span>
              <span className="text-lead text-quiet">
                {row.program}, {row.lots === 1 ? "1 lot" : `${row.lots} lots`}, {row.by}, {minuteOf(row.at)}.{" "}
                {stateOf(row)}
              </span>
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** How a hand-over stands, in a sentence. */
export function stateOf({ taken, replaced, own }: HandOverRow): string {
  if (taken) return `Taken by ${taken.by}, ${minuteOf(taken.at)}.`;
  if (replaced) return "Never taken: the place was handed over again.";
  return own ? "Not taken yet; somebody else takes it." : "Not taken yet.";
}
