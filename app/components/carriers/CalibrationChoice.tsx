import { Form } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import type { CalibrationPage } from "#app/lib/calibration-view.ts";

type Props = Pick<CalibrationPage, "material" | "flows" | "chosen">;

/** Which flow the pairs have been through, and what is stated of its pair now. */
export function CalibrationChoice({ material, flows, chosen }: Props) {
  if (!chosen)
    return (
      <EmptyState title="No flow to calibrate on">
        A calibration needs a flow of your programs that bonds with {material.name} alone and on one carrier.
      </EmptyState>
    );
  const { carrier, fault } = chosen;
  const expansion = carrier.expansion === null ? "expands as silicon does" : `expands ${carrier.expansion}`;
  return (
    <>
      <Form method="get" className="flex flex-wrap items-start gap-3">
        <SelectField
          key={chosen.id}
          name="flow"
          label="Flow that the pairs have been through"
          options={flows}
          defaultValue={chosen.id}
          hint="Flows of your programs that bond with this material alone, on one carrier"
          className="w-120 max-w-full"
        />
        <button type="submit" className="btn mt-5">
          Show
        </button>
      </Form>
      <p className="mt-2 mb-4 max-w-[60em]">
        {noBreak(`Stated now: locked-in modulus ${material.modulus}; ${carrier.name} ${expansion}.`)}
      </p>
      {fault && (
        <Notice kind="error" title={fault}>
          Change the flow so that it can be computed, then come back.
        </Notice>
      )}
    </>
  );
}
