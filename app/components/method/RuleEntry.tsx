import type { RuleText } from "#app/schemas/rule-text.ts";

/** One handling rule: what it asks and, for the staff, the limits that it holds things against. */
export function RuleEntry({ rule }: { rule: RuleText }) {
  const anchor = `rule-${rule.number}`;
  return (
    <article aria-labelledby={anchor} className="border-t border-line py-4 first:border-0 first:pt-0">
      <h3 id={anchor} className="scroll-mt-4 font-semibold">
        {rule.number}. {rule.title}
      </h3>
      <p className="mt-1">{rule.asks}</p>
      {rule.limits && rule.limits.length > 0 && (
        <div
          className="mt-2 overflow-x-auto"
          tabIndex={0}
          role="region"
          aria-label={`Limits of rule ${rule.number}, ${rule.title}`}
        >
          <table className="table">
            <caption className="sr-only">Limits of rule {rule.number}</caption>
            <thead>
              <tr>
                <th scope="col">Limit</th>
                <th scope="col" className="num">
                  Value here
                </th>
                <th scope="col">Source</th>
              </tr>
            </thead>
            <tbody>
              {rule.limits.map(({ title, value, delivered, source }) => (
                <tr key={title}>
                  <th scope="row" className="font-normal">
                    {title}
                  </th>
                  <td className="num">
                    {value}
                    {delivered && <span className="block text-label text-quiet">delivered {delivered}</span>}
                  </td>
                  <td className="text-quiet">{source}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </article>
  );
}
