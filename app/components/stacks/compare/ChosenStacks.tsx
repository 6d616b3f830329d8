import { Link } from "react-router";
import { comparisonSearch, moved, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import type { ComparisonChart, ComparisonView } from "#app/schemas/stack-comparison.ts";
import { comparisonPlot } from "./comparison-plot.ts";
import { PlotKey } from "./PlotKey.tsx";

interface Props {
  asked: ComparisonAsked;
  stacks: ComparisonView["stacks"];
  chart: ComparisonChart | null;
}

/** The stacks that are compared, in the order of their columns: each may be moved and taken out. */
export function ChosenStacks({ asked, stacks, chart }: Props) {
  const plot = chart && comparisonPlot(chart);
  const { ids } = asked;
  return (
    <section aria-labelledby="chosen" className="min-w-0 p-4 tablet:px-6">
      <h2 id="chosen" className="font-semibold">
        Compared
      </h2>
      {stacks.length === 0 ? (
        <p className="mt-1 text-quiet">No stack is chosen.</p>
      ) : (
        <ol className="mt-1 divide-y divide-line">
          {stacks.map(({ id, letter, name, program }, n) => (
            <li key={id} className="flex flex-wrap items-center gap-x-3 gap-y-1 py-1">
              <b className="w-4">{letter}</b>
              {plot ? (
                <svg width="40" height="12" viewBox="0 -6 40 12" aria-hidden="true" className="flex-none">
                  <PlotKey plot={plot} letter={letter} />
                </svg>
              ) : null}
              <span className="min-w-0 flex-1 basis-48">
                <Link to={`/stacks/${id}`} className="link">
                  {name}
                </Link>{" "}
                <span className="text-quiet">{program}</span>
              </span>
              <span className="screen-only flex gap-x-4">
                <Move to={n > 0 ? comparisonSearch(asked, { ids: moved(ids, id, -1) }) : null} name={name} earlier />
                <Move
                  to={n < stacks.length - 1 ? comparisonSearch(asked, { ids: moved(ids, id, 1) }) : null}
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
