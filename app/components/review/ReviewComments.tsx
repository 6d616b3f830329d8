import { getSelectProps } from "@conform-to/react";
import { NoteField } from "#app/components/forms/NoteField.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { ReviewRevision, ReviewView } from "#app/schemas/review-view.ts";
import { ReviewForm, type ReviewAnswer } from "./ReviewForm.tsx";

interface Props {
  view: ReviewView;
  revision: ReviewRevision;
  answer: ReviewAnswer;
}

/** What was said in the review, in its order, and the form to say something. */
export function ReviewComments({ view: { steps, may }, revision: { comments, state }, answer }: Props) {
  const titles = new Map(steps.map(({ number, title }) => [number, title]));
  return (
    <>
      {comments.length === 0 && (
        <p>{state === "in review" ? "Nobody has said anything yet." : "Nobody said anything."}</p>
      )}
      <ul>
        {comments.map(({ id, step, text, at, by }) => (
          <li key={id} className="border-t border-line py-2 first:border-t-0 first:pt-0">
            <p className="text-label text-quiet">
              {by}, {minuteOf(at)}
              {step !== null && `, at step ${step}, ${titles.get(step) ?? ""}`}
            </p>
            <p className="whitespace-pre-line wrap-anywhere">{text}</p>
          </li>
        ))}
      </ul>
      {may.comment && (
        <ReviewForm key={comments.length} intent="comment" answer={answer} button="Say it" busy="Saying it">
          {({ step, text }) => (
            <>
              <div className="field">
                <label htmlFor={step.id}>About</label>
                <select {...getSelectProps(step)} key={step.key}>
                  <option value="">The whole</option>
                  {steps.map(({ number, title }) => (
                    <option key={number} value={number}>{`Step ${number}, ${title}`}</option>
                  ))}
                </select>
                <small>{step.errors?.[0]}</small>
              </div>
              <NoteField field={text} label="Comment" />
            </>
          )}
        </ReviewForm>
      )}
    </>
  );
}
