import type { FloorSheet } from "#app/schemas/floor-view.ts";
import type { FloorKind } from "#app/schemas/floor-entry.ts";

interface Props {
  sheet: FloorSheet;
  /** made with the page, so that an entry counts once however often it is sent */
  id: string;
  kind: FloorKind;
  step: number | null;
}

/** What every entry says of where it belongs. */
export function EntryFields({ sheet, id, kind, step }: Props) {
  return (
    <>
      <input type="hidden" name="id" value={id} />
      <input type="hidden" name="revision" value={sheet.pin.revision} />
      <input type="hidden" name="leg" value={sheet.leg} />
      <input type="hidden" name="step" value={step ?? ""} />
      <input type="hidden" name="kind" value={kind} />
    </>
  );
}
