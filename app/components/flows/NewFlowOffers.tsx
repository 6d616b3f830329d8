import { Form, Link } from "react-router";
import { SelectField } from "#app/components/ui/SelectField.tsx";

interface Named {
  id: string;
  name: string;
}

/** What a new flow can start from instead of nothing: a template, a flow that is there, a stack. */
export function NewFlowOffers({ templates, flows }: { templates: Named[]; flows: Named[] }) {
  return (
    <aside className="frame self-start p-4 tablet:p-6" aria-labelledby="offers-head">
      <h2 id="offers-head" className="font-semibold">
        Or start from
      </h2>
      {templates.length > 0 && (
        <>
          <h3 className="mt-3 text-label text-quiet">a template of the site</h3>
          <ul>
            {templates.slice(0, 8).map(({ id, name }) => (
              <li key={id} className="py-1">
                <Link to={`/flows/new?template=${id}`} className="link">
                  {name}
                </Link>
              </li>
            ))}
          </ul>
          <Link to="/flows/library/flows" className="link text-label">
            All templates
          </Link>
        </>
      )}
      {flows.length > 0 && (
        <Form method="get" className="mt-3 border-t border-line pt-3">
          <SelectField
            name="flow"
            label="a copy of a flow"
            options={flows.map(({ id, name }) => ({ value: id, label: name }))}
          />
          <button type="submit" className="btn mt-2">
            Start from this flow
          </button>
        </Form>
      )}
      <p className="mt-3 border-t border-line pt-3">
        <Link to="/stacks" className="link">
          A stack
        </Link>
        <span className="text-quiet">: open it there and make a flow of it</span>
      </p>
    </aside>
  );
}
