import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import type { LegsView } from "#app/lib/assessment-leg.ts";

/** The legs of a flow that parts by slot, each with its verdict; what the page shows is of the one that is marked. */
export function LegList({ legs: { chosen, rows } }: { legs: LegsView }) {
  return (
    <nav className="border-t border-ink p-4 tablet:px-6" aria-label="Legs">
      <p>
        This flow parts by slot into {rows.length} legs. What follows is of <strong>{chosen.slots}</strong>.
      </p>
      <ul className="mt-2 divide-y divide-line border-y border-line">
        {rows.map(({ number, name, outcome, where }) => (
          <li key={number} className="grid gap-x-4 py-1.5 tablet:grid-cols-[200px_minmax(0,1fr)]">
            <Link
              to={`?leg=${number}`}
              className={`link ${number === chosen.number ? "font-semibold" : ""}`}
              aria-current={number === chosen.number ? "true" : undefined}
              preventScrollReset
            >
              {name}
            </Link>
            <FindingTag outcome={outcome}>{where}</FindingTag>
          </li>
        ))}
      </ul>
    </nav>
  );
}
