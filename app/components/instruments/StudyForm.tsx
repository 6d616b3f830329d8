import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form, Link } from "react-router";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { MOST_REPEAT_FILES, REPEAT_FILE } from "#app/lib/repeat-files.ts";
import { RepeatFiles } from "./RepeatFiles.tsx";

type StudyFormValues = {
  wafer: string;
  diameter: string;
  edgeExclusion: string;
  files: string;
  typedAs: string;
  typed: string;
  note: string;
};

const TYPED_AS: Choice[] = [
  { value: "bow", label: "Bow over the diameter" },
  { value: "curvature", label: "Curvature" },
];

interface Props {
  lastResult: SubmissionResult<string[]> | null | undefined;
  back: string;
}

/** One wafer, measured again and again: as files, or typed. */
export function StudyForm({ lastResult, back }: Props) {
  const [form, fields] = useRecordForm<StudyFormValues>({
    lastResult,
    defaultValue: { edgeExclusion: "5 mm", typedAs: "bow" },
  });
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="frame max-w-300">
      <div className="p-4 empty:hidden tablet:px-6">
        <FormHead lastResult={lastResult} />
      </div>
      <div className="grid gap-x-3 gap-y-2 p-4 tablet:grid-cols-3 tablet:p-6">
        <LineField field={fields.wafer} label="Wafer" hint="The one that was measured, for example M-0388" />
        <QuantityField field={fields.diameter} label="Diameter" dimension="length" example="200 mm" />
        <QuantityField
          field={fields.edgeExclusion}
          label="Rim left out"
          dimension="length"
          hint="At either end of each scan"
        />
      </div>
      <div className="grid border-t border-ink wide:grid-cols-2">
        <fieldset className="min-w-0 p-4 tablet:p-6">
          <legend className="float-left mb-1 w-full font-semibold">The repeats as files</legend>
          <p className="clear-both mb-3 text-quiet">
            One scan a file, all on the same line, up to {MOST_REPEAT_FILES} files of {REPEAT_FILE.words}. Their
            curvatures are kept, the files are not.
          </p>
          <RepeatFiles field={fields.files} again={Boolean(lastResult?.error)} />
        </fieldset>
        <fieldset className="min-w-0 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
          <legend className="float-left mb-1 w-full font-semibold">Or typed</legend>
          <div className="clear-both space-y-2">
            <ChoiceField
              field={fields.typedAs}
              label="What is typed"
              choices={TYPED_AS}
              hint="A bow is the standard one: centre above the reference plane, device side up, positive"
            />
            <NoteField
              field={fields.typed}
              label="Readings"
              rows={7}
              hint="One a line, with its unit: −45.2 µm, or 9.04 1/km"
            />
          </div>
        </fieldset>
      </div>
      <div className="border-t border-ink p-4 tablet:p-6">
        <NoteField field={fields.note} label="Note" rows={2} hint="Who, how, what was special" />
        <div className="mt-3 flex flex-wrap items-center gap-2">
          <SubmitButton busy="Reading the repeats">Read and keep</SubmitButton>
          <Link to={back} className="btn">
            Leave without saving
          </Link>
        </div>
      </div>
    </Form>
  );
}
