import { Form, useNavigation, useSearchParams } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { FinderPageData } from "#app/schemas/finder.ts";

/** Search, filter and target of the finder; all of it stands in the address. */
export function FinderForm({ found: { head, bonds, steps, asked } }: { found: FinderPageData }) {
  const [search] = useSearchParams();
  const trying = useNavigation().state === "loading";
  const { faults } = asked;
  return (
    <Form
      method="get"
      role="search"
      className="screen-only mb-4 flex flex-wrap items-start gap-x-3 gap-y-2"
      key={search.toString()}
    >
      <TextField
        type="search"
        name="q"
        label="Search carriers and bonds"
        defaultValue={search.get("q") ?? ""}
        className="w-64"
      />
      <SelectField
        name="fits"
        label="Fits"
        blank="Any"
        options={[
          { value: "yes", label: "Fits" },
          { value: "no", label: "Does not fit" },
        ]}
        defaultValue={search.get("fits") ?? ""}
      />
      {bonds.length > 1 ? (
        <SelectField
          name="bond"
          label="In the place of"
          options={bonds.map(({ index, label }) => ({ value: String(index), label }))}
          defaultValue={String(asked.bond)}
          className="max-w-80 min-w-0"
        />
      ) : null}
      <TextField
        name="warp"
        label="Target warp at most"
        defaultValue={asked.targetWarp}
        error={faults.targetWarp}
        hint="at 25&nbsp;°C, such as 150&nbsp;µm"
        className="w-44"
      />
      <SelectField
        name="step"
        label="After step"
        blank="No target"
        options={steps.map(({ number, title }) => ({ value: String(number), label: `${number}, ${title}` }))}
        defaultValue={asked.targetStep}
        error={faults.targetStep}
        className="w-72 max-w-full min-w-0"
      />
      {search.get("sort") ? <input type="hidden" name="sort" value={search.get("sort") ?? ""} /> : null}
      {head.leg ? <input type="hidden" name="leg" value={head.leg.number} /> : null}
      <button type="submit" className="btn mt-5">
        {trying ? "Trying" : "Show"}
      </button>
    </Form>
  );
}
