import type { Column } from "#app/components/ui/DataTable.tsx";
import { TICK_FORM } from "./CompareTicked.tsx";

/** Boxes to tick what is to be compared. The form that they belong to stands above the list. */
export function tickColumn<Row extends { id: string; name: string }>(
  ticked: ReadonlySet<string>,
  onTick: (form: HTMLFormElement | null) => void,
): Column<Row> {
  return {
    key: "tick",
    head: "Compare",
    cell: ({ id, name }) => (
      <label className="inline-flex min-h-8 min-w-8 items-center">
        <span className="sr-only">Compare {name}</span>
        <input
          type="checkbox"
          name="of"
          value={id}
          form={TICK_FORM}
          defaultChecked={ticked.has(id)}
          onChange={(event) => onTick(event.currentTarget.form)}
          className="size-4 accent-ink"
        />
      </label>
    ),
  };
}
