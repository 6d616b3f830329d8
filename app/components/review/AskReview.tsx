import { NoteField } from "#app/components/forms/NoteField.tsx";
import type { ReviewView } from "#app/schemas/review-view.ts";
import { ReviewForm, type ReviewAnswer } from "./ReviewForm.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";

/** Asks for a review, or says why that cannot be done now. */
export function AskReview({ view, answer }: { view: ReviewView; answer: ReviewAnswer }) {
  const { notAsked, may, revision } = view;
  if (revision && revision.state !== "returned") return null;
  return (
    <HungSection title="Ask for a review">
      {notAsked !== null ? (
        <p>{notAsked}</p>
      ) : may.ask ? (
        <>
          <p>
            A process owner of the program checks it and releases the sheet or returns it. It must be somebody else than
            you. Inputs and results are bound as they are now.
          </p>
          <ReviewForm intent="ask" answer={answer} button="Ask for a review" busy="Asking" primary>
            {({ note }) => <NoteField field={note} label="What the reviewer should know" hint="May stay empty." />}
          </ReviewForm>
        </>
      ) : (
        <p>An engineer or a process owner of the program asks for it.</p>
      )}
    </HungSection>
  );
}
