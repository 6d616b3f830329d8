import { Form, useNavigation } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { trialHome } from "#app/lib/leg-query.ts";
import { BY_SERVER } from "#app/lib/read-sent.ts";
import type { AskedAxis, SentWindow, WindowInput, WindowPageData } from "#app/schemas/process-window.ts";
import { TrialLeg } from "./TrialLeg.tsx";
import { WindowDrawn } from "./WindowDrawn.tsx";

interface WindowPageProps {
  page: WindowPageData;
  /** what there is to draw, where the browser does; otherwise the page has what the server has drawn */
  question?: SentWindow["question"];
}

/** The verdict of a flow over two of its inputs: where it runs, and how far what is planned stands from where it does not. */
export function WindowPage({ page, question = null }: WindowPageProps) {
  const { head, inputs, steps, step, x, y, fault } = page;
  const working = useNavigation().state === "loading";
  const asked = JSON.stringify([x, y, step, head.leg?.number]);
  return (
    <>
      <PageHead
        title="Process window"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: head.flow.name, path: `/flows/${head.flow.id}` },
          { name: `Assessment ${head.revision}`, path: trialHome(head) },
        ]}
      />
      <TrialLeg head={head} />
      <Form method="get" className="screen-only mb-4 max-w-280" key={asked}>
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
        {head.leg ? <input type="hidden" name="leg" value={head.leg.number} /> : null}
        {head.mayAssess ? null : <ByServer />}
        <button type="submit" className="btn btn-primary mt-2" disabled={working}>
          {working ? "Walking the flow" : "Draw"}
        </button>
      </Form>
      {fault ? (
        <Notice kind="error" title="Nothing is drawn">
          {fault}
        </Notice>
      ) : null}
      {question || page.drawing ? (
        <WindowDrawn key={asked} page={page} question={question} waiting={working} />
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

/** Who may not have the inputs has the server work it out. */
function ByServer() {
  const [name, value] = BY_SERVER.split("=");
  return <input type="hidden" name={name} value={value} />;
}

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
