import { getCollectionProps, getFormProps, type FieldMetadata, type SubmissionResult } from "@conform-to/react";
import { useRef, useState, type ReactNode } from "react";
import { Form, Link, useSearchParams } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { LEAVE, UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { EXPOSURES, HOLDINGS } from "#app/engine/vocabulary.ts";
import type { StepChoices } from "#app/lib/flow-step-choices.ts";
import { withParams } from "#app/lib/list-params.ts";
import { inputsOf } from "#app/lib/flow-step-kinds.ts";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import { StepConflict } from "./StepConflict.tsx";
import { StepFilms } from "./StepFilms.tsx";
import type { StepFormValues } from "./step-form-values.ts";
import { useStepDraft } from "./use-step-draft.ts";

interface Props {
  values: Partial<StepFormValues>;
  /** version of the flow that the form was filled from */
  version: number;
  choices: StepChoices;
  lastResult: SubmissionResult<string[]> | null | undefined;
  /** somebody else was quicker */
  conflict?: FlowConflict | null;
  back: string;
  /** words of the button that saves and goes on, when there is something to go on to */
  next: string | null;
}

/** A step of a flow; what an earlier visit left half typed can be filled in again. */
export function StepForm(props: Props) {
  const [refilled, setRefilled] = useState<{ values: Partial<StepFormValues>; times: number } | null>(null);
  return (
    <StepFields
      {...props}
      key={refilled?.times}
      values={refilled?.values ?? props.values}
      lastResult={refilled ? null : props.lastResult}
      refilled={refilled !== null}
      onRefill={(values) => setRefilled({ values, times: (refilled?.times ?? 0) + 1 })}
    />
  );
}

interface FieldsProps extends Props {
  refilled: boolean;
  onRefill: (values: Partial<StepFormValues>) => void;
}

/** What only some kinds of step have is offered for those kinds; without scripts everything is there. */
function StepFields(props: FieldsProps) {
  const { values, version, choices, lastResult, conflict, back, next, refilled, onRefill } = props;
  const [form, fields] = useRecordForm<StepFormValues>({ lastResult, defaultValue: values });
  const [kind, setKind] = useState(fields.kind.initialValue);
  const has = inputsOf(kind);
  const element = useRef<HTMLFormElement>(null);
  const draft = useStepDraft(element);
  const [search] = useSearchParams();
  return (
    <Form
      ref={element}
      method="post"
      {...getFormProps(form)}
      className="group/step frame min-w-0 space-y-4 p-4 tablet:p-6"
      onInput={draft.keep}
    >
      {/* Enter in a field saves the step: the first button of a form is the one that it presses. */}
      <button type="submit" className="sr-only" tabIndex={-1} aria-hidden>
        Save step
      </button>
      <UnsavedGuard dirty={form.dirty || refilled} />
      {conflict ? (
        <StepConflict
          conflict={conflict}
          theirs={withParams(search, { theirs: String(conflict.version ?? 0) })}
          onTakeTheirs={draft.forget}
        />
      ) : (
        <FormHead lastResult={lastResult} />
      )}
      {draft.offered && !lastResult && !refilled && (
        <DraftOffer
          at={draft.offered.at}
          onTake={() => draft.offered && onRefill(draft.offered.values())}
          onForget={draft.forget}
        />
      )}
      <input type="hidden" name="version" value={version} />
      <div className="grid gap-3 tablet:grid-cols-[2fr_1fr]">
        <LineField field={fields.title} label="What is done" hint="As the floor says it: coat and cure polymer, 5 µm" />
        <ChoiceField
          field={fields.kind}
          label="Kind of step"
          choices={sameWords(STEP_KINDS)}
          blank="Choose"
          select={{ onChange: (event) => setKind(event.currentTarget.value) }}
        />
      </div>
      <div className="grid gap-3 tablet:grid-cols-[1fr_1fr_2fr]">
        <QuantityField
          field={fields.peakTemperature}
          label="Peak temperature"
          dimension="temperature"
          example="230 °C"
        />
        <QuantityField
          field={fields.holdTime}
          label="Time at peak"
          dimension="time"
          example="120 min"
          hint="Blank: it does not matter"
        />
        <ExplainedChoiceField
          field={fields.equipment}
          label="Tool"
          choices={choices.tools}
          blank="Choose a tool"
          hint="Without a tool its warp limit is not known"
        />
      </div>
      <div className="grid gap-x-3 gap-y-4 tablet:grid-cols-[1fr_2fr]">
        <ChoiceField
          field={fields.planned}
          label="Held by, as planned"
          choices={sameWords(HOLDINGS)}
          blank="Choose"
          hint="While this is done and when it leaves the tool"
        />
        <Exposures field={fields.exposures} />
      </div>
      <MeasuredField
        field={fields.siliconAfter}
        label="Silicon after the step"
        dimension="length"
        example="100 um"
        hint="Blank: as before"
      />
      <KindGroup needed={has.groundFace} className={SHOWN.groundFace}>
        <MeasuredField
          field={fields.groundFaceForce}
          label="Force of the ground or polished face; compression is negative"
          dimension="forcePerLength"
          example="-60 N/m"
          hint="Blank: as before"
        />
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
          <ExplainedChoiceField
            field={fields.carrier}
            label="Carrier"
            choices={choices.carriers}
            blank="Choose a carrier"
          />
          <ExplainedChoiceField
            field={fields.bondingMaterial}
            label="Bonding material"
            choices={choices.materials}
            blank="Choose a bonding material"
          />
        </div>
        <MeasuredField field={fields.bondThickness} label="Thickness of the bond" dimension="length" example="40 um" />
      </KindGroup>
      <StepFilms form={form} field={fields.films} films={choices.films} />
      <div className="flex flex-wrap gap-2 border-t border-ink pt-4">
        <SubmitButton busy="Saving">Save step</SubmitButton>
        {next !== null && (
          <button type="submit" name="then" value="next" className="btn">
            {next}
          </button>
        )}
        <Link to={back} state={LEAVE} className="btn" onClick={draft.forget}>
          Leave without saving
        </Link>
      </div>
    </Form>
  );
}

function DraftOffer({ at, onTake, onForget }: { at: string; onTake: () => void; onForget: () => void }) {
  return (
    <Notice kind="caution" title={`You typed here until ${at.slice(0, 16).replace("T", " ")} UTC and did not save it`}>
      <div className="mt-2 flex flex-wrap gap-2">
        <button type="button" className="btn" onClick={onTake}>
          Fill it in again
        </button>
        <button type="button" className="btn" onClick={onForget}>
          Throw it away
        </button>
      </div>
    </Notice>
  );
}

/**
 * Groups show by the kind that is chosen, in the style sheet, so that it works while scripts are still on their way; where there
 * are none, all groups are there.
 */
const SHOWN = {
  bond: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option[value=bond]:checked]/step:block",
  trim: "hidden noscript:block has-[[aria-invalid]]:block group-has-[option[value='edge_trim']:checked]/step:block",
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

function Exposures({ field }: { field: FieldMetadata<string[] | undefined> }) {
  return (
    <fieldset>
      <legend className="mb-1 text-label text-quiet">What it exposes the wafer to</legend>
      <div className="flex flex-wrap gap-x-5">
        {getCollectionProps(field, { type: "checkbox", options: [...EXPOSURES] }).map(({ key, ...input }) => (
          <label key={key} className="flex min-h-8 items-center gap-2">
            <input {...input} key={key} className="size-4 accent-ink" />
            {input.value}
          </label>
        ))}
      </div>
      {field.errors && <p className="text-label text-stop">{field.errors[0]}</p>}
    </fieldset>
  );
}
