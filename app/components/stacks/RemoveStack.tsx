import { Form } from "react-router";

/** Removing asks once more, without scripts too. */
export function RemoveStack({ name }: { name: string }) {
  return (
    <details className="mt-4">
      <summary className="link w-fit cursor-pointer text-stop">Remove this stack</summary>
      <Form method="post" className="mt-2 flex flex-wrap items-center gap-4">
        <p>{name} goes for good. Flows and assessments do not depend on it and stay.</p>
        <button type="submit" name="intent" value="remove" className="btn btn-remove">
          Remove for good
        </button>
      </Form>
    </details>
  );
}
