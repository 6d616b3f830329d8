import { noBreak } from "#app/components/drawings/no-break.ts";
import { HEAD_COLUMN } from "#app/lib/stack-comparison/paper-rows.ts";
import type { ComparedGroup, ComparisonView } from "#app/schemas/stack-comparison.ts";

interface Props {
  stacks: ComparisonView["stacks"];
  groups: readonly ComparedGroup[];
}

const EDGE = "border-t-[0.2mm] border-line px-[1mm] py-[0.4mm] align-top";

/** The rows of a comparison on paper: letters as heads, notes left out. */
export function PaperTable({ stacks, groups }: Props) {
  return (
    <table className="w-full table-fixed border-collapse text-left text-[8pt]/[3.6mm]">
      <caption className="sr-only">Figures and inputs of the stacks, side by side</caption>
      <colgroup>
        <col style={{ width: `${HEAD_COLUMN}mm` }} />
        {stacks.map(({ id }) => (
          <col key={id} />
        ))}
      </colgroup>
      <thead>
        <tr>
          <th scope="col" className="px-[1mm] pl-[3mm] font-normal">
            What
          </th>
          {stacks.map(({ id, letter }) => (
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
              colSpan={stacks.length + 1}
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
                <td key={stacks[column]?.id ?? column} className={`${EDGE} ${differs ? "font-semibold" : ""}`}>
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
