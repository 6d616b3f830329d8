import type { MergeChoices, MergeRow, Whose } from "#app/lib/stack-merge-rows.ts";

const WHO: Record<MergeRow["by"], string> = { both: "both of you", them: "they did", you: "you did" };

interface Props {
  rows: readonly MergeRow[];
  by: string;
  choices: MergeChoices;
  onChoose: (key: string, whose: Whose) => void;
}

/** What each has made of it beside what it was, and whose is to stand: chosen already where only one has changed it. */
export function MergeTable({ rows, by, choices, onChoose }: Props) {
  return (
    <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label="What each has changed">
      <table className="table border-t border-ink">
        <caption className="sr-only">What each has changed, and whose is to stand</caption>
        <thead>
          <tr>
            <th scope="col">Field</th>
            <th scope="col" className="max-tablet:hidden">
              Who changed it
            </th>
            <th scope="col" className="max-tablet:hidden">
              As you opened it
            </th>
            <th scope="col">Yours</th>
            <th scope="col">Saved by {by}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.key} row={row} chosen={choices[row.key]} onChoose={(whose) => onChoose(row.key, whose)} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

interface RowProps {
  row: MergeRow;
  chosen: Whose | undefined;
  onChoose: (whose: Whose) => void;
}

function Row({ row, chosen, onChoose }: RowProps) {
  const { key, label, opened, by } = row;
  const stands = chosen ?? (by === "both" ? null : by === "you" ? "mine" : "theirs");
  const asked = by === "both" && stands === null;
  return (
    <tr>
      <th scope="row" className={by === "both" ? "font-semibold" : "font-normal"}>
        {label}
        <span className="block text-label font-normal text-quiet tablet:hidden">{`${WHO[by]}; it was ${opened}`}</span>
        {asked && <span className="block text-label font-semibold text-stop">choose one</span>}
      </th>
      <td className={`max-tablet:hidden ${by === "both" ? "font-semibold" : ""}`}>{WHO[by]}</td>
      <td className="text-quiet max-tablet:hidden">{opened}</td>
      {(["mine", "theirs"] as const).map((whose) => (
        <td key={whose} className={stands !== null && stands !== whose ? "text-quiet" : undefined}>
          <label className="flex min-h-6 items-baseline gap-2 max-tablet:min-h-11">
            {/* Of no form: the stack's own fields beside it are what is sent. */}
            <input
              type="radio"
              className="accent-ink"
              form="none"
              name={`whose ${key}`}
              data-undecided={asked || undefined}
              aria-label={`${label}: ${whose === "mine" ? "yours" : "theirs"}, ${row[whose]}`}
              checked={stands === whose}
              onChange={() => onChoose(whose)}
            />
            {row[whose]}
          </label>
        </td>
      ))}
    </tr>
  );
}
