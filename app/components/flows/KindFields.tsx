import type { FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { StepChoices } from "#app/lib/flow-step-choices.ts";
import { inputsOf } from "#app/lib/flow-step-kinds.ts";
import { CarrierPieceField } from "./CarrierPieceField.tsx";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";
import { FACES } from "./HandlingFields.tsx";
import type { StepFormValues } from "./step-form-values.ts";
import { TapeFields } from "./TapeFields.tsx";

interface Props {
  fields: Required<{ [Key in keyof StepFormValues]: FieldMetadata<StepFormValues[Key]> }>;
  kind: string | undefined;
  choices: StepChoices;
}

/** What only some kinds of step have; without scripts everything is there. */
export function KindFields({ fields, kind, choices }: Props) {
  const has = inputsOf(kind);
  const handling = fields.handling.getFieldset();
  return (
    <>
      <KindGroup needed={has.groundFace} className={SHOWN.groundFace}>
        <MeasuredField
          field={fields.groundFaceForce}
          label="Force of the ground or polished face; compression is negative"
          dimension="forcePerLength"
          example="-60 N/m"
          hint="Blank: as before"
        />
      </KindGroup>
      <KindGroup needed={has.groundFace} className={SHOWN.groundFace}>
        <MeasuredField
          field={handling.thicknessVariation}
          label="Thickness variation that this thinning adds"
          dimension="length"
          example="1 um"
        />
        <MeasuredField
          field={handling.viaProtrusion}
          label="How far vias stand out afterwards"
          dimension="length"
          example="5 um"
          hint="Blank: no vias, or not known"
        />
      </KindGroup>
      <KindGroup needed={has.tape} title="Tape" className={SHOWN.tape}>
        <ExplainedChoiceField
          field={fields.tape}
          label="Tape of the library"
          choices={choices.tapes}
          blank="None: as stated below"
          hint="What is not stated below is taken from it"
        />
        <TapeFields field={fields.handling} chosen={chosenTape(fields.tape, choices)} />
      </KindGroup>
      <KindGroup needed={has.trim} title="Edge trim" className={SHOWN.trim}>
        <MeasuredField field={fields.trimWidth} label="Width of the trim" dimension="length" example="0.7 mm" />
        <MeasuredField
          field={fields.trimDepth}
          label="Depth of the trim, from the device side"
          dimension="length"
          example="150 um"
        />
      </KindGroup>
      <KindGroup needed={has.bond} title="Carrier and bond" className={SHOWN.bond}>
        <div className="grid gap-3 tablet:grid-cols-2">
          <CarrierPieceField carrier={fields.carrier} piece={handling.carrierPiece} choices={choices} />
          <ExplainedChoiceField
            field={fields.bondingMaterial}
            label="Bonding material"
            choices={choices.materials}
            blank="Choose a bonding material"
          />
        </div>
        <MeasuredField field={fields.bondThickness} label="Thickness of the bond" dimension="length" example="40 um" />
        <MeasuredField
          field={handling.bondThicknessVariation}
          label="Thickness variation of this bond"
          dimension="length"
          example="1 um"
          hint="Blank: the material’s share of its thickness"
        />
        <ChoiceField
          field={handling.bondFace}
          label="Face that is bonded"
          choices={FACES}
          blank="Device side"
          hint="The back side for the second bond of a transfer between two carriers"
        />
      </KindGroup>
      <KindGroup needed={has.debond} className={SHOWN.debond}>
        <ChoiceField
          field={handling.debondFace}
          label="Face that is let go"
          choices={FACES}
          blank="The one that is bonded"
          hint="Say it where the wafer is between two carriers"
        />
      </KindGroup>
    </>
  );
}

/** Name of the tape that is chosen, while something is. */
const chosenTape = (field: FieldMetadata<string>, { tapes }: StepChoices) =>
  tapes.find(({ id }) => id === (field.value ?? field.initialValue))?.name ?? null;

/**
 * Groups show by the kind that is chosen, in the style sheet, so that it works while scripts are still on their way; where there
 * are none, all groups are there.
 */
const SHOWN = {
  bond: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option[value=bond]:checked]/step:block",
  debond: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option[value=debond]:checked]/step:block",
  trim: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option[value='edge_trim']:checked]/step:block",
  tape: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option:is([value='laminate_tape'],[value='mount_on_frame']):checked]/step:block",
  groundFace:
    "hidden noscript:block has-[[aria-invalid]]:block group-has-[option:is([value=grind],[value='stress_relief'],[value=polish],[value='via_reveal']):checked]/step:block",
};

/** Inputs of some kinds of step. For another kind they are switched off, so that nothing unseen is saved. */
function KindGroup(props: { needed: boolean; title?: string; className: string; children: ReactNode }) {
  const { needed, title, className, children } = props;
  const scripted = useInBrowser();
  return (
    <fieldset disabled={scripted && !needed} className={`${title ? "border-t border-ink pt-4" : ""} ${className}`}>
      {title && <legend className="float-left mb-2 w-full font-semibold">{title}</legend>}
      <div className="clear-both space-y-3">{children}</div>
    </fieldset>
  );
}
