import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import type { ScanFormValues } from "../ScanForm.tsx";
import { SubjectFields } from "../SubjectFields.tsx";

interface Props {
  id: string;
  programs: Choice[];
  films: Choice[];
  /** nothing of the batch is a profile: the program is all that counts */
  onlyTables: boolean;
  /** something of the batch is in already */
  begun: boolean;
  /** what the server found wrong, by field */
  lastResult: SubmissionResult<string[]> | null;
  onImport: (shared: FormData) => void;
}

type Shared = Omit<ScanFormValues, "label" | "before" | "after" | "positionUnit" | "heightUnit" | "decimalMark">;

/** What all files of a batch share. Thicknesses are asked for when two scans meet, so that a first one can wait without them. */
export function BatchForm({ id, programs, films, onlyTables, begun, lastResult, onImport }: Props) {
  const [only] = programs.length === 1 ? programs : [];
  const [form, fields] = useRecordForm<Shared>({
    id,
    lastResult,
    defaultValue: { program: only?.value ?? "", orientation: "100", edgeExclusion: "5 mm" },
  });
  return (
    <form
      {...getFormProps(form)}
      className="border-t border-ink p-4 tablet:px-6"
      onSubmit={(event) => {
        event.preventDefault();
        onImport(new FormData(event.currentTarget));
      }}
    >
      <FormHead lastResult={lastResult} stands={begun ? "What is in already stays in" : undefined} />
      <h2 className="mb-3 font-semibold">The same for all files of this batch</h2>
      <div className="grid gap-x-3 gap-y-2 tablet:grid-cols-2 wide:grid-cols-4">
        {onlyTables ? (
          <>
            <ChoiceField field={fields.program} label="Program" choices={programs} blank="Choose" />
            {/* No profile has a rim to leave out, but what is read is kept with it. */}
            <input type="hidden" name={fields.edgeExclusion.name} value="5 mm" />
          </>
        ) : (
          <>
            <QuantityField
              field={fields.edgeExclusion}
              label="Rim left out"
              dimension="length"
              hint="At either end of the scan"
            />
            <SubjectFields fields={fields} programs={programs} films={films} />
          </>
        )}
      </div>
    </form>
  );
}
