import { useId } from "react";
import { Form, Link, useNavigation } from "react-router";
import { SelectField, type Option } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import type { ChangeFormView } from "#app/lib/change-request-form.ts";

/** The question: first what changes, then which property of it and to what. It stands in the address, so it can be sent on. */
export function ChangeRequestForm({ form, programs }: { form: ChangeFormView; programs: readonly Option[] }) {
  const loading = useNavigation().state === "loading";
  return (
    <div className="screen-only mb-4 max-w-280 space-y-3" key={JSON.stringify(form.fields)}>
      {form.subject ? (
        <Asked form={form} programs={programs} loading={loading} />
      ) : (
        <SubjectChoice form={form} loading={loading} />
      )}
    </div>
  );
}

function SubjectChoice({ form, loading }: { form: ChangeFormView; loading: boolean }) {
  const id = useId();
  const { of: error } = form.errors;
  return (
    <Form method="get" className="flex flex-wrap items-start gap-3">
      <div className="field w-full max-w-120 min-w-0">
        <label htmlFor={id}>What changes</label>
        <select
          id={id}
          name="of"
          required
          defaultValue=""
          aria-invalid={error ? true : undefined}
          aria-describedby={`${id}-note`}
        >
          <option value="">Choose</option>
          {form.groups.map(({ label, options }) => (
            <optgroup key={label} label={label}>
              {options.map((option) => (
                <option key={option.value} value={option.value}>
                  {option.label}
                </option>
              ))}
            </optgroup>
          ))}
        </select>
        <small id={`${id}-note`}>{error ?? "A film, a kind of step, a carrier, a tool, a limit"}</small>
      </div>
      <button type="submit" className="btn btn-primary mt-5">
        {loading ? "Opening…" : "Go on"}
      </button>
    </Form>
  );
}

function Asked({ form, programs, loading }: { form: ChangeFormView; programs: readonly Option[]; loading: boolean }) {
  const { fields, subject, properties, unit, errors } = form;
  return (
    <>
      <p>
        What changes: <strong className="first-letter:uppercase">{subject?.name}</strong>{" "}
        <Link to="/assessments/change-request" className="link ml-2">
          Something else
        </Link>
      </p>
      <Form method="get" className="flex flex-wrap items-start gap-x-3 gap-y-2" aria-label="The change">
        <input type="hidden" name="of" value={fields.of} />
        {properties.length > 1 ? (
          <SelectField
            name="property"
            label="Property"
            options={properties}
            blank="Choose"
            defaultValue={fields.property}
            error={errors.property}
            className="w-80"
          />
        ) : null}
        {subject?.kind === "step" ? (
          <TextField
            name="title"
            label="Only steps whose name contains"
            defaultValue={fields.title}
            hint="Blank: all of them"
            className="w-60"
          />
        ) : null}
        <TextField
          name="value"
          label={properties.length === 1 ? `${properties[0]?.label ?? ""}, new value` : "New value"}
          defaultValue={fields.value}
          error={errors.value}
          hint={unit ? `With its unit, in ${unit} or another` : "A number"}
          autoComplete="off"
          spellCheck={false}
          className="w-64"
        />
        {programs.length > 1 ? (
          <SelectField
            name="program"
            label="Program"
            options={programs}
            blank="All of mine"
            defaultValue={fields.program}
            className="w-40"
          />
        ) : null}
        <button type="submit" className="btn btn-primary mt-5">
          {loading ? "Computing…" : "What would change?"}
        </button>
      </Form>
    </>
  );
}
