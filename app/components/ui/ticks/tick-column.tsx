import type { Column } from "#app/components/ui/DataTable.tsx";
import { TICKED, type Ticks } from "./use-ticked.ts";

/** Boxes to tick rows that something is to be done with. The form that they belong to is the `TickBar` above the list. */
export function tickColumn<Row extends { id: string; name: string }>({ form, ids, read }: Ticks): Column<Row> {
  return {
    key: "tick",
    head: "Tick",
    cell: ({ id, name }) => (
      <label className="inline-flex min-h-8 min-w-8 items-center">
        <span className="sr-only">Tick {name}</span>
        <input
          type="checkbox"
          name={TICKED}
          value={id}
          form={form}
          defaultChecked={ids.has(id)}
          onChange={(event) => read(event.currentTarget.form)}
          className="size-4 accent-ink"
        />
      </label>
    ),
  };
}
