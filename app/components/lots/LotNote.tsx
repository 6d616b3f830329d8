import { useId } from "react";
import { Form } from "react-router";
import type { LotDetail } from "#app/schemas/lot-view.ts";

/** What there is to say of a lot, and a form to say it. */
export function LotNote({ lot: { note, mayUpload } }: { lot: LotDetail }) {
  const id = useId();
  return (
    <div className="mb-4 max-w-160">
      {note !== "" && <p className="whitespace-pre-line">{note}</p>}
      {mayUpload && (
        <details className="mt-1 print:hidden" key={note}>
          <summary className="link w-fit cursor-pointer">{note === "" ? "Write a note" : "Change the note"}</summary>
          <Form method="post" className="mt-2">
            <div className="field">
              <label htmlFor={id}>Note, up to 500 characters</label>
              <textarea id={id} name="note" rows={3} maxLength={500} defaultValue={note} />
            </div>
            <button type="submit" name="intent" value="note" className="btn mt-2">
              Save the note
            </button>
          </Form>
        </details>
      )}
    </div>
  );
}
