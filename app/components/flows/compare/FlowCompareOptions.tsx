import { Form, useNavigation } from "react-router";
import { HiddenAsked } from "#app/components/comparison/HiddenAsked.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { NO_TOOL } from "#app/lib/comparison/asked.ts";
import type { ComparedFlows, FlowComparisonView } from "#app/schemas/flow-comparison.ts";

const OWN = ["along", "scale", "from", "to", "tool"] as const;
const ALONG = [
  { value: "steps", label: "Steps, as it lies" },
  { value: "thickness", label: "Silicon thickness, let go" },
];
const SCALES = [
  { value: "log", label: "Logarithmic" },
  { value: "linear", label: "Linear" },
];

/** Along what, on which axes and against which limits flows are compared: a form that puts it into the address. */
export function FlowCompareOptions({ view, compared }: { view: FlowComparisonView; compared: ComparedFlows }) {
  const { asked, tools } = view;
  const { drawn, faults } = compared;
  const loading = useNavigation().state === "loading";
  const byThickness = drawn.along === "thickness";
  return (
    <Form
      method="get"
      preventScrollReset
      replace
      aria-label="How to compare"
      className="screen-only mb-2 flex flex-wrap items-start gap-x-4 gap-y-2"
      key={[...OWN.map((name) => asked[name]), drawn.along].join(" ")}
    >
      <HiddenAsked asked={asked} without={byThickness ? OWN : ["along", "scale", "tool"]} />
      <SelectField name="along" label="Along" className="w-56" defaultValue={drawn.along} options={ALONG} />
      <SelectField
        name="scale"
        label="Axes"
        className="w-44"
        defaultValue={asked.scale}
        blank={byThickness ? "Usual: logarithmic" : "Usual: linear"}
        options={SCALES}
      />
      {byThickness ? (
        <>
          <TextField
            name="from"
            label="Silicon from"
            className="w-32"
            defaultValue={asked.from}
            placeholder="50 µm"
            hint="blank: thinnest"
            error={faults.from}
            autoComplete="off"
          />
          <TextField
            name="to"
            label="to"
            className="w-32"
            defaultValue={asked.to}
            placeholder="775 µm"
            hint="blank: as it comes"
            error={faults.to}
            autoComplete="off"
          />
        </>
      ) : null}
      <SelectField
        name="tool"
        label="Warp limits of"
        className="min-w-0 flex-1 basis-56"
        defaultValue={asked.tool}
        blank={byThickness ? "The strictest and the most lenient tool" : "The tool of each step"}
        options={[...tools, { value: NO_TOOL, label: "No tool" }]}
      />
      <button type="submit" className="btn mt-5">
        {loading ? "Comparing…" : "Show"}
      </button>
    </Form>
  );
}
