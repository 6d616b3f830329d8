import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { azimuthText, slotName } from "#app/lib/wafer-label.ts";
import type { WaitingDetail } from "#app/schemas/waiting.ts";

interface Props {
  file: WaitingDetail;
  lastResult: SubmissionResult<string[]> | null;
}

type Values = Record<"wafer" | "lot" | "slot" | "azimuth" | "side", string>;

/** Says anew of which wafer, line and side a file that waits is. */
export function MoveForm({ file, lastResult }: Props) {
  const { name, slot, lot } = file.wafer;
  const [form, fields] = useRecordForm<Values>({
    id: "move",
    lastResult,
    defaultValue: {
      wafer: slot !== null && name === slotName(slot) ? "" : name,
      lot: lot ?? "",
      slot: slot === null ? "" : String(slot),
      azimuth: azimuthText(file.azimuth),
      side: file.side,
    },
  });
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)}>
      <FormHead lastResult={lastResult} />
      <div className="grid grid-cols-2 gap-x-3 gap-y-2">
        <LineField field={fields.wafer} label="Wafer" hint="Blank: by lot and slot" />
        <LineField field={fields.lot} label="Lot" hint="Blank: none" />
        <LineField field={fields.slot} label="Slot" hint="Blank: not known" />
        <LineField field={fields.azimuth} label="Azimuth from the notch" hint="Degrees" />
        <ChoiceField
          field={fields.side}
          label="Side of the film"
          choices={sameWords(["before", "after"])}
          className="col-span-2"
        />
      </div>
      <p className="mt-2 text-quiet">If its partner waits there, the two make a scan at once.</p>
      <button type="submit" name="intent" value="move" className="btn mt-3">
        Move the file
      </button>
    </Form>
  );
}
