import { CheckField } from "#app/components/forms/CheckField.tsx";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { FormPart } from "#app/components/library/FormPart.tsx";
import { OptionalFields } from "#app/components/library/OptionalFields.tsx";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { SOLVENT_FAMILIES } from "#app/engine/flow/handling-inputs.ts";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { quantityText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import {
  BOND_HEAT_PROPERTIES as HEAT,
  BONDING_MATERIAL_PROPERTIES as P,
  PEEL_PROPERTIES as PEEL,
} from "./bonding-material-properties.ts";
import { FormGroup } from "./FormGroup.tsx";
import { resistanceTexts, type ResistanceName } from "./resistance-words.ts";
import { ResistanceFields, type ResistanceText } from "./ResistanceFields.tsx";

type BondingMaterial = LibraryRecords["bondingMaterial"];

type BondingMaterialFormValues = {
  name: string;
  flows: boolean;
  leastThickness: string;
  mostThickness: string;
  release: string;
  thermalCycles: string;
  vacuum: string;
  solvent: string;
  acid: string;
  base: string;
  handling: Record<ResistanceName, ResistanceText> & {
    attackedBy: string[];
    releaseLight: string;
    remover: string;
  } & Record<keyof typeof HEAT | keyof typeof PEEL, MeasuredText>;
  note: string;
} & Record<keyof typeof P, MeasuredText>;

const HEAT_FIELDS = Object.keys(HEAT) as (keyof typeof HEAT)[];
const DEBOND_FIELDS = ["releaseLight", "remover", ...(Object.keys(PEEL) as (keyof typeof PEEL)[])] as const;

/** Fields of a folded part, and whether something of it is given. */
const folded = (names: readonly (keyof BondingMaterial["handling"])[], record: BondingMaterial | null) => ({
  holds: names.map((name) => `handling.${name}`),
  given: record !== null && names.some((name) => record.handling[name] !== null),
});

function handlingTexts(handling: BondingMaterial["handling"]): BondingMaterialFormValues["handling"] {
  return {
    ...measuredTexts(handling, { ...HEAT, ...PEEL }),
    ...resistanceTexts(handling),
    attackedBy: handling.attackedBy,
    releaseLight: handling.releaseLight ?? "",
    remover: handling.remover ?? "",
  };
}

const formValues = (material: BondingMaterial) => ({
  ...material,
  ...measuredTexts(material, P),
  leastThickness: quantityText(material.leastThickness, "length", "µm"),
  mostThickness: quantityText(material.mostThickness, "length", "µm"),
  thermalCycles: material.thermalCycles === null ? "" : String(material.thermalCycles),
  handling: handlingTexts(material.handling),
});

/** A bonding material with all its properties, each with tolerance and source. */
export function BondingMaterialForm({ record, ...rest }: RecordFormProps<BondingMaterial>) {
  const [form, fields] = useRecordForm<BondingMaterialFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  const handling = fields.handling.getFieldset();
  return (
    <RecordForm form={form} what="bonding material" {...rest}>
      <LineField field={fields.name} label="Name" />
      <FormPart title="In heat">
        <PropertyField field={fields.softening} of={P.softening} />
        <PropertyField field={fields.glassTransition} of={P.glassTransition} />
        <CheckField
          field={fields.flows}
          label="Thermoplastic: it flows above that point. Not ticked: cross-linked, it stays coupled."
        />
        <PropertyField field={fields.flowPoint} of={P.flowPoint} />
        <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
        <PropertyField field={fields.bondTemperature} of={P.bondTemperature} />
        <LineField
          field={fields.thermalCycles}
          label="Heatings between bond and debond"
          hint="How many it stands; blank: not known"
          input={{ inputMode: "numeric" }}
          className="max-w-100"
        />
      </FormPart>
      <FormPart title="Letting go">
        <ChoiceField
          field={fields.release}
          label="How it lets go"
          choices={sameWords(RELEASE_METHODS)}
          blank="Choose"
          className="max-w-100"
        />
        <PropertyField field={fields.releaseTemperature} of={P.releaseTemperature} />
        <OptionalFields label="At the debond" {...folded(DEBOND_FIELDS, record)} lastResult={rest.lastResult}>
          <div className="grid gap-3 tablet:grid-cols-2">
            <ChoiceField
              field={handling.releaseLight}
              label="Light that lets it go"
              choices={sameWords(["ultraviolet", "infrared"])}
              blank="Not given"
              hint="Blank: ultraviolet for a laser through glass"
            />
            <ChoiceField
              field={handling.remover}
              label="What takes its rest off afterwards"
              choices={sameWords(SOLVENT_FAMILIES)}
              blank="Not given"
            />
          </div>
          <PropertyField field={handling.peelForce} of={PEEL.peelForce} />
          <PropertyField field={handling.peelRadius} of={PEEL.peelRadius} />
        </OptionalFields>
      </FormPart>
      <FormPart title="As a layer">
        <FormGroup label="Thickness that it can be put on in">
          <div className="grid max-w-100 grid-cols-2 gap-3">
            <QuantityField field={fields.leastThickness} label="Least" dimension="length" example="10 µm" />
            <QuantityField field={fields.mostThickness} label="Most" dimension="length" example="40 µm" />
          </div>
        </FormGroup>
        <PropertyField field={fields.thicknessVariationShare} of={P.thicknessVariationShare} />
        <PropertyField field={fields.effectiveModulus} of={P.effectiveModulus} />
        <PropertyField field={fields.dataSheetModulus} of={P.dataSheetModulus} />
        <PropertyField field={fields.poissonsRatio} of={P.poissonsRatio} />
        <PropertyField field={fields.expansionBelow} of={P.expansionBelow} />
        <PropertyField field={fields.expansionAbove} of={P.expansionAbove} />
      </FormPart>
      <FormPart title="In vacuum, chemicals and light">
        <ResistanceFields
          handling={handling}
          says={fields}
          without="Without them a step that exposes the bond cannot be judged."
        />
        <OptionalFields label="In vacuum and heat" {...folded(HEAT_FIELDS, record)} lastResult={rest.lastResult}>
          <PropertyField field={handling.vacuumTemperatureLimit} of={HEAT.vacuumTemperatureLimit} />
          <PropertyField field={handling.weightLoss} of={HEAT.weightLoss} />
          <PropertyField field={handling.limitTime} of={HEAT.limitTime} />
          <PropertyField field={handling.thermalTime} of={HEAT.thermalTime} />
        </OptionalFields>
      </FormPart>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
