import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { Form } from "react-router";
import { ChoiceField, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { quantityText } from "#app/lib/form-values.ts";
import type { WaferScanSubject } from "#app/schemas/wafer.ts";
import type { WaitingDetail } from "#app/schemas/waiting.ts";
import { MeasuredWaferFields } from "../SubjectFields.tsx";

interface Props {
  file: WaitingDetail;
  films: Choice[];
  lastResult: SubmissionResult<string[]> | null;
}

type Values = Record<keyof WaferScanSubject | "partner", string>;

/** Chooses the partner of a file that waits and says what the scan is computed with; what was said at the import stands there. */
export function HandPairForm({ file, films, lastResult }: Props) {
  const [form, fields] = useRecordForm<Values>({
    id: "hand-pair",
    lastResult,
    defaultValue: { partner: ofThisWafer(file)[0]?.id ?? "", ...subjectTexts(file) },
  });
  if (file.partners.length === 0)
    return (
      <p className="max-w-120 text-quiet">
        No file {file.side === "before" ? "after" : "before"} the film waits in {file.program.name}. Import it: it finds
        this one by wafer and line.
      </p>
    );
  return (
    <Form method="post" preventScrollReset {...getFormProps(form)}>
      <FormHead lastResult={lastResult} />
      <div className="grid gap-x-3 gap-y-2 tablet:grid-cols-2">
        <ChoiceField
          field={fields.partner}
          label={`File ${file.side === "before" ? "after" : "before"} the film`}
          choices={file.partners.map((partner) => ({
            value: partner.id,
            label: `${partner.label}: ${partner.file.name}, ${partner.createdAt.slice(0, 10)}`,
          }))}
          blank="Choose"
          hint={`One of another wafer or line is taken onto ${file.label}`}
          className="tablet:col-span-2"
        />
        <QuantityField
          field={fields.edgeExclusion}
          label="Rim left out"
          dimension="length"
          hint="At either end of the scan"
        />
        <MeasuredWaferFields fields={fields} films={films} />
      </div>
      <div className="mt-4">
        <SubmitButton busy="Computing the stress">Make the scan</SubmitButton>
        <input type="hidden" name="intent" value="pair" />
      </div>
    </Form>
  );
}

const ofThisWafer = ({ partners, wafer }: WaitingDetail) => partners.filter((each) => each.wafer.id === wafer.id);

/** What was said of the file; what nobody said of it is taken from the likely partner. */
function subjectTexts(file: WaitingDetail): Omit<Values, "partner"> {
  const [partner] = [...ofThisWafer(file), ...file.partners];
  const own = file.subject;
  const film = own.filmThickness === null ? (partner?.subject ?? own) : own;
  const silicon = own.siliconThickness === null ? (partner?.subject ?? own) : own;
  const length = (value: number | null, unit: string) => quantityText(value, "length", unit);
  return {
    film: own.film ?? partner?.subject.film ?? "",
    filmThickness: length(film.filmThickness, "µm"),
    filmThicknessTolerance: length(film.filmThicknessTolerance, "µm"),
    siliconThickness: length(silicon.siliconThickness, "µm"),
    siliconThicknessTolerance: length(silicon.siliconThicknessTolerance, "µm"),
    siliconThicknessFrom: silicon.siliconThicknessFrom ?? "",
    sinceCure: quantityText(own.sinceCure ?? partner?.subject.sinceCure, "time", "h"),
    diameter: length(own.diameter, "mm"),
    edgeExclusion: length(own.edgeExclusion, "mm"),
    orientation: own.orientation,
  };
}
