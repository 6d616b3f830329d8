import { IntentForm } from "./IntentForm.tsx";

/** Removal of a whole flow, asked for twice. A flow that was assessed stays, because its assessments do. */
export function RemoveFlow({ name, assessed }: { name: string; assessed: boolean }) {
  if (assessed) return <p className="text-quiet">It has been assessed, so it is kept with its assessments.</p>;
  return (
    <details>
      <summary className="btn btn-remove list-none">Remove this flow</summary>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <p className="font-semibold">Remove “{name}” with all its steps? That cannot be taken back.</p>
        <IntentForm intent="remove" busy="Removing" className="btn btn-remove">
          Remove it
        </IntentForm>
      </div>
    </details>
  );
}
