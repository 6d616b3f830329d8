import { Form, Link } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import type { KeepFlowPage } from "#app/schemas/template-view.ts";

/** Whether a flow becomes a new template or takes the place of one; said before it is kept: all staff of the site will see it. */
export function KeepFlow({ flow, newName, templates, asked }: KeepFlowPage & { asked: string | null }) {
  const replaced = templates.find(({ id }) => id === asked);
  return (
    <Form method="post" className="frame max-w-200 space-y-4 p-4 tablet:p-6">
      <p className="text-lead font-medium text-pretty">
        Everybody on the staff of the site will see this template, in every program: its name, its steps, films,
        temperatures and tools.
      </p>
      <p className="text-quiet">
        Guests see no templates. Lots, assessments and the incoming shape of the wafer are not kept. If a name or a step
        title is the customer’s own, change it in the flow first.
      </p>
      {replaced ? (
        <>
          <input type="hidden" name="template" value={replaced.id} />
          <input type="hidden" name="sure" value={replaced.id} />
          <p role="alert" className="border-t border-line pt-4 font-semibold">
            Replace the steps of ‘{replaced.name}’ by the {flow.steps} steps of this flow, for the whole site?
          </p>
          <p>Its name and note stay. Flows that began from it stay as they are. The old steps are gone.</p>
          <div className="flex flex-wrap items-center gap-3">
            <SubmitButton busy="Replacing">Replace its steps</SubmitButton>
            <Link to={`/flows/${flow.id}/keep`} className="link">
              Choose again
            </Link>
          </div>
        </>
      ) : (
        <>
          <SelectField
            name="template"
            label="Keep it as"
            defaultValue={templates.find(({ name }) => name === flow.name)?.id ?? ""}
            blank={`A new template, ‘${newName}’`}
            options={templates.map(({ id, name }) => ({ value: id, label: `In place of ‘${name}’` }))}
            hint="In place of a template: you are asked once more before its steps are replaced"
          />
          <div className="flex flex-wrap items-center gap-3">
            <SubmitButton busy="Keeping">Keep</SubmitButton>
            <Link to={`/flows/${flow.id}`} className="link">
              Leave it
            </Link>
          </div>
        </>
      )}
    </Form>
  );
}
