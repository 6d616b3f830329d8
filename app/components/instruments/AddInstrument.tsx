import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";

/** Takes up an instrument by its name. */
export function AddInstrument({ lastResult }: { lastResult: SubmissionResult<string[]> | null | undefined }) {
  const [form, fields] = useRecordForm<{ name: string }>({ lastResult });
  return (
    <section className="mt-6 max-w-160" aria-labelledby="add">
      <h2 id="add" className="font-semibold">
        Add an instrument
      </h2>
      <FormHead lastResult={lastResult} />
      <Form method="post" {...getFormProps(form)} className="mt-2 flex flex-wrap items-start gap-3">
        <LineField
          field={fields.name}
          label="Name"
          hint="As the site calls it, for example Stylus 2"
          className="w-72 max-w-full"
        />
        <div className="pt-5">
          <SubmitButton busy="Adding">Add</SubmitButton>
        </div>
      </Form>
    </section>
  );
}
