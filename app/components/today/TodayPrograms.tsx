import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { TodayProgram } from "#app/schemas/today.ts";

/** The programs of a person; with what there is in them for those who see the work. */
export function TodayPrograms({ programs, works }: { programs: TodayProgram[]; works: boolean }) {
  return (
    <section aria-labelledby="programs" className="border-t border-ink pt-3">
      <h2 id="programs" className="font-semibold">
        Programs
      </h2>
      <table className="table mt-1">
        <caption className="sr-only">Your programs</caption>
        <thead>
          <tr>
            <th scope="col">Program</th>
            <th scope="col" className="num">
              Wafer
            </th>
            {works && (
              <>
                <th scope="col" className="num">
                  Flows
                </th>
                <th scope="col" className="num">
                  Stacks
                </th>
              </>
            )}
          </tr>
        </thead>
        <tbody>
          {programs.map(({ id, name, slug, diameter, purpose, flows, stacks }) => (
            <tr key={id}>
              <th scope="row" className="font-normal">
                <span className="font-semibold">{name}</span>
                <span className="block text-label text-quiet">{noBreak(purpose)}</span>
              </th>
              <td className="num">{formatQuantity(diameter, "length", { unit: "mm" })}</td>
              {works && (
                <>
                  <td className="num">
                    <Counted count={flows} what={`flows of ${name}`} to={`/flows?program=${slug}`} />
                  </td>
                  <td className="num">
                    <Counted count={stacks} what={`stacks of ${name}`} to={`/stacks?program=${slug}`} />
                  </td>
                </>
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

function Counted({ count, what, to }: { count: number; what: string; to: string }) {
  if (count === 0) return <span className="text-quiet">0</span>;
  return (
    <Link to={to} className="link inline-block min-w-6 py-0.5" aria-label={`${count} ${what}`}>
      {count}
    </Link>
  );
}
