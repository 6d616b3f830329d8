import {
  getFormProps,
  getInputProps,
  getSelectProps,
  type FieldMetadata,
  type SubmissionResult,
} from "@conform-to/react";
import { Form } from "react-router";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { DelegatesView } from "#app/schemas/delegation.ts";

interface Props {
  choices: DelegatesView["choices"];
  lastResult: SubmissionResult<string[]> | undefined;
}

interface Values extends Record<string, unknown> {
  whom: string;
  from: string;
  until: string;
  reason: string;
}

/** The form in which a process owner names who stands in for them. */
export function NameDelegate({ choices, lastResult }: Props) {
  const [form, { whom, from, until, reason }] = useRecordForm<Values>({ id: "delegate", lastResult });
  return (
    <section aria-labelledby="name-delegate" className="frame p-4">
      <h2 id="name-delegate" className="font-semibold">
        Name who stands in for you
      </h2>
      <Form method="post" {...getFormProps(form)} className="mt-3 space-y-2">
        <input type="hidden" name="intent" value="name" />
        <div className="field">
          <label htmlFor={whom.id}>Who</label>
          <select {...getSelectProps(whom)} key={whom.key} aria-describedby={whom.errorId}>
            <option value="">Choose somebody</option>
            {choices.map(({ program, people }) => (
              <optgroup key={program} label={program}>
                {people.map(({ value, label }) => (
                  <option key={value} value={value}>
                    {label}
                  </option>
                ))}
              </optgroup>
            ))}
          </select>
          <small id={whom.errorId}>{whom.errors?.[0] ?? "Somebody of the program who sees its work."}</small>
        </div>
        <div className="flex flex-wrap gap-x-4">
          <Day field={from} label="First day" hint="From its beginning, UTC." />
          <Day field={until} label="Last day" hint="To its end, UTC." />
        </div>
        <NoteField field={reason} label="Why" />
        <SubmitButton busy="Naming">Name the delegate</SubmitButton>
      </Form>
    </section>
  );
}

function Day({ field, label, hint }: { field: FieldMetadata<string>; label: string; hint: string }) {
  return (
    <div className="field">
      <label htmlFor={field.id}>{label}</label>
      <input
        {...getInputProps(field, { type: "date" })}
        key={field.key}
        aria-describedby={field.errorId}
        className="w-44"
      />
      <small id={field.errorId}>{field.errors?.[0] ?? hint}</small>
    </div>
  );
}
