import { Form, useNavigation } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { answerOf, SWEEP_ANSWERS } from "#app/lib/stack-sweep/answers.ts";
import { NO_LIMIT, SWEEP_FIELDS, sweepSearch } from "#app/lib/stack-sweep/asked.ts";
import type { SweepView } from "#app/schemas/stack-sweep.ts";

const ANSWERS = SWEEP_ANSWERS.map(({ key, label }) => ({ value: key, label }));

/** What is swept over which range, and what is asked of it: a form that puts it into the address. */
export function SweepForm({ view }: { view: SweepView }) {
  const { asked, faults, limits } = view;
  const signed = answerOf(asked.answer)?.signed ?? false;
  const loading = useNavigation().state === "loading";
  return (
    <Form
      method="get"
      preventScrollReset
      replace
      aria-label="What to sweep"
      className="screen-only p-4 tablet:px-6"
      key={sweepSearch(asked)}
    >
      <SideFields view={view} side="x" label="Along" />
      <SideFields view={view} side="y" label="Upwards" />
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2">
        <SelectField
          name="answer"
          label="Answer"
          className="min-w-0 flex-1 basis-56"
          defaultValue={asked.answer || ANSWERS[0]?.value}
          options={ANSWERS}
          error={faults.answer}
        />
        <SelectField
          name="limit"
          label="Limit of"
          className="min-w-0 flex-1 basis-56"
          defaultValue={asked.limit}
          error={faults.limit}
          blank={limits[0] ? `The strictest: ${limits[0].label}` : "No limit is known"}
          options={[...limits, { value: NO_LIMIT, label: "No limit" }]}
        />
        <TextField
          name="own"
          label="or a limit of your own"
          className="w-40"
          defaultValue={asked.own}
          hint={signed ? "to both sides; counts instead" : "counts instead"}
          error={faults.own}
          autoComplete="off"
        />
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
        <button type="submit" className="btn btn-primary mt-5">
          {loading ? "Working it out…" : "Draw"}
        </button>
      </div>
    </Form>
  );
}

interface SideProps {
  view: SweepView;
  side: "x" | "y";
  label: string;
}

function SideFields({ view: { asked, faults, inputs, usual }, side, label }: SideProps) {
  const names = SWEEP_FIELDS[side];
  const end = (name: "from" | "to") => (
    <TextField
      name={names[name]}
      label={name}
      className="min-w-0 flex-1 basis-28 tablet:w-36 tablet:flex-none"
      defaultValue={asked[side][name]}
      placeholder={usual[side]?.[name]}
      hint={usual[side] ? `blank: ${usual[side][name]}` : undefined}
      error={faults[side][name]}
      autoComplete="off"
    />
  );
  return (
    <fieldset className="mb-2 flex min-w-0 flex-wrap items-start gap-x-4 gap-y-2">
      <legend className="sr-only">{label}</legend>
      <SelectField
        name={names.input}
        label={label}
        className="min-w-0 flex-1 basis-72"
        defaultValue={asked[side].input}
        blank={side === "y" ? "Nothing: a curve" : undefined}
        options={inputs}
        error={faults[side].input}
      />
      {end("from")}
      {end("to")}
    </fieldset>
  );
}
