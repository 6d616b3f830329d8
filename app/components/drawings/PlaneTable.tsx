import type { ReactNode } from "react";

interface Props {
  /** folded words to open it by */
  summary: string;
  caption: string;
  /** heads of the columns and of the rows, from above */
  columns: readonly string[];
  rows: readonly { head: string; cells: readonly ReactNode[] }[];
  open?: boolean;
}

/** Every few places of a drawing over two quantities in words. */
export function PlaneTable({ summary, caption, columns, rows, open = true }: Props) {
  return (
    <details className="mt-4" open={open}>
      <summary className="link w-fit cursor-pointer">{summary}</summary>
      <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
        <table className="table">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              <td />
              {columns.map((head) => (
                <th key={head} scope="col" className="whitespace-nowrap">
                  {head}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ head, cells }) => (
              <tr key={head}>
                <th scope="row" className="whitespace-nowrap">
                  {head}
                </th>
                {cells.map((cell, index) => (
                  <td key={columns[index] ?? index}>{cell}</td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
