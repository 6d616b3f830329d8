import { getInputProps } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { LineField } from "#app/components/forms/LineField.tsx";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { DeviationView, ReviewView } from "#app/schemas/review-view.ts";
import { ReviewForm, type ReviewAnswer } from "./ReviewForm.tsx";

/** What blocks a release, the deviations that cover it, and the form for another. */
export function BlockingFindings({ view, answer }: { view: ReviewView; answer: ReviewAnswer }) {
  const { blocking, revision, may } = view;
  const deviations = revision?.deviations ?? [];
  const covered = new Set(deviations.filter(({ inForce }) => inForce).flatMap(({ findings }) => findings));
  if (blocking.length === 0)
    return <p>Nothing: no step needs more support than is planned, must not run or cannot be judged.</p>;
  return (
    <>
      <ul>
        {blocking.map(({ key, step, stepTitle, title, outcome, reason, remedy, slots }) => (
          <li key={key} className="border-t border-line py-2 first:border-t-0 first:pt-0">
            <FindingTag outcome={outcome}>{`step ${step}${slots === null ? "" : `, ${slots}`}`}</FindingTag>{" "}
            <span className="font-medium">{noBreak(`${stepTitle}: ${title.toLowerCase()}`)}</span>
            <span className="block">{noBreak(reason)}</span>
            {remedy && <span className="block text-quiet">{noBreak(remedy)}</span>}
            {covered.has(key) && <span className="block font-medium">A deviation in force covers it.</span>}
          </li>
        ))}
      </ul>
      {deviations.length > 0 && (
        <>
          <h3 className="mt-4 font-semibold">Deviations</h3>
          <ul>
            {deviations.map((deviation) => (
              <Deviation key={deviation.id} deviation={deviation} view={view} />
            ))}
          </ul>
        </>
      )}
      {may.deviate && (
        <details key={deviations.length} className="mt-3" open={answer?.intent === "deviate"}>
          <summary className="link w-fit cursor-pointer">Record a deviation</summary>
          <DeviationForm view={view} answer={answer} />
        </details>
      )}
    </>
  );
}

function Deviation({ deviation, view }: { deviation: DeviationView; view: ReviewView }) {
  const { id, findings, reason, scope, until, recordedBy, recordedAt, signedBy, signedAt, inForce, maySign } =
    deviation;
  const waiting = useNavigation().state === "submitting";
  const named = view.blocking
    .filter(({ key }) => findings.includes(key))
    .map(({ step, title }) => `step ${step}, ${title.toLowerCase()}`);
  return (
    <li className="border-t border-line py-2 first:border-t-0">
      <p className="font-medium">
        {inForce ? "In force" : signedAt === null ? "Not in force: the second signature is missing" : "Expired"}, until{" "}
        {minuteOf(until)}
      </p>
      <p>For {named.join("; ")}.</p>
      <p>
        {reason} Only for {scope}.
      </p>
      <p className="text-label text-quiet">
        Recorded by {recordedBy}, {minuteOf(recordedAt)}
        {signedAt !== null && `; signed by ${signedBy}, ${minuteOf(signedAt)}`}
      </p>
      {maySign && (
        <Form method="post" className="mt-2">
          <input type="hidden" name="deviation" value={id} />
          <button type="submit" name="intent" value="sign" className="btn" disabled={waiting}>
            Sign this deviation
          </button>
        </Form>
      )}
    </li>
  );
}

function DeviationForm({ view, answer }: { view: ReviewView; answer: ReviewAnswer }) {
  return (
    <ReviewForm intent="deviate" answer={answer} button="Record the deviation" busy="Recording">
      {({ findings, reason, scope, until }) => (
        <>
          <fieldset className="field" aria-describedby={findings.errors ? findings.errorId : undefined}>
            <legend className="mb-1 text-label text-quiet">Findings that it is for</legend>
            {view.blocking.map(({ key, step, title }) => (
              <label key={key} className="mb-0 flex min-h-8 items-center gap-2 text-body text-ink">
                <input
                  type="checkbox"
                  name={findings.name}
                  value={key}
                  defaultChecked={initially(findings.initialValue, key)}
                  className="size-4 accent-ink"
                />
                <span>
                  Step {step}, {title.toLowerCase()}
                </span>
              </label>
            ))}
            <small id={findings.errorId}>{findings.errors?.[0]}</small>
          </fieldset>
          <NoteField field={reason} label="Why it is run all the same" />
          <LineField field={scope} label="Only for" hint="Which lots, wafers or tools." />
          <div className="field">
            <label htmlFor={until.id}>Last day</label>
            <input
              {...getInputProps(until, { type: "date" })}
              key={until.key}
              aria-describedby={until.errorId}
              className="w-44"
            />
            <small id={until.errorId}>
              {until.errors?.[0] ?? "To its end, UTC. It counts once a second person has signed."}
            </small>
          </div>
        </>
      )}
    </ReviewForm>
  );
}

const initially = (value: unknown, key: string) => value === key || (Array.isArray(value) && value.includes(key));
