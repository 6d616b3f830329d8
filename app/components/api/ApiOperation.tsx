import type { ApiField, ApiOperationView } from "#app/schemas/api-reference.ts";

/** One operation: what it is asked and what it answers. */
export function ApiOperation(operation: ApiOperationView) {
  const { id, method, path, summary, scope, query, body, bodyType, answer, status, statuses } = operation;
  return (
    <section aria-labelledby={id} className="frame mt-3">
      <div className="px-4 py-3">
        <h3 id={id} className="font-semibold wrap-anywhere">
          <code>
            {method} {path}
          </code>
        </h3>
        <p>{summary}.</p>
        <p className="text-label text-quiet">
          Needs <code>{scope}</code>. Answers {statuses.join(", ")}.
        </p>
      </div>
      {query.length > 0 && <Fields title="Query and headers" of={id} fields={query} />}
      {body.length > 0 && <Fields title={`Body, ${bodyType ?? ""}`} of={id} fields={body} />}
      <Fields title={`Answer, ${status}`} of={id} fields={answer} />
    </section>
  );
}

function Fields({ title, of, fields }: { title: string; of: string; fields: ApiField[] }) {
  return (
    <details className="border-t border-line">
      <summary className="min-h-8 cursor-pointer px-4 py-2">{title}</summary>
      <div className="overflow-x-auto px-4 pb-3" tabIndex={0} role="region" aria-label={`${title} of ${of}`}>
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Field</th>
              <th scope="col">Type</th>
              <th scope="col">What it is</th>
            </tr>
          </thead>
          <tbody>
            {fields.map(({ name, type, required, about }) => (
              <tr key={name}>
                <th scope="row" className="font-normal">
                  <code>{name}</code>
                </th>
                <td>
                  {type}
                  {!required && <span className="text-quiet">, may be left out</span>}
                </td>
                <td>{about}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
