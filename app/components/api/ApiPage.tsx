import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import type { ApiReference } from "#app/schemas/api-reference.ts";
import { ApiManner } from "./ApiManner.tsx";
import { ApiOperation } from "./ApiOperation.tsx";

/** What the API takes and gives, for whoever writes a program against it. */
export function ApiPage({ groups }: ApiReference) {
  return (
    <>
      <PageHead title="API" remark="version 1" />
      <p className="max-w-160 pb-4">
        Scripts, instruments and other systems of the site ask here, with a <Link to="/tokens">token</Link>. The same is
        to be had as <a href="/api/v1/openapi.json">OpenAPI 3.1</a>, for programs that make programs. What happens is
        told by <Link to="/webhooks">webhooks</Link>. What is answered supports the site’s own procedures and does not
        take their place.
      </p>
      <nav aria-label="Operations" className="screen-only flex flex-wrap gap-x-4 gap-y-1 pb-4">
        <a href="#manner">How it is asked</a>
        {groups.map(({ name }) => (
          <a key={name} href={`#${anchorOf(name)}`}>
            {name}
          </a>
        ))}
      </nav>
      <ApiManner />
      {groups.map(({ name, operations }) => (
        <section key={name} aria-labelledby={anchorOf(name)} className="pt-6">
          <h2 id={anchorOf(name)} className="text-figure font-medium">
            {name}
          </h2>
          {operations.map((operation) => (
            <ApiOperation key={operation.id} {...operation} />
          ))}
        </section>
      ))}
    </>
  );
}

const anchorOf = (name: string) => name.toLowerCase().replaceAll(" ", "-");
