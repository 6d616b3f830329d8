import { getFormProps } from "@conform-to/react";
import { Form } from "react-router";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { LotDesk } from "#app/schemas/floor-view.ts";
import { answerTo, type LotAnswer } from "./lot-answer.ts";

interface Props {
  desk: LotDesk;
  answer: LotAnswer;
}

/** Puts a lot on a released revision, or moves it to another one. */
export function AssignSheet({ desk: { pin, parts, choices, mayAssign }, answer }: Props) {
  const lastResult = answerTo(answer, "assign");
  const here = parts[0]?.here?.number ?? 1;
  const [form, { revision, fromStep, reason }] = useRecordForm<{ revision: string; fromStep: string; reason: string }>({
    id: `assign-${pin?.revision ?? "first"}`,
    lastResult,
    defaultValue: { revision: pin?.successor?.id ?? "", fromStep: String(here), reason: "" },
  });
  if (!mayAssign) return pin ? null : <p className="mt-1 text-quiet">An engineer or process owner puts it on one.</p>;
  if (choices.length === 0)
    return (
      <p className="mt-1 text-quiet">
        {pin ? "No other sheet of its program is released." : "No sheet of its program is released yet."}
      </p>
    );
  return (
    <details
      className="mt-2 print:hidden"
      open={lastResult !== null || (pin?.successor !== undefined && pin.successor !== null)}
    >
      <summary className="link w-fit cursor-pointer">
        {pin ? "Move it to another revision" : "Put it on a sheet"}
      </summary>
      <Form method="post" preventScrollReset {...getFormProps(form)} className="mt-2 max-w-160 space-y-2">
        <ChoiceField
          field={revision}
          label="Released revision"
          choices={choices.map(({ id, name }) => ({ value: id, label: name }))}
          blank="Choose a sheet"
        />
        <LineField
          field={fromStep}
          label="Step at which it goes on"
          hint="What lies before it was done elsewhere. Numbers are those of the revision above."
        />
        <NoteField
          field={reason}
          label={pin ? "Why it is moved" : "Remark"}
          rows={2}
          hint={pin ? undefined : "May stay empty."}
        />
        <button type="submit" name="intent" value="assign" className="btn btn-primary">
          {pin ? "Move the lot" : "Put the lot on it"}
        </button>
      </Form>
    </details>
  );
}
