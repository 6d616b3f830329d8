import { Form } from "react-router";
import { SubmitButton } from "#app/components/forms/SubmitButton.tsx";

/** One press for an invented pilot line to look around in; what it brings and who will see it stands beside the button. */
export function LoadDemo({ primary = false }: { primary?: boolean }) {
  return (
    <section className="empty" aria-labelledby="load-demo">
      <h2 id="load-demo" className="font-semibold">
        See it with an example first
      </h2>
      <p className="mt-1 text-quiet">
        The demo is an invented pilot line: three programs with their films, stacks, flows and scans, and an assessment.
        Everybody here who is more than a guest sees it with the role that they have. People of the demo who have no
        account here are names only: nobody can sign in as one of them. It is removed as easily as it comes, and leaves
        what you make yourselves alone.
      </p>
      <Form method="post" action="/demo" className="mt-4">
        <input type="hidden" name="intent" value="load" />
        {primary ? (
          <SubmitButton busy="Loading">Load the demo</SubmitButton>
        ) : (
          <button type="submit" className="btn">
            Load the demo
          </button>
        )}
      </Form>
    </section>
  );
}
