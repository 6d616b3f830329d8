import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { bowText } from "#app/lib/lot-words.ts";
import type { FlowLotRow } from "#app/schemas/lot.ts";

/** Lots of this flow that were assessed with their own figures; none of them is a revision. Nothing without any. */
export function FlowLots({ lots }: { lots: FlowLotRow[] }) {
  if (lots.length === 0) return null;
  return (
    <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="lots-head">
      <h2 id="lots-head" className="font-semibold">
        Lots with their own figures
      </h2>
      <ul className="mt-1 max-h-44 overflow-y-auto" tabIndex={0} aria-labelledby="lots-head">
        {lots.map(({ id, name, number, bow, wafers, missed, outcome, createdAt, createdBy }) => (
          <li key={id} className="flex flex-wrap items-center gap-x-4 border-t border-line py-2 first:border-0">
            <Link to={`/assessments/${id}`} className="link">
              Lot {name}
            </Link>
            <FindingTag outcome={outcome} />
            <span>
              {wafers > 0 ? `${missed} of ${wafers} wafers ${missed === 1 ? "misses" : "miss"} a limit` : "mean only"}
            </span>
            <span className="text-label text-quiet">
              bow in {bowText(bow)}, on assessment {revisionLetters(number)}, {createdAt.slice(0, 10)}, {createdBy}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
