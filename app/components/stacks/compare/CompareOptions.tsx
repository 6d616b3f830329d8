import { Form, useNavigation } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { NO_TOOL } from "#app/lib/comparison/asked.ts";
import type { ComparisonFaults } from "#app/schemas/comparison.ts";
import type { StackComparisonView } from "#app/schemas/stack-comparison.ts";
import { HiddenAsked } from "#app/components/comparison/HiddenAsked.tsx";

const OWN = ["at", "scale", "from", "to", "tool"] as const;
const SCALES = [
  { value: "log", label: "Logarithmic" },
  { value: "linear", label: "Linear" },
];

/** At which temperature, over which thickness and on which axes the stacks are compared: a form that puts it into the address. */
export function CompareOptions({ view, faults }: { view: StackComparisonView; faults: ComparisonFaults }) {
  const { asked, tools } = view;
  const loading = useNavigation().state === "loading";
  return (
    <Form
      method="get"
      preventScrollReset
      replace
      aria-label="How to compare"
      className="screen-only mb-2 flex flex-wrap items-start gap-x-4 gap-y-2"
      key={OWN.map((name) => asked[name]).join(" ")}
    >
      <HiddenAsked asked={asked} without={OWN} />
      <TextField
        name="at"
        label="Temperature"
        className="w-32"
        defaultValue={asked.at}
        placeholder="25 °C"
        hint="blank: 25&nbsp;°C"
        error={faults.at}
        autoComplete="off"
      />
      <TextField
        name="from"
        label="Silicon from"
        className="w-32"
        defaultValue={asked.from}
        placeholder="20 µm"
        hint="blank: 20&nbsp;µm"
        error={faults.from}
        autoComplete="off"
      />
      <TextField
        name="to"
        label="to"
        className="w-36"
        defaultValue={asked.to}
        placeholder="as bought"
        hint="blank: as bought"
        error={faults.to}
        autoComplete="off"
      />
      <SelectField name="scale" label="Axes" className="w-36" defaultValue={asked.scale || "log"} options={SCALES} />
      <SelectField
        name="tool"
        label="Warp limits of"
        className="min-w-0 flex-1 basis-56"
        defaultValue={asked.tool}
        blank="The strictest and the most lenient tool"
        options={[...tools, { value: NO_TOOL, label: "No tool" }]}
      />
      <button type="submit" className="btn mt-5">
        {loading ? "Comparing…" : "Show"}
      </button>
    </Form>
  );
}
