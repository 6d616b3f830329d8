import { getFormProps, getTextareaProps, type SubmissionResult } from "@conform-to/react";
import { useId } from "react";
import { Form } from "react-router";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { LOT_TABLE_LIMIT } from "#app/lib/lot-table-limit.ts";

interface Props {
  programs: Choice[];
  answer: SubmissionResult<string[]> | null | undefined;
}

/** One lot by its name, or several as a table, each with its wafers. */
export function NewLots({ programs, answer }: Props) {
  const [only] = programs.length === 1 ? programs : [];
  const [form, { program, name, wafers }] = useRecordForm<{ program: string; name: string; wafers: string }>({
    lastResult: answer,
    defaultValue: { program: only?.value ?? "", name: "", wafers: "" },
  });
  const file = useId();
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="max-w-160 space-y-2">
      <FormHead lastResult={answer} stands="No lot is made yet" />
      <ChoiceField field={program} label="Program" choices={programs} blank="Choose a program" />
      <LineField field={name} label="Lot" hint="Leave it blank where the table names its lots." />
      <div className="field">
        <label htmlFor={wafers.id}>Wafers, one to a line: slot, name</label>
        <textarea
          {...getTextareaProps(wafers)}
          key={wafers.key}
          rows={8}
          className="font-sans"
          aria-describedby={wafers.errorId}
        />
        <small id={wafers.errorId}>
          {wafers.errors?.map((fault) => (
            <span key={fault} className="block">
              {fault}
            </span>
          )) ??
            "Such as 1, W01. A name may be left out. With the heads lot, slot, wafer in the first line it is a table of several lots."}
        </small>
      </div>
      <div className="field">
        <label htmlFor={file}>Or the same as a CSV file</label>
        <input
          type="file"
          id={file}
          name="file"
          accept=".csv,.txt,.tsv,text/csv,text/plain"
          className="file:mr-3 file:cursor-pointer file:border-0 file:bg-transparent file:font-medium file:text-ink file:underline max-tablet:file:leading-8"
        />
        <small>Up to {LOT_TABLE_LIMIT.words}. It takes the place of what is typed above.</small>
      </div>
      <SubmitButton busy="Making">Make them</SubmitButton>
    </Form>
  );
}
