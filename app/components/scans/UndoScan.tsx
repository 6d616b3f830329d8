import { Form } from "react-router";
import type { ScanDetail } from "#app/schemas/scan-view.ts";

/** The way back from an import, until the scan is used; then it says by what. */
export function UndoScan({ scan: { label, placed, undo } }: { scan: ScanDetail }) {
  if (!undo.may) return null;
  if (undo.use !== null)
    return (
      <p className="screen-only mt-4 text-quiet">The import of this scan cannot be undone any more: {undo.use}.</p>
    );
  return (
    <details className="screen-only mt-4">
      <summary className="link w-fit cursor-pointer text-stop">Undo the import of this scan</summary>
      <Form method="post" className="mt-2 max-w-160 space-y-3">
        <input type="hidden" name="intent" value="undo" />
        <p>
          The scan {label} and its figures go. The two files are kept as they came, and can be imported again.
          {placed && " Nothing uses this scan yet."}
        </p>
        <div className="flex flex-wrap gap-2">
          {placed && (
            <button type="submit" name="placed" value="wait again" className="btn">
              Take apart: both files wait for a partner again
            </button>
          )}
          <button type="submit" name="placed" value="leave" className="btn btn-remove">
            Undo the import
          </button>
        </div>
      </Form>
    </details>
  );
}
