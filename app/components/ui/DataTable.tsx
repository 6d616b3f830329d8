import type { ReactNode } from "react";
import { Link, useSearchParams } from "react-router";
import { PAGE_SIZE, withParams, type ListPage } from "#app/lib/list-params.ts";
import { OwnFigure, OwnHead, useOwnText } from "#app/components/units/OwnFigure.tsx";

export interface Column<Row> {
  key: string;
  head: string;
  /** unit on the head's second line */
  unit?: string;
  numeric?: boolean;
  sortable?: boolean;
  /** left out on a phone */
  wide?: boolean;
  cell: (row: Row) => ReactNode;
}

interface Props<Row> {
  caption: string;
  columns: Column<Row>[];
  page: ListPage<Row>;
  rowKey: (row: Row) => string;
}

/** A list that sorts by its heads and pages at its foot, both through the address. */
export function DataTable<Row>({ caption, columns, page, rowKey }: Props<Row>) {
  const { params, rows, total } = page;
  const own = useOwnText();
  const [search] = useSearchParams();
  const align = ({ numeric, wide }: Column<Row>) =>
    `${numeric ? "num" : ""} ${wide ? "max-tablet:hidden print:table-cell" : ""}`;
  return (
    <>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
        <table className="table border-t border-ink">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              {columns.map((column) => {
                const current = params.sort === column.key;
                const next = current && !params.descending ? `-${column.key}` : column.key;
                const order = current ? (params.descending ? "descending" : "ascending") : undefined;
                return (
                  <th key={column.key} scope="col" className={align(column)} aria-sort={order}>
                    {column.sortable ? (
                      <Link
                        to={withParams(search, { sort: next, page: null })}
                        className="text-inherit no-underline"
                        preventScrollReset
                      >
                        {own(column.head)}
                        {current && <SortSign descending={params.descending} />}
                      </Link>
                    ) : (
                      column.head
                    )}
                    {column.unit && (
                      <span className="block font-normal text-quiet">
                        <OwnHead unit={column.unit} />
                      </span>
                    )}
                  </th>
                );
              })}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={rowKey(row)}>
                {columns.map((column) => (
                  <td key={column.key} className={align(column)}>
                    {column.unit ? <OwnFigure unit={column.unit}>{column.cell(row)}</OwnFigure> : column.cell(row)}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <Pager total={total} page={params.page} shown={rows.length} />
    </>
  );
}

function SortSign({ descending }: { descending: boolean }) {
  return (
    <svg width="9" height="7" className="ml-1 inline" aria-hidden>
      <path d={descending ? "M0 1H9L4.5 7Z" : "M0 6H9L4.5 0Z"} fill="currentColor" />
    </svg>
  );
}

function Pager({ total, page, shown }: { total: number; page: number; shown: number }) {
  const [search] = useSearchParams();
  const first = (page - 1) * PAGE_SIZE + 1;
  const pages = Math.max(1, Math.ceil(total / PAGE_SIZE));
  return (
    <nav aria-label="Pages" className="screen-only flex flex-wrap items-center gap-3 border-t border-ink py-3">
      <p className="text-quiet">{shown === 0 ? `None of ${total}` : `${first} to ${first + shown - 1} of ${total}`}</p>
      {pages > 1 && (
        <div className="ml-auto flex items-center gap-3">
          {page > 1 && (
            <Link className="btn" to={withParams(search, { page: String(page - 1) })} rel="prev">
              Previous
            </Link>
          )}
          <span>
            Page {page} of {pages}
          </span>
          {page < pages && (
            <Link className="btn" to={withParams(search, { page: String(page + 1) })} rel="next">
              Next
            </Link>
          )}
        </div>
      )}
    </nav>
  );
}
