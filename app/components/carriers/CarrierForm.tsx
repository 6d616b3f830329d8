import { CheckField } from "#app/components/forms/CheckField.tsx";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { YesNoField } from "#app/components/forms/YesNoField.tsx";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { measuredTexts } from "#app/components/library/property.ts";
import { PropertyField } from "#app/components/library/PropertyField.tsx";
import { RecordForm, type RecordFormProps } from "#app/components/library/RecordForm.tsx";
import { CARRIER_MATERIALS } from "#app/engine/flow/model.ts";
import { quantityText, yesOrNoText } from "#app/lib/form-values.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { CARRIER_PROPERTIES as P } from "./carrier-properties.ts";
import { ExpansionCurveFields, expansionCurveText, type ExpansionCurveText } from "./ExpansionCurveFields.tsx";
import { FormGroup } from "./FormGroup.tsx";

type Carrier = LibraryRecords["carrier"];

type CarrierFormValues = {
  name: string;
  material: string;
  diameter: string;
  expansionRange: string;
  meanExpansionFrom: string;
  meanExpansionTo: string;
  expansionCurve: ExpansionCurveText;
  passesUltraviolet: boolean;
  passesInfrared: boolean;
  perforated: boolean;
  reuseLimit: string;
  handling: Record<keyof Carrier["handling"], string>;
  note: string;
} & Record<keyof typeof P, MeasuredText>;

const formValues = (carrier: Carrier) => ({
  ...carrier,
  ...measuredTexts(carrier, P),
  diameter: quantityText(carrier.diameter, "length", "mm"),
  expansionRange: carrier.expansion === null ? "" : carrier.expansionRange,
  meanExpansionFrom: quantityText(carrier.meanExpansionFrom, "temperature", "°C"),
  meanExpansionTo: quantityText(carrier.meanExpansionTo, "temperature", "°C"),
  expansionCurve: expansionCurveText(carrier.expansionCurve),
  reuseLimit: String(carrier.reuseLimit),
  handling: {
    metalInLight: yesOrNoText(carrier.handling.metalInLight),
    conductiveCoating: yesOrNoText(carrier.handling.conductiveCoating),
    seenBySensors: yesOrNoText(carrier.handling.seenBySensors),
  },
});

/** A carrier with all its properties, each with tolerance and source. */
export function CarrierForm({ record, ...rest }: RecordFormProps<Carrier>) {
  const [form, fields] = useRecordForm<CarrierFormValues>({
    lastResult: rest.lastResult,
    defaultValue: record ? formValues(record) : {},
  });
  const handling = fields.handling.getFieldset();
  return (
    <RecordForm form={form} what="carrier" {...rest}>
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr_1fr]">
        <LineField field={fields.name} label="Name" />
        <ChoiceField field={fields.material} label="Material" choices={sameWords(CARRIER_MATERIALS)} blank="Choose" />
        <QuantityField field={fields.diameter} label="Diameter" dimension="length" example="300 mm" />
      </div>
      <PropertyField field={fields.thickness} of={P.thickness} />
      <PropertyField field={fields.youngsModulus} of={P.youngsModulus} />
      <PropertyField field={fields.poissonsRatio} of={P.poissonsRatio} />
      <PropertyField field={fields.expansion} of={P.expansion} />
      <FormGroup label="Temperatures over which that expansion is a mean">
        <div className="grid gap-3 tablet:grid-cols-[1fr_1fr_2fr]">
          <QuantityField
            field={fields.meanExpansionFrom}
            label="From"
            dimension="temperature"
            example="25 °C"
            hint="Blank for silicon"
          />
          <QuantityField
            field={fields.meanExpansionTo}
            label="To"
            dimension="temperature"
            example="150 °C"
            hint="A step beyond the range says so"
          />
          <LineField
            field={fields.expansionRange}
            label="In words"
            hint="Where it is not two temperatures: a mean over another range is another number"
          />
        </div>
      </FormGroup>
      <ExpansionCurveFields field={fields.expansionCurve} />
      <PropertyField field={fields.density} of={P.density} />
      <PropertyField field={fields.thicknessVariation} of={P.thicknessVariation} />
      <PropertyField field={fields.temperatureLimit} of={P.temperatureLimit} />
      <FormGroup label="Light, openings and use">
        <div className="grid gap-x-6 gap-y-1 tablet:grid-cols-[repeat(3,auto)_1fr]">
          <CheckField field={fields.passesUltraviolet} label="Passes ultraviolet light" />
          <CheckField field={fields.passesInfrared} label="Passes infrared light" />
          <CheckField field={fields.perforated} label="Perforated, for solvent" />
          <LineField
            field={fields.reuseLimit}
            label="May be used, times"
            input={{ inputMode: "numeric" }}
            className="tablet:max-w-40 tablet:justify-self-end"
          />
        </div>
      </FormGroup>
      <FormGroup label="On tools and in the light that lets it go">
        <div className="grid gap-3 tablet:grid-cols-3">
          <YesNoField
            field={handling.conductiveCoating}
            label="Conductive coating"
            hint="Of glass: an electrostatic chuck needs it"
          />
          <YesNoField
            field={handling.seenBySensors}
            label="Seen by optical sensors"
            hint="Frosted, coated or with a ground rim"
          />
          <YesNoField
            field={handling.metalInLight}
            label="Metal or another opaque layer"
            hint="In the way of the light that lets it go"
          />
        </div>
      </FormGroup>
      <NoteField field={fields.note} label="Note" />
    </RecordForm>
  );
}
