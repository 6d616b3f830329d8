import type { ReactNode } from "react";
import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable, type Column } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { ListPage } from "#app/lib/list-params.ts";

/** How a kind of library record is listed. */
export interface ListView<Row> {
  title: string;
  one: string;
  many: string;
  /** address of the list; a record's own is below it */
  path: string;
  filters: { name: string; label: string; options: { value: string; label: string }[] }[];
  /** columns after the name, which comes first */
  columns: Column<Row>[];
  /** one or two sentences: what belongs in this list and what it is for */
  belongs: string;
}

interface Props<Row> {
  view: ListView<Row>;
  page: ListPage<Row>;
  mayEdit: boolean;
  /** what else can be done with the list */
  more?: ReactNode;
  /** column of boxes, and the bar above the table that says what is done with what is ticked */
  ticks?: { column: Column<Row>; bar: ReactNode };
}

/** A list of the library: search, filters, sorted and paged table, or what belongs here when it is empty. */
export function LibraryList<Row extends { id: string; name: string }>({
  view,
  page,
  mayEdit,
  more,
  ticks,
}: Props<Row>) {
  const { title, one, many, path, filters, columns, belongs } = view;
  const { total, rows, params } = page;
  const searched = params.query !== "" || Object.values(params.filters).some(Boolean);
  const add = mayEdit && (
    <Link to={`${path}/new`} className="btn btn-primary">
      Add a {one}
    </Link>
  );
  const name: Column<Row> = {
    key: "name",
    head: one.charAt(0).toUpperCase() + one.slice(1),
    sortable: true,
    cell: (row) => (
      <Link to={`${path}/${row.id}`} className="link">
        {row.name}
      </Link>
    ),
  };
  return (
    <>
      <PageHead
        title={title}
        remark={searched ? `${total} found` : `${total} ${total === 1 ? one : many}`}
        actions={
          <>
            {more}
            {add}
          </>
        }
      />
      <ListHead what={many} filters={filters} />
      {rows.length > 0 ? (
        <>
          {ticks?.bar}
          <DataTable
            caption={title}
            columns={[...(ticks ? [ticks.column] : []), name, ...columns]}
            page={page}
            rowKey={({ id }) => id}
          />
        </>
      ) : total > 0 ? (
        <EmptyState
          title={`There is no page ${params.page}`}
          actions={
            <Link to={path} className="btn">
              First page
            </Link>
          }
        >
          The list is shorter than that.
        </EmptyState>
      ) : (
        <EmptyState title={searched ? `No ${one} fits` : `No ${many} yet`} actions={!searched && add}>
          {searched ? "Change the search, or take a filter away." : belongs}
        </EmptyState>
      )}
    </>
  );
}
