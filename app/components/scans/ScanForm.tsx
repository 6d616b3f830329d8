import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useState } from "react";
import { Form, Link } from "react-router";
import { ChoiceField, sameWords, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { DECIMAL_MARKS, LENGTH_UNITS } from "#app/lib/scan-reading/reading.ts";
import { FileField } from "./FileField.tsx";
import { SubjectFields } from "./SubjectFields.tsx";

/** A scan as the text of its form; a file has none. */
export type ScanFormValues = {
  program: string;
  label: string;
  film: string;
  orientation: string;
  filmThickness: string;
  filmThicknessTolerance: string;
  siliconThickness: string;
  siliconThicknessTolerance: string;
  siliconThicknessFrom: string;
  sinceCure: string;
  diameter: string;
  edgeExclusion: string;
  positionUnit: string;
  heightUnit: string;
  decimalMark: string;
  before: string;
  after: string;
};

interface Props {
  programs: Choice[];
  films: Choice[];
  lastResult: SubmissionResult<string[]> | null | undefined;
}

const UNITS: Choice[] = LENGTH_UNITS.map((unit) => ({ value: unit, label: unit }));

/** Upload of a profile before and one after a film, with what it takes to make a stress of them. */
export function ScanForm({ programs, films, lastResult }: Props) {
  const [only] = programs.length === 1 ? programs : [];
  const [form, fields] = useRecordForm<ScanFormValues>({
    lastResult,
    defaultValue: { program: only?.value ?? "", orientation: "100", edgeExclusion: "5 mm" },
  });
  const { filesKey, chosen, note } = useChosenFiles(lastResult);
  const again = Boolean(lastResult?.error);
  return (
    <Form method="post" encType="multipart/form-data" {...getFormProps(form)} className="frame max-w-300">
      <div className="p-4 empty:hidden tablet:px-6">
        <FormHead lastResult={lastResult} />
        {again && chosen < 2 && (
          <p className="font-semibold">Choose the two files again: the browser has let go of them.</p>
        )}
      </div>
      <div className="grid wide:grid-cols-2">
        <fieldset className="min-w-0 p-4 tablet:p-6">
          <legend className="float-left mb-3 w-full font-semibold">Wafer and film</legend>
          <div className="clear-both grid gap-x-3 gap-y-2 tablet:grid-cols-2">
            <LineField field={fields.label} label="Wafer" hint="As written on it, for example M-0388" />
            <SubjectFields fields={fields} programs={programs} films={films} />
          </div>
        </fieldset>
        <fieldset className="min-w-0 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
          <legend className="float-left mb-1 w-full font-semibold">Two scans on the same line</legend>
          <p className="clear-both mb-3 text-quiet">
            Two columns each, position and height; height upwards with the film’s side up.
          </p>
          <div className="grid gap-x-3 gap-y-2 tablet:grid-cols-2">
            <FileField
              key={`before ${filesKey}`}
              field={fields.before}
              label="File before the film"
              again={again}
              onChosen={note("before")}
            />
            <FileField
              key={`after ${filesKey}`}
              field={fields.after}
              label="File after the film"
              again={again}
              onChosen={note("after")}
            />
            <ChoiceField field={fields.positionUnit} label="Unit of position" choices={UNITS} blank="Choose" />
            <ChoiceField field={fields.heightUnit} label="Unit of height" choices={UNITS} blank="Choose" />
            <ChoiceField
              field={fields.decimalMark}
              label="Decimal mark in the files"
              choices={sameWords(DECIMAL_MARKS)}
              blank="Choose"
            />
            <QuantityField
              field={fields.edgeExclusion}
              label="Rim left out"
              dimension="length"
              hint="At either end of the scan"
            />
          </div>
        </fieldset>
      </div>
      <div className="flex flex-wrap items-center gap-2 border-t border-ink p-4 tablet:px-6">
        <SubmitButton busy="Reading the scans">Read and keep</SubmitButton>
        <Link to="/scans" className="btn">
          Leave without saving
        </Link>
        <p className="text-quiet">
          Both files are kept as they are; a pair that cannot be read is not stored. Beyond 1&nbsp;MB a pair is read in
          the background, and you can leave.
        </p>
      </div>
    </Form>
  );
}

const NONE = { before: false, after: false };

/**
 * How many of the two files are chosen, and a key for their inputs that changes when the server found fault with a file: the
 * inputs are then emptied, because a browser refuses to send a file again that has been put right on the disk since.
 */
function useChosenFiles(lastResult: Props["lastResult"]) {
  const [seen, setSeen] = useState(lastResult);
  const [filesKey, setFilesKey] = useState(0);
  const [files, setFiles] = useState(NONE);
  if (lastResult !== seen) {
    setSeen(lastResult);
    if (["before", "after", ""].some((field) => lastResult?.error?.[field])) {
      setFilesKey(filesKey + 1);
      setFiles(NONE);
    }
  }
  const note = (which: keyof typeof NONE) => (isChosen: boolean) => setFiles({ ...files, [which]: isChosen });
  return { filesKey, chosen: Object.values(files).filter(Boolean).length, note };
}
