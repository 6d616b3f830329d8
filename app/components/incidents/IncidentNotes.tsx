import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { nextStates } from "#app/lib/incident-states.ts";
import type { IncidentAnswer } from "#app/lib/incident-answer.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { IncidentView } from "#app/schemas/incident.ts";
import { STATE_CHOICES, STATE_CLASSES } from "./incident-words.ts";

/** What was found out and done, oldest first, and a form for the next note. */
export function IncidentNotes({ incident, answer }: { incident: IncidentView; answer: IncidentAnswer | null }) {
  const { notes, mayFollowUp, state } = incident;
  return (
    <HungSection title="Follow-up" remark={notes.length === 0 ? "No note yet" : "Notes stay as they were written"}>
      {notes.length === 0 && (
        <p className="text-quiet">
          Engineers and process owners of the program note here what was found and done, until it is closed.
        </p>
      )}
      <ol className="space-y-3">
        {notes.map((note) => (
          <li key={note.id} className="max-w-160">
            <p className="text-quiet">
              {minuteOf(note.at)}, {note.by}: <span className={STATE_CLASSES[note.state]}>{note.state}</span>
            </p>
            <p className="whitespace-pre-line break-words">{note.text}</p>
          </li>
        ))}
      </ol>
      {mayFollowUp && (
        <Form key={notes.length} method="post" encType="multipart/form-data" className="screen-only mt-4 max-w-160">
          {answer && (
            <Notice kind="error" title={answer.faults.join(" ")}>
              Nothing is noted yet, and nothing that you typed is lost.
            </Notice>
          )}
          <div className="field">
            <label htmlFor="note">Note</label>
            <textarea id="note" name="text" rows={4} maxLength={4000} required defaultValue={answer?.text ?? ""} />
            <small>Cause, measure, who does what until when</small>
          </div>
          <div className="field mt-2">
            <label htmlFor="note-state">How it stands then</label>
            <select id="note-state" name="state" defaultValue={state === "closed" ? "open" : state}>
              {nextStates(state).map((next) => (
                <option key={next} value={next}>
                  {STATE_CHOICES[state][next]}
                </option>
              ))}
            </select>
          </div>
          <div className="mt-3">
            <SubmitButton busy="Noting">Add the note</SubmitButton>
          </div>
        </Form>
      )}
    </HungSection>
  );
}
