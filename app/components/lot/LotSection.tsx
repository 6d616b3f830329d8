import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { micrometres } from "#app/lib/assessment-figure.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { bowText } from "#app/lib/lot-words.ts";
import type { LotRecord } from "#app/schemas/lot.ts";
import { LotSpread } from "./LotSpread.tsx";

/** Which lot an assessment is of, what it came in with, and that it is no revision of its flow. */
export function LotSection({ lot }: { lot: LotRecord }) {
  const { name, of, bow, thickness, wafers } = lot;
  const came = `Came in with ${wafers.length > 0 ? `a mean bow of ${bowText(bow)} over ${wafers.length} wafers` : `a bow of ${bowText(bow)}`}${thickness === null ? "" : `, ${micrometres(thickness)} thick`}.`;
  return (
    <>
      <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="lot">
        <h2 id="lot" className="font-semibold">
          Of lot {name} alone, and no revision of the flow
        </h2>
        <p className="mt-1 max-w-[60em]">
          {noBreak(came)} Everything else is as in{" "}
          <Link to={`/assessments/${of.id}`} className="link">
            assessment {revisionLetters(of.number)}
          </Link>
          .
        </p>
      </section>
      <LotSpread lot={lot} folded />
    </>
  );
}
