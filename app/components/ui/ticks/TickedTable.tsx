import { Link } from "react-router";
import type { TickedRow, TickedRows } from "#app/lib/ticked-rows.ts";

interface Props extends TickedRows {
  caption: string;
  /** head of the column with the words: 'What happens', 'What happened' */
  head: string;
  /** what a row is called: one, several */
  what: readonly [string, string];
}

const WORDS: Record<TickedRow["state"], string> = { "to do": "", done: "Done", left: "Left as it is" };

/** What was ticked, row by row, with what becomes of each. */
export function TickedTable({ caption, head, what: [one, many], rows, hidden }: Props) {
  return (
    <>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
        <table className="table border-t border-ink">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              <th scope="col">{one.charAt(0).toUpperCase() + one.slice(1)}</th>
              <th scope="col" className="max-tablet:hidden">
                Program
              </th>
              <th scope="col">{head}</th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ id, name, program, path, state, words }) => (
              <tr key={id}>
                <th scope="row" className="font-normal wrap-anywhere">
                  {path === null ? (
                    name
                  ) : (
                    <Link to={path} className="link">
                      {name}
                    </Link>
                  )}
                  <span className="block text-label text-quiet tablet:hidden">{program}</span>
                </th>
                <td className="max-tablet:hidden">{program}</td>
                <td>
                  {state !== "to do" && <strong className="font-semibold">{WORDS[state]}. </strong>}
                  {words}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {hidden > 0 && (
        <p className="mt-3 text-quiet">
          {hidden === 1
            ? `One more ${one} was ticked that is not there any more, or is not yours to see.`
            : `${hidden} more ${many} were ticked that are not there any more, or are not yours to see.`}
        </p>
      )}
    </>
  );
}
