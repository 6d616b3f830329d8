import { Link } from "react-router";
import { comparisonSearch, moved, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import type { ComparedKind } from "#app/lib/comparison/kinds.ts";
import type { Plot } from "#app/components/drawings/plot.ts";
import type { ComparedMember } from "#app/schemas/comparison.ts";
import { PlotKey } from "./PlotKey.tsx";

interface Props {
  kind: ComparedKind;
  asked: ComparisonAsked;
  members: readonly ComparedMember[];
  /** null while nothing is compared */
  plot: Plot | null;
}

/** What is compared, in the order of their columns: each may be moved and taken out. */
export function ChosenMembers({ kind, asked, members, plot }: Props) {
  const { ids } = asked;
  return (
    <section aria-labelledby="chosen" className="min-w-0 p-4 tablet:px-6">
      <h2 id="chosen" className="font-semibold">
        Compared
      </h2>
      {members.length === 0 ? (
        <p className="mt-1 text-quiet">No {kind.one} is chosen.</p>
      ) : (
        <ol className="mt-1 divide-y divide-line">
          {members.map(({ id, letter, name, program }, n) => (
            <li key={id} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-1">
              <b className="w-4">{letter}</b>
              {plot ? (
                <svg width="40" height="12" viewBox="0 -6 40 12" aria-hidden="true" className="flex-none">
                  <PlotKey plot={plot} letter={letter} />
                </svg>
              ) : null}
              <span className="min-w-0 flex-1 basis-48">
                <Link to={`${kind.path}/${id}`} className="link">
                  {name}
                </Link>{" "}
                <span className="text-quiet">{program}</span>
              </span>
              <span className="screen-only flex gap-x-4">
                <Move to={n > 0 ? comparisonSearch(asked, { ids: moved(ids, id, -1) }) : null} name={name} earlier />
                <Move
                  to={n < members.length - 1 ? comparisonSearch(asked, { ids: moved(ids, id, 1) }) : null}
                  name={name}
                />
                <Link
                  to={comparisonSearch(asked, { ids: ids.filter((other) => other !== id) })}
                  replace
                  preventScrollReset
                  className="link inline-flex min-h-8 items-center"
                >
                  Remove<span className="sr-only"> {name}</span>
                </Link>
              </span>
            </li>
          ))}
        </ol>
      )}
    </section>
  );
}

/** Keeps its place where there is nowhere to go, so that the others do not jump. */
function Move({ to, name, earlier = false }: { to: string | null; name: string; earlier?: boolean }) {
  const word = earlier ? "Up" : "Down";
  if (to === null) return <span className="invisible inline-flex min-h-8 items-center">{word}</span>;
  return (
    <Link to={to} replace preventScrollReset className="link inline-flex min-h-8 items-center">
      {word}
      <span className="sr-only"> {name}</span>
    </Link>
  );
}
