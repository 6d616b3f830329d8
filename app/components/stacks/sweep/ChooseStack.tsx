import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { SelectField } from "#app/components/ui/SelectField.tsx";
import type { ComparisonChoice } from "#app/schemas/comparison.ts";

/** Which stack is to be swept: for who comes from the search, and not from a stack. */
export function ChooseStack({ stacks }: { stacks: readonly ComparisonChoice[] }) {
  return (
    <>
      <PageHead title="Sweep a stack" crumbs={[{ name: "Stacks", path: "/stacks" }]} />
      {stacks.length === 0 ? (
        <EmptyState
          title="There is no stack to sweep yet"
          actions={
            <Link to="/stacks" className="btn">
              Go to the stacks
            </Link>
          }
        >
          A sweep moves one or two inputs of a stack over a range. Build a stack first.
        </EmptyState>
      ) : (
        <Form method="get" aria-label="Which stack" className="flex max-w-160 flex-wrap items-start gap-x-4">
          <SelectField
            name="of"
            label="Stack"
            className="min-w-0 flex-1 basis-72"
            options={stacks.map(({ id, name, program }) => ({ value: id, label: `${name}, ${program}` }))}
            hint="Newest first"
          />
          <button type="submit" className="btn btn-primary mt-5">
            Sweep it
          </button>
        </Form>
      )}
    </>
  );
}
