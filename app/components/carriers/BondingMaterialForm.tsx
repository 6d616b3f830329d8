import { CheckField } from "#app/components/forms/CheckField.tsx";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { quantityText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { BONDING_MATERIAL_PROPERTIES as P } from "./bonding-material-properties.ts";
import { FormGroup } from "./FormGroup.tsx";

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
  note: string;
} & Record<keyof typeof P, MeasuredText>;

const formValues = (material: BondingMaterial) => ({
  ...material,
  ...measuredTexts(material, P),
  leastThickness: quantityText(material.leastThickness, "length", "µm"),
  mostThickness: quantityText(material.mostThickness, "length", "µm"),
  thermalCycles: material.thermalCycles === null ? "" : String(material.thermalCycles),
});

/** A bonding material with all its properties, each with tolerance and source. */
export function BondingMaterialForm({ record, ...rest }: RecordFormProps<BondingMaterial>) {
  const [form, fields] = useRecordForm<BondingMaterialFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  return (
    <RecordForm form={form} what="bonding material" {...rest}>
      <LineField field={fields.name} label="Name" />
      <PropertyField field={fields.softening} of={P.softening} />
      <CheckField
        field={fields.flows}
        label="Thermoplastic: it flows above that point. Not ticked: cross-linked, it stays coupled."
      />
      <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
      <PropertyField field={fields.bondTemperature} of={P.bondTemperature} />
      <ChoiceField
        field={fields.release}
        label="How it lets go"
        choices={sameWords(RELEASE_METHODS)}
        blank="Choose"
        className="max-w-100"
      />
      <PropertyField field={fields.releaseTemperature} of={P.releaseTemperature} />
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
      <FormGroup label="What it stands">
        <div className="grid gap-3 tablet:grid-cols-2">
          <LineField field={fields.vacuum} label="Vacuum" hint="Up to which temperature, and its weight loss" />
          <LineField field={fields.solvent} label="Solvent" hint="Which, and for how long" />
          <LineField field={fields.acid} label="Acid" hint="Which, and for how long" />
          <LineField field={fields.base} label="Base" hint="Which, and for how long" />
          <LineField
            field={fields.thermalCycles}
            label="Thermal cycles"
            hint="How many it stands; blank: not known"
            input={{ inputMode: "numeric" }}
          />
        </div>
      </FormGroup>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
