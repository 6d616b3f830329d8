import { getFormProps, type SubmissionResult } from "@conform-to/react";
import type { ReactNode } from "react";
import { Form, Link } from "react-router";
import { ChoiceField, sameWords, type Choice } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { LEAVE, UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { useEdited } from "#app/components/forms/use-edited.ts";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { WAFER_KINDS } from "#app/engine/flow/handling-inputs.ts";
import type { ExplainedChoice } from "#app/lib/flow-step-choices.ts";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";
import type { FlowFormValues } from "./flow-form-values.ts";

interface Props {
  values: Partial<FlowFormValues>;
  version: number | null;
  /** what cannot be chosen here is said instead, under the same name */
  program: Choice[] | { id: string; name: string };
  silicon: Choice[] | { id: string; name: string };
  /** carriers and bonding materials, where the flow starts from steps that need them */
  bond?: { carriers: ExplainedChoice[]; materials: ExplainedChoice[] } | null;
  /** what the first steps come from */
  origin?: { kind: "stack" | "template" | "flow"; id: string } | null;
  lastResult: SubmissionResult<string[]> | null | undefined;
  back: string;
  save: string;
}

/** The head of a flow: whose it is, its name, and the silicon as it comes in. */
export function FlowForm({ values, version, program, silicon, bond, origin, lastResult, back, save }: Props) {
  const [form, fields] = useRecordForm<FlowFormValues>({ lastResult, defaultValue: values });
  const edited = useEdited(form.id);
  return (
    <Form method="post" {...getFormProps(form)} className="frame max-w-240 space-y-4 p-4 tablet:p-6">
      <UnsavedGuard dirty={edited} />
      <FormHead lastResult={lastResult} />
      {version !== null && <input type="hidden" name="version" value={version} />}
      {origin && <input type="hidden" name={origin.kind} value={origin.id} />}
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={fields.name} label="Name" hint="Product, target thickness, how it is held" />
        {Array.isArray(program) ? (
          <ChoiceField field={fields.program} label="Program" choices={program} blank="Choose" />
        ) : (
          <Given field="program" label="Program" value={program} />
        )}
      </div>
      {Array.isArray(silicon) ? (
        <ChoiceField field={fields.silicon} label="Silicon" choices={silicon} blank="Choose" />
      ) : (
        <Given field="silicon" label="Silicon" value={silicon} />
      )}
      <MeasuredField
        field={fields.incomingThickness}
        label="Silicon as it comes in"
        dimension="length"
        example="725 um"
        hint="Before the first step"
      />
      <Folded
        label="Shape that it comes in with"
        holds={["incomingBowAlong", "incomingBowAcross", "incomingFilmShare"]}
        given={Boolean(values.incomingBowAlong?.value)}
        lastResult={lastResult}
      >
        <p className="max-w-[60em] text-quiet">
          Leave it blank where a step adds an equivalent film of the fab’s back end: its bow would count twice.
        </p>
        <MeasuredField
          field={fields.incomingBowAlong}
          label="Measured bow along the notch, dome positive with the device side up"
          dimension="length"
          example="-90 um"
          hint="Free, gravity compensated"
        />
        <MeasuredField
          field={fields.incomingBowAcross}
          label="Measured bow across it"
          dimension="length"
          example="-80 um"
          hint="The same again where both are alike"
        />
        <MeasuredField
          field={fields.incomingFilmShare}
          label="Share of it that films cause, which grows when the wafer is thinned"
          dimension="fraction"
          example="80 %"
          hint="Blank: not known, taken as all of it"
        />
      </Folded>
      <Folded
        label="What may come in"
        holds={["waferKind", "gateBow", "gateWarp"]}
        given={Boolean(values.gateBow?.value || values.gateWarp?.value)}
        lastResult={lastResult}
      >
        <ChoiceField
          field={fields.waferKind}
          label="What stands in the flow"
          choices={sameWords(WAFER_KINDS)}
          hint="Only silicon wafers are judged; everything else is refused by name"
        />
        <MeasuredField
          field={fields.gateBow}
          label="Bow that is accepted, dome positive, with its band as tolerance"
          dimension="length"
          example="-90 um"
        />
        <MeasuredField
          field={fields.gateWarp}
          label="Largest warp that is accepted"
          dimension="length"
          example="200 um"
        />
      </Folded>
      {bond && (
        <fieldset className="border-t border-line pt-3">
          <legend className="float-left mb-2 w-full font-semibold">Carrier and bond</legend>
          <div className="clear-both grid gap-3 tablet:grid-cols-2">
            <ExplainedChoiceField
              field={fields.carrier}
              label="Carrier"
              choices={bond.carriers}
              blank="Choose a carrier"
            />
            <ExplainedChoiceField
              field={fields.bondingMaterial}
              label="Bonding material"
              choices={bond.materials}
              blank="Choose a bonding material"
            />
          </div>
        </fieldset>
      )}
      <NoteField field={fields.note} label="Note" />
      <div className="flex flex-wrap gap-2 border-t border-line pt-4">
        <SubmitButton busy="Saving">{save}</SubmitButton>
        <Link to={back} state={LEAVE} className="btn">
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}

/** Fields that few flows have, folded away until something of them is given or needs a look. */
function Folded(
  props: Pick<Props, "lastResult"> & { label: string; holds: string[]; given: boolean; children: ReactNode },
) {
  const faults = Object.keys(props.lastResult?.error ?? {});
  const faulty = faults.some((fault) => props.holds.includes(fault.split(".")[0] ?? ""));
  return (
    <details className="border-t border-line pt-3" open={props.given || faulty}>
      <summary className="cursor-pointer font-semibold">{props.label}</summary>
      <div className="mt-3 space-y-3">{props.children}</div>
    </details>
  );
}

/** What is settled already: said, and sent along. */
function Given({ field, label, value }: { field: string; label: string; value: { id: string; name: string } }) {
  return (
    <div className="field">
      <span>{label}</span>
      <p className="py-1.5">{value.name}</p>
      <input type="hidden" name={field} value={value.id} />
    </div>
  );
}
