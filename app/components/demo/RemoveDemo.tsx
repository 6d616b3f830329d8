import { Form, Link } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { count } from "#app/lib/count-words.ts";
import { CONFIRM_WORD, type DemoHere } from "#app/schemas/demo.ts";

export interface TypedDemo {
  name: string;
  diameter: string;
}

interface Props {
  view: DemoHere;
  /** what the last try was refused for */
  field: "confirm" | "name" | undefined;
  typed: TypedDemo | undefined;
}

const DIAMETERS = ["150", "200", "300"].map((value) => ({ value, label: `${value} mm` }));

/** The removal itself: who would be left without a program gets one, and a word is typed. */
export function RemoveDemo({ view: { stranded, jobs, seen }, field, typed }: Props) {
  return (
    <section aria-labelledby="remove-demo" className="frame h-fit p-4">
      <h2 id="remove-demo" className="font-semibold">
        Remove the demo
      </h2>
      {jobs > 0 ? (
        <p className="mt-2">
          {jobs === 1 ? "A job of the demo is" : `${count(jobs)} jobs of the demo are`} under way. Wait until{" "}
          {jobs === 1 ? "it has" : "they have"} ended, or stop {jobs === 1 ? "it" : "them"} under{" "}
          <Link to="/jobs?state=running" className="link">
            Work under way
          </Link>
          ; then open this page again.
        </p>
      ) : (
        <Form method="post" className="mt-2 space-y-4">
          <input type="hidden" name="intent" value="remove" />
          <input type="hidden" name="seen" value={seen} />
          {stranded.length > 0 && <FirstProgram stranded={stranded} field={field} typed={typed} />}
          <TextField
            name="confirm"
            label={`Type the word ${CONFIRM_WORD}`}
            hint="Removing cannot be undone. The demo can be loaded again, as it came."
            error={field === "confirm" ? `Type ${CONFIRM_WORD} to go on.` : undefined}
            autoComplete="off"
            autoCapitalize="off"
            maxLength={40}
            required
          />
          <div className="flex flex-wrap gap-2">
            <button type="submit" className="btn btn-remove">
              Remove the demo
            </button>
            <Link to="/" className="btn">
              Keep it
            </Link>
          </div>
        </Form>
      )}
    </section>
  );
}

function FirstProgram({ stranded, field, typed }: Pick<Props, "field" | "typed"> & Pick<DemoHere, "stranded">) {
  const who = stranded.map(({ name, role }) => `${name} (${role})`).join(", ");
  return (
    <fieldset className="space-y-3">
      <legend className="font-semibold">Nobody is locked out</legend>
      <p className="text-quiet">
        {stranded.length === 1 ? "One account belongs" : `${stranded.length} accounts belong`} to programs of the demo
        only. They keep their roles in a new, empty program: {who}.
      </p>
      <TextField
        name="name"
        label="Name of the new program"
        defaultValue={typed?.name ?? "First program"}
        error={field === "name" ? "Give it a name that no other program has." : undefined}
        maxLength={80}
        required
      />
      <SelectField name="diameter" label="Its wafers" options={DIAMETERS} defaultValue={typed?.diameter ?? "300"} />
    </fieldset>
  );
}
