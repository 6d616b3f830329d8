import { Link } from "react-router";
import type { LooseWafers } from "#app/schemas/lot-view.ts";

/** Wafers that belong to no lot, such as monitors. */
export function LooseWaferList({ wafers: { rows, total } }: { wafers: LooseWafers }) {
  if (rows.length === 0) return null;
  return (
    <section className="mt-8" aria-labelledby="loose">
      <h2 id="loose" className="font-semibold">
        Wafers of no lot
      </h2>
      <ul className="mt-2 grid border-t border-ink tablet:grid-cols-2 wide:grid-cols-3">
        {rows.map(({ id, name, program, createdAt }) => (
          <li key={id} className="border-b border-line py-2 wrap-anywhere">
            <Link to={`/wafers/${id}`} className="link">
              {name}
            </Link>{" "}
            <span className="text-quiet">{`${program}, first seen ${createdAt.slice(0, 10)}`}</span>
          </li>
        ))}
      </ul>
      {total > rows.length && (
        <p className="mt-2 text-quiet">{`The newest ${rows.length} of ${total}; search for the others.`}</p>
      )}
    </section>
  );
}
