import { Form, useNavigation } from "react-router";
import { UNIT_CHANGES, type CarrierUnitRow, type UnitChange } from "#app/lib/carrier-units.ts";

const CHANGES = Object.keys(UNIT_CHANGES) as UnitChange[];

/** What can be done to a piece in its state, as one small form. */
export function PieceActions({ unit: { id, mark, state, stamp } }: { unit: CarrierUnitRow }) {
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
