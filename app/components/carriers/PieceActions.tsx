import { useId } from "react";
import { Form, useNavigation } from "react-router";
import { quantityText } from "#app/lib/form-values.ts";
import { UNIT_CHANGES, type CarrierUnitRow, type UnitChange } from "#app/lib/carrier-units.ts";

const CHANGES = Object.keys(UNIT_CHANGES) as UnitChange[];

/** What can be done to a piece: the changes of its state as one small form, and its measured thickness variation as another. */
export function PieceActions({ unit }: { unit: CarrierUnitRow }) {
  return (
    <div className="space-y-2">
      <StateForm unit={unit} />
      <MeasureForm unit={unit} />
    </div>
  );
}

function MeasureForm({ unit: { id, mark, thicknessVariation, stamp } }: { unit: CarrierUnitRow }) {
  const field = useId();
  return (
    <details>
      <summary className="link w-fit cursor-pointer">Thickness variation measured</summary>
      <Form method="post" preventScrollReset className="mt-2 flex flex-wrap items-end gap-2" key={stamp.version}>
        <input type="hidden" name="piece" value={id} />
        <input type="hidden" name="version" value={stamp.version} />
        <div className="field w-40">
          <label htmlFor={field}>Of {mark}; blank: not measured</label>
          <input
            id={field}
            name="variation"
            autoComplete="off"
            placeholder="1 um"
            defaultValue={quantityText(thicknessVariation?.value, "length", "µm")}
          />
        </div>
        <button
          type="submit"
          name="change"
          value="measure"
          className="btn"
          aria-label={`Save thickness variation: ${mark}`}
        >
          Save
        </button>
      </Form>
    </details>
  );
}

/** What can be done to a piece in its state. */
function StateForm({ unit: { id, mark, state, stamp } }: { unit: CarrierUnitRow }) {
  const { formData, state: navigation } = useNavigation();
  const waiting = navigation !== "idle" && formData?.get("piece") === id ? formData.get("change") : null;
  const possible = CHANGES.filter((change) => UNIT_CHANGES[change].from.some((from) => from === state));
  return (
    <Form method="post" preventScrollReset className="flex flex-wrap gap-2">
      <input type="hidden" name="piece" value={id} />
      <input type="hidden" name="version" value={stamp.version} />
      {possible.map((change) => (
        <button
          key={change}
          type="submit"
          name="change"
          value={change}
          className={change === "scrap" ? "btn btn-remove" : "btn"}
          disabled={waiting !== null}
          aria-label={`${UNIT_CHANGES[change].label}: ${mark}`}
        >
          {waiting === change ? UNIT_CHANGES[change].busy : UNIT_CHANGES[change].label}
        </button>
      ))}
    </Form>
  );
}
