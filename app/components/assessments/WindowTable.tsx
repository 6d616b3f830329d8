import { OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import type { WindowDrawing, WindowInput } from "#app/schemas/process-window.ts";

interface Props {
  drawing: WindowDrawing;
  x: WindowInput;
  y: WindowInput;
}

const figure = (value: number) => `${value < 0 ? "−" : ""}${Number(Math.abs(value).toPrecision(4))}`;

/** Every few places of a process window in words. */
export function WindowTable({ drawing: { table, tableX }, x, y }: Props) {
  const caption = `Verdict by ${y.label}, down, and ${x.label}, across`;
  return (
    <details className="mt-4" open>
      <summary className="link w-fit cursor-pointer">Verdicts as a table</summary>
      <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
        <table className="table">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              <td />
              {tableX.map((value) => (
                <th key={value} scope="col" className="whitespace-nowrap">
                  {figure(value)}&nbsp;{x.unit}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {table.map((row) => (
              <tr key={row.y}>
                <th scope="row" className="whitespace-nowrap">
                  {figure(row.y)}&nbsp;{y.unit}
                </th>
                {row.cells.map(({ outcome, margin }, index) => (
                  <td key={tableX[index] ?? index}>
                    {OUTCOME_SIGNS[outcome].word}
                    {margin === null ? null : (
                      <span className="block text-label text-quiet">
                        {margin < 0 ? "−" : ""}
                        {Math.abs(Math.round(margin * 100))}&nbsp;%
                      </span>
                    )}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
