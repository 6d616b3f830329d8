import { getFormProps, type SubmissionResult } from "@conform-to/react";
import { useRef, useState } from "react";
import { Form, Link, useSearchParams } from "react-router";
import { ChoiceField, sameWords } from "#app/components/forms/ChoiceField.tsx";
import { FormHead } from "#app/components/forms/FormHead.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { MeasuredField } from "#app/components/forms/MeasuredField.tsx";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { LEAVE, UnsavedGuard } from "#app/components/forms/UnsavedGuard.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { useEdited } from "#app/components/forms/use-edited.ts";
import { useRecordForm } from "#app/components/forms/use-record-form.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { FACES_UP, HOLDINGS } from "#app/engine/vocabulary.ts";
import type { StepChoices } from "#app/lib/flow-step-choices.ts";
import { withParams } from "#app/lib/list-params.ts";
import { ExplainedChoiceField } from "./ExplainedChoiceField.tsx";
import { ExposureFields } from "./ExposureFields.tsx";
import { HeatFields } from "./HeatFields.tsx";
import { HandlingFields } from "./HandlingFields.tsx";
import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import { KindFields } from "./KindFields.tsx";
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
  const edited = useEdited(form.id);
  const [kind, setKind] = useState(fields.kind.initialValue);
  const handling = fields.handling.getFieldset();
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
      <UnsavedGuard dirty={edited || refilled} />
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
      <div className="grid items-start gap-3 tablet:grid-cols-2">
        <HeatFields peak={fields.peakTemperature} hold={fields.holdTime} profile={handling.profile} />
        <div className="grid grid-cols-2 gap-3">
          <ExplainedChoiceField
            field={fields.equipment}
            label="Tool"
            choices={choices.tools}
            blank="Choose a tool"
            hint="Without a tool its warp limit is not known"
            className="col-span-2"
          />
          <LineField field={handling.machine} label="Which of them" hint="Of several alike: oven 3" />
          <LineField field={handling.recipe} label="Recipe" hint="As the tool calls it" />
          <LineField
            field={handling.slots}
            label="Slots"
            hint="Of the cassette: 1-12, 14. Blank: every wafer of the lot"
            className="col-span-2"
          />
        </div>
      </div>
      <div className="grid gap-x-3 gap-y-4 tablet:grid-cols-[1fr_2fr]">
        <div className="space-y-3">
          <ChoiceField
            field={fields.planned}
            label="Held by, as planned"
            choices={sameWords(HOLDINGS)}
            blank="Choose"
            hint="While this is done and when it leaves the tool"
          />
          <ChoiceField
            field={handling.sideUp}
            label="Side up"
            choices={sameWords(FACES_UP)}
            blank="As it comes"
            hint="Left open: as at the step before; bonding, mounting and debonding turn it as usual"
          />
        </div>
        <ExposureFields field={fields.exposures} handling={fields.handling} />
      </div>
      <MeasuredField
        field={fields.siliconAfter}
        label="Silicon after the step"
        dimension="length"
        example="100 um"
        hint="Blank: as before"
      />
      <KindFields fields={fields} kind={kind} choices={choices} />
      <HandlingFields field={fields.handling} open={isHandled(values, lastResult)} />
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

/** Fields of the folded part. */
const FOLDED = [
  "contactFace",
  "contactMeans",
  "timeSincePrevious",
  "inLine",
  "bumpHeight",
  "bumpPeelForce",
  "topography",
] as const;

/** Whether the folded part has something in it, or a fault that is to be seen. */
function isHandled({ handling }: Partial<StepFormValues>, lastResult: Props["lastResult"]): boolean {
  const faulty = Object.keys(lastResult?.error ?? {}).some((name) => name.startsWith("handling."));
  return (
    faulty ||
    FOLDED.some((name) => {
      const typed = handling?.[name];
      return Boolean(typeof typed === "object" ? typed.value : typed);
    })
  );
}
