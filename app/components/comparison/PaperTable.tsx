import { noBreak } from "#app/components/drawings/no-break.ts";
import { HEAD_COLUMN } from "#app/lib/comparison/paper-rows.ts";
import type { ComparedGroup, ComparedMember } from "#app/schemas/comparison.ts";

interface Props {
  members: readonly ComparedMember[];
  groups: readonly ComparedGroup[];
  /** what its rows are, for those who do not see it */
  caption: string;
}

const EDGE = "border-t-[0.2mm] border-line px-[1mm] py-[0.4mm] align-top";

/** The rows of a comparison on paper: letters as heads, notes left out. */
export function PaperTable({ members, groups, caption }: Props) {
  return (
    <table className="w-full table-fixed border-collapse text-left text-[8pt]/[3.6mm]">
      <caption className="sr-only">{caption}</caption>
      <colgroup>
        <col style={{ width: `${HEAD_COLUMN}mm` }} />
        {members.map(({ id }) => (
          <col key={id} />
        ))}
      </colgroup>
      <thead>
        <tr>
          <th scope="col" className="px-[1mm] pl-[3mm] font-normal">
            What
          </th>
          {members.map(({ id, letter }) => (
            <th key={id} scope="col" className="px-[1mm] font-semibold">
              {letter}
            </th>
          ))}
        </tr>
      </thead>
      {groups.map(({ key, title, rows }) => (
        <tbody key={key}>
          <tr>
            <th
              scope="rowgroup"
              colSpan={members.length + 1}
              className="border-t-[0.25mm] border-ink bg-wash px-[3mm] py-[0.4mm] font-semibold"
            >
              {noBreak(title)}
            </th>
          </tr>
          {rows.map(({ key: row, label, cells }) => (
            <tr key={row}>
              <th scope="row" className={`${EDGE} pl-[3mm] font-normal`}>
                {noBreak(label)}
              </th>
              {cells.map(({ text, differs }, column) => (
                <td key={members[column]?.id ?? column} className={`${EDGE} ${differs ? "font-semibold" : ""}`}>
                  {noBreak(text)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      ))}
    </table>
  );
}
