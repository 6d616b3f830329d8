import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { YesNoField } from "#app/components/forms/YesNoField.tsx";
import { FormPart } from "#app/components/library/FormPart.tsx";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { yesOrNoText } from "#app/lib/form-values.ts";
import { TAPE_KINDS } from "#app/lib/tape-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { resistanceTexts, type ResistanceName } from "./resistance-words.ts";
import { ResistanceFields, type ResistanceText } from "./ResistanceFields.tsx";
import { TAPE_PROPERTIES as P } from "./tape-properties.ts";

type Tape = LibraryRecords["tape"];

type TapeFormValues = {
  name: string;
  kind: string;
  handling: Record<ResistanceName, ResistanceText> & { attackedBy: string[]; releasesInLight: string };
  handlingSource: string;
  note: string;
} & Record<keyof typeof P, MeasuredText>;

const formValues = (tape: Tape) => ({
  ...tape,
  ...measuredTexts(tape, P),
  handling: {
    ...resistanceTexts(tape.handling),
    attackedBy: tape.handling.attackedBy,
    releasesInLight: yesOrNoText(tape.handling.releasesInLight),
  },
});

/** A tape with all its properties, each with tolerance and source. */
export function TapeForm({ record, ...rest }: RecordFormProps<Tape>) {
  const [form, fields] = useRecordForm<TapeFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  const handling = fields.handling.getFieldset();
  return (
    <RecordForm form={form} what="tape" {...rest}>
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={fields.name} label="Name" hint="By its type, as the floor calls it" />
        <ChoiceField field={fields.kind} label="What it is for" choices={sameWords(TAPE_KINDS)} blank="Choose" />
      </div>
      <PropertyField field={fields.thickness} of={P.thickness} />
      <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
      <PropertyField field={fields.embeddingDepth} of={P.embeddingDepth} />
      <PropertyField field={fields.thicknessVariation} of={P.thicknessVariation} />
      <PropertyField field={fields.longestTime} of={P.longestTime} />
      <FormPart title="In vacuum, chemicals and light">
        <div className="grid gap-3 tablet:grid-cols-2">
          <YesNoField
            field={handling.releasesInLight}
            label="Ultraviolet light lets it go"
            hint="Not given: taken as not"
          />
          <ChoiceField
            field={fields.handlingSource}
            label="Where the words of this part come from"
            choices={sameWords(SOURCE_KINDS)}
            blank="Choose"
            hint="Blank: assumed"
          />
        </div>
        <ResistanceFields
          handling={handling}
          without="Without them it goes into no vacuum and no plasma, and a chemical is a caution."
        />
      </FormPart>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
