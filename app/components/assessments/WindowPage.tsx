import { Form, useNavigation } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { AskedAxis, WindowInput, WindowPageData } from "#app/schemas/process-window.ts";
import { WindowPlot } from "./WindowPlot.tsx";
import { WindowTable } from "./WindowTable.tsx";

/** The verdict of a flow over two of its inputs: where it runs, and how far what is planned stands from where it does not. */
export function WindowPage({ page }: { page: WindowPageData }) {
  const { head, inputs, steps, step, x, y, fault, drawing } = page;
  const working = useNavigation().state === "loading";
  const [alongX, alongY] = [x, y].map(({ input }) => inputs.find(({ key }) => key === input) ?? null);
  return (
    <>
      <PageHead
        title="Process window"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: head.flow.name, path: `/flows/${head.flow.id}` },
          { name: `Assessment, revision ${head.revision}`, path: `/assessments/${head.id}` },
        ]}
      />
      <Form method="get" className="screen-only mb-4 max-w-280" key={JSON.stringify([x, y, step])}>
        <AxisFields name="x" label="Along" axis={x} inputs={inputs} />
        <AxisFields name="y" label="Upwards" axis={y} inputs={inputs} />
        <SelectField
          name="step"
          label="Judged at"
          blank="The whole flow"
          options={steps.map(({ number, title }) => ({ value: String(number), label: `Step ${number}, ${title}` }))}
          defaultValue={step === null ? "" : String(step)}
          className="w-120 max-w-full min-w-0"
        />
        <button type="submit" className="btn btn-primary mt-2" disabled={working}>
          {working ? "Walking the flow" : "Draw"}
        </button>
      </Form>
      {fault ? (
        <Notice kind="error" title="Nothing is drawn">
          {fault}
        </Notice>
      ) : null}
      {drawing && alongX && alongY ? (
        <article className="frame p-4 tablet:p-6" aria-busy={working}>
          <WindowPlot
            drawing={drawing}
            names={{ x: nameOf(alongX), y: nameOf(alongY) }}
            label={`Verdict over ${nameOf(alongX)} and ${nameOf(alongY)}; the table below says the same in words`}
          />
          <ul className="mt-3 flex flex-wrap gap-x-6 gap-y-1" aria-label="Key">
            {[...new Set(drawing.runs.map(({ outcome }): Outcome => outcome))].map((outcome) => (
              <li key={outcome}>
                <FindingTag outcome={outcome} />
              </li>
            ))}
            <li className="text-quiet">Line: from there on it does not run</li>
            {drawing.planned ? <li className="text-quiet">Ring: as planned</li> : null}
          </ul>
          <WindowTable drawing={drawing} x={alongX} y={alongY} />
          <p className="mt-3 max-w-160 text-label text-quiet">
            {drawing.walks} places were walked with all rules at nominal values; the others lie between places that
            agree. An island smaller than four cells of the grid can be missed.
          </p>
        </article>
      ) : fault === null && !(x.input && y.input) ? (
        <EmptyState title="Choose two inputs">
          {inputs.length < 2
            ? "This flow has fewer than two quantities that could be moved."
            : "The flow is then assessed over the range of both. A range left blank is taken about what is planned."}
        </EmptyState>
      ) : null}
    </>
  );
}

const nameOf = ({ label, unit }: WindowInput) => `${label.split(":")[0] ?? label}, ${unit}`;

interface AxisProps {
  name: "x" | "y";
  label: string;
  axis: AskedAxis;
  inputs: readonly WindowInput[];
}

function AxisFields({ name, label, axis, inputs }: AxisProps) {
  return (
    <fieldset className="flex min-w-0 flex-wrap items-start gap-x-3 gap-y-2">
      <legend className="sr-only">{label}</legend>
      <SelectField
        name={name}
        label={label}
        blank="Choose"
        options={inputs.map(({ key, label: text, planned }) => ({ value: key, label: `${text}, ${planned}` }))}
        defaultValue={axis.input}
        className="w-120 max-w-full min-w-0"
      />
      <TextField
        name={`${name}-from`}
        label="from"
        defaultValue={axis.from}
        error={axis.faults.from}
        className="w-32"
      />
      <TextField name={`${name}-to`} label="to" defaultValue={axis.to} error={axis.faults.to} className="w-32" />
    </fieldset>
  );
}
