import { useId } from "react";
import { Form } from "react-router";
import type { FoundLot, FoundLots } from "#app/schemas/floor-view.ts";
import { CameraFinder } from "./CameraFinder.tsx";
import { FloorHead } from "./FloorHead.tsx";
import { KeptLine } from "./KeptLine.tsx";
import { useFloorWorker } from "./use-floor-worker.ts";

interface Props {
  found: FoundLots;
  person: { id: string; name: string };
  /** hand-overs that somebody has to take */
  waiting: number;
  /** ISO, when all this was so */
  checkedAt: string;
}

const PATHS = ["/floor", "/floor/hand-overs"];

/**
 * Finds a lot by its name, typed or read by a hand-held scanner, which types and presses enter: the field has the focus, and a name that
 * is a lot's opens it at once.
 */
export function FloorFind({ found, person, waiting, checkedAt }: Props) {
  const id = useId();
  const { query, rows, mine } = found;
  useFloorWorker(PATHS);
  return (
    <>
      <FloorHead person={person.name} personId={person.id} />
      <main id="main" className="mx-auto max-w-240 px-4 py-6 tablet:px-6">
        <KeptLine
          checkedAt={checkedAt}
          what="Only lots that were opened on this device in the last 12 hours can be opened."
        />
        <h1 className="text-answer font-medium">Find a lot</h1>
        <Form method="get" discover="none" className="mt-4 flex flex-wrap items-end gap-3">
          <div className="min-w-60 flex-1">
            <label htmlFor={id} className="block text-lead">
              Lot, typed or scanned
            </label>
            <input
              id={id}
              name="lot"
              defaultValue={query}
              key={query}
              // The first thing that anybody does here, with a scanner in the hand.
              autoFocus
              autoComplete="off"
              autoCapitalize="characters"
              enterKeyHint="search"
              className="input mt-1 min-h-27 text-answer"
            />
          </div>
          <button type="submit" className="btn btn-primary min-h-27 min-w-40 text-figure">
            Find
          </button>
        </Form>
        <CameraFinder />
        <a href="/floor/hand-overs" className="btn mt-4 min-h-27 w-full text-figure">
          Hand-overs{waiting > 0 && `, ${waiting} to take`}
        </a>
        {query !== "" &&
          (rows.length === 0 ? (
            <p role="status" className="mt-6 text-lead">
              No lot is called “{query}”. Look at the label again, or ask an engineer to make the lot.
            </p>
          ) : (
            <Lots
              title={`${rows.length} ${rows.length === 1 ? "lot has" : "lots have"} that in the name`}
              lots={rows}
            />
          ))}
        {query === "" && mine.length > 0 && <Lots title="Your last lots" lots={mine} />}
        {query === "" && mine.length === 0 && (
          <p className="mt-6 text-lead text-quiet">The lots that you work on will stand here.</p>
        )}
      </main>
    </>
  );
}

function Lots({ title, lots }: { title: string; lots: readonly FoundLot[] }) {
  return (
    <section className="mt-6">
      <h2 className="text-lead font-semibold">{title}</h2>
      <ul className="mt-2 border-t border-ink">
        {lots.map(({ id, name, program, sheet }) => (
          <li key={id} className="border-b border-line">
            <a href={`/floor/lots/${id}`} className="flex min-h-27 flex-wrap items-center gap-x-4 px-2 no-underline">
              <span className="text-answer font-semibold wrap-anywhere">{name}</span>
              <span className="text-lead text-quiet">
                {program}, {sheet === null ? "on no sheet" : `sheet ${sheet}`}
              </span>
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}
