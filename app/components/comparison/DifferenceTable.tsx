import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { comparisonSearch, type ComparisonAsked } from "#app/lib/comparison/asked.ts";
import { onlyDifferences } from "#app/lib/comparison/only-differences.ts";
import type { ComparedCell, ComparedGroup, ComparedMember } from "#app/schemas/comparison.ts";

interface Props {
  asked: ComparisonAsked;
  members: readonly ComparedMember[];
  groups: readonly ComparedGroup[];
  /** what its rows are, for those who do not see it */
  caption: string;
  /** how its marks are to be read, besides the bar */
  note: string;
}

const STICKY = "sticky left-0 bg-raised";

/** Figures and inputs as rows, members as columns; what is not as in the first is marked with a bar and in bold. */
export function DifferenceTable({ asked, members, groups, caption, note }: Props) {
  const shown = asked.only ? onlyDifferences(groups) : groups;
  const differing = groups.flatMap(({ rows }) => rows).filter(({ differs }) => differs).length;
  const all = groups.flatMap(({ rows }) => rows).length;
  return (
    <>
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2 id="differences" className="font-semibold">
          What differs
        </h2>
        <nav aria-label="Rows" className="screen-only flex gap-x-4">
          {([false, true] as const).map((only) => (
            <Link
              key={String(only)}
              to={comparisonSearch(asked, { only })}
              replace
              preventScrollReset
              aria-current={asked.only === only ? "true" : undefined}
              className="link inline-flex min-h-8 items-center aria-[current=true]:font-semibold aria-[current=true]:text-ink aria-[current=true]:no-underline"
            >
              {only ? `Only what differs (${differing})` : `Everything (${all})`}
            </Link>
          ))}
        </nav>
      </div>
      <p className="text-quiet">
        Bold behind a bar: not as in {members[0]?.letter ?? "the first"}. {noBreak(note)}
      </p>
      {shown.length === 0 ? (
        <p className="mt-2">Nothing differs: they are the same in all {all} rows.</p>
      ) : (
        <div className="relative mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="Differences, row by row">
          <table className="table">
            <caption className="sr-only">{caption}</caption>
            <thead>
              <tr>
                <th scope="col" className={`${STICKY} min-w-32`}>
                  What
                </th>
                {members.map(({ id, letter, name }) => (
                  <th key={id} scope="col" className="min-w-40">
                    <b className="text-ink">{letter}</b> {name}
                  </th>
                ))}
              </tr>
            </thead>
            {shown.map(({ key, title, rows }) => (
              <tbody key={key}>
                <tr>
                  <th scope="rowgroup" colSpan={members.length + 1} className="bg-wash!">
                    <span className="sticky left-2 font-semibold">{noBreak(title)}</span>
                  </th>
                </tr>
                {rows.map((row) => (
                  <tr key={row.key} className={row.differs ? "" : "text-quiet"}>
                    <th scope="row" className={`${STICKY} max-w-48 font-normal`}>
                      {noBreak(row.label)}
                      {row.differs ? <span className="block text-label font-semibold">differs</span> : null}
                    </th>
                    {row.cells.map((cell, column) => (
                      <Cell key={members[column]?.id ?? column} cell={cell} />
                    ))}
                  </tr>
                ))}
              </tbody>
            ))}
          </table>
        </div>
      )}
    </>
  );
}

function Cell({ cell: { text, note, differs } }: { cell: ComparedCell }) {
  return (
    <td className="align-top">
      <span className={`block border-l-3 pl-2 ${differs ? "border-ink font-semibold" : "border-transparent"}`}>
        {differs ? <span className="sr-only">differs: </span> : null}
        {noBreak(text)}
        {note === null ? null : <span className="block text-label font-normal text-quiet">{noBreak(note)}</span>}
      </span>
    </td>
  );
}
