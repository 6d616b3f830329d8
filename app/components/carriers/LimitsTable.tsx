import { Link } from "react-router";
import { limitText } from "#app/lib/limit-quantity.ts";
import { isChanged, type LimitGroup } from "#app/lib/limit-rows.ts";

interface Props {
  group: LimitGroup;
  mayEdit: boolean;
}

export const groupTitle = ({ rule, title }: LimitGroup) =>
  title ? `Rule ${rule}: ${title.toLowerCase()}` : `Rule ${rule}`;

/** The limits of one rule as they stand, beside what was delivered where the site has set its own. */
export function LimitsTable({ group, mayEdit }: Props) {
  const { rule, title, limits } = group;
  const name = groupTitle(group);
  return (
    <>
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 px-4 pt-4 tablet:px-6">
        <h2 id={`rule-${rule}`} className="text-lead font-semibold">
          {name}
        </h2>
        {title === null && <p className="text-quiet">This version does not judge by it yet.</p>}
        {mayEdit && (
          <Link
            to={`?rule=${rule}#rule-${rule}`}
            className="link ml-auto"
            aria-label={`Change the limits of rule ${rule}`}
          >
            Change
          </Link>
        )}
      </div>
      <div
        className="overflow-x-auto px-2 pb-2 tablet:px-4"
        tabIndex={0}
        role="region"
        aria-labelledby={`rule-${rule}`}
      >
        <table className="table tablet:table-fixed">
          <caption className="sr-only">Limits of rule {rule}</caption>
          <thead>
            <tr>
              <th scope="col" className="tablet:w-2/5">
                Limit
              </th>
              <th scope="col" className="num tablet:w-36">
                Value
              </th>
              <th scope="col" className="max-tablet:hidden">
                Source
              </th>
              <th scope="col" className="w-56 max-tablet:hidden">
                Last changed
              </th>
            </tr>
          </thead>
          <tbody>
            {limits.map((limit) => (
              <tr key={limit.key}>
                <th scope="row" className="font-normal">
                  {limit.title}
                  <span className="block text-label text-quiet tablet:hidden">{limit.source}</span>
                </th>
                <td className="num font-medium">
                  {limitText(limit.value, limit)}
                  {isChanged(limit) && (
                    <span className="block text-label font-normal text-quiet">
                      delivered {limitText(limit.delivered.value, limit)}
                    </span>
                  )}
                </td>
                <td className="max-tablet:hidden">{limit.source}</td>
                <td className="text-quiet max-tablet:hidden">
                  {limit.updatedAt ? `${limit.updatedAt.slice(0, 10)}, ${limit.updatedBy}` : "as delivered"}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}
