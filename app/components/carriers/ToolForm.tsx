import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { YesNoField } from "#app/components/forms/YesNoField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { OptionalFields } from "#app/components/library/OptionalFields.tsx";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { CLAMPINGS, CONTACT_MEANS } from "#app/engine/flow/handling-inputs.ts";
import { yesOrNoText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { TOOL_HANDLING_PROPERTIES as H, TOOL_PROPERTIES as P } from "./tool-properties.ts";

type Tool = LibraryRecords["equipment"];

type Chosen = Exclude<keyof Tool["handling"], keyof typeof H>;
type ToolFormValues = {
  name: string;
  holding: string;
  atPeak: string;
  handling: Record<Chosen, string> & Record<keyof typeof H, MeasuredText>;
  note: string;
} & Record<keyof typeof P, MeasuredText>;

const formValues = (tool: Tool) => {
  const { clamping, seal, contactFace, contactMeans, sensesOptically, ioniser } = tool.handling;
  return {
    ...tool,
    ...measuredTexts(tool, P),
    handling: {
      ...measuredTexts(tool.handling, H),
      clamping: clamping ?? "",
      seal: seal ?? "",
      contactFace: contactFace ?? "",
      contactMeans: contactMeans ?? "",
      sensesOptically: yesOrNoText(sensesOptically),
      ioniser: yesOrNoText(ioniser),
    },
  };
};

/** Fields of the folded part. */
const FOLDED = [
  "seal",
  "contactFace",
  "contactMeans",
  "sensesOptically",
  "ioniser",
  ...(Object.keys(H) as (keyof typeof H)[]),
] as const;

const FACES = [
  { value: "front", label: "Device side" },
  { value: "back", label: "Back side" },
];

const AT_PEAK = [
  { value: "free", label: "Free: boat, pins or belt" },
  { value: "held", label: "Held: vacuum, clamp or frame" },
];

/** A tool with the warp that it takes. */
export function ToolForm({ record, ...rest }: RecordFormProps<Tool>) {
  const [form, fields] = useRecordForm<ToolFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  const handling = fields.handling.getFieldset();
  return (
    <RecordForm form={form} what="tool" {...rest}>
      <LineField field={fields.name} label="Name" />
      <div className="grid gap-3 tablet:grid-cols-3">
        <LineField
          field={fields.holding}
          label="How it holds the wafer"
          hint="Vacuum, clamped, edge grip, free in boat …"
        />
        <ChoiceField
          field={handling.clamping}
          label="Clamps by"
          choices={sameWords(CLAMPINGS)}
          blank="Not given"
          hint="What the handling rules take it as"
        />
        <ChoiceField field={fields.atPeak} label="The wafer when it is hot" choices={AT_PEAK} blank="Choose" />
      </div>
      <PropertyField field={fields.warpLimitEdgesUp} of={P.warpLimitEdgesUp} />
      <PropertyField field={fields.warpLimitEdgesDown} of={P.warpLimitEdgesDown} />
      <PropertyField field={fields.leastUnsupportedThickness} of={P.leastUnsupportedThickness} />
      <PropertyField field={fields.largestDiameter} of={P.largestDiameter} />
      <OptionalFields
        label="Seal, slots, weight and contact"
        holds={FOLDED.map((name) => `handling.${name}`)}
        given={record !== null && FOLDED.some((name) => record.handling[name] !== null)}
        lastResult={rest.lastResult}
      >
        <div className="grid gap-3 tablet:grid-cols-3">
          <ChoiceField
            field={handling.seal}
            label="Vacuum seal"
            choices={sameWords(["plain", "compliant"])}
            blank="Not given"
            hint="Compliant: lip, pins or pusher"
          />
          <ChoiceField
            field={handling.contactFace}
            label="Face that it touches"
            choices={FACES}
            blank="Not given"
            hint="At every step that names no contact"
          />
          <ChoiceField
            field={handling.contactMeans}
            label="Touches with"
            choices={sameWords(CONTACT_MEANS)}
            blank="Not given"
          />
          <YesNoField
            field={handling.sensesOptically}
            label="Finds the wafer by light"
            hint="Bare glass may not be seen"
          />
          <YesNoField field={handling.ioniser} label="Ioniser" hint="Takes off the charge of a peel" />
        </div>
        <PropertyField field={handling.sealGap} of={H.sealGap} />
        <PropertyField field={handling.slotClearance} of={H.slotClearance} />
        <PropertyField field={handling.weightLimit} of={H.weightLimit} />
        <PropertyField field={handling.totalThicknessLimit} of={H.totalThicknessLimit} />
      </OptionalFields>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
