import type { SubmissionResult } from "@conform-to/react";
import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { count } from "#app/lib/count-words.ts";
import { expandedStress, libraryStress, meanSentence, toleranceWords } from "#app/lib/stress-words.ts";
import { sentenceCase } from "#app/lib/assessment-steps.ts";
import type { Acceptance } from "#app/schemas/accept-scan.ts";
import { AcceptForm } from "./AcceptForm.tsx";

interface Props {
  acceptance: Acceptance;
  lastResult: SubmissionResult<string[]> | null | undefined;
}

/** Taking a scan into its film's history: what is taken, what becomes of the value in use, and why. */
export function AcceptPage({ acceptance, lastResult }: Props) {
  const { scan, film, refused, offer, measuredOn, instrument } = acceptance;
  return (
    <>
      <PageHead
        title={film ? `Into the history of ${film.name}` : "Into a film’s history"}
        crumbs={[
          { name: "Scans", path: "/scans" },
          { name: scan.label, path: `/scans/${scan.id}` },
        ]}
        remark={scan.program}
      />
      {refused !== null && (
        <Notice kind="caution" title={refused}>
          <Link to={`/scans/${scan.id}`} className="link">
            Back to the scan
          </Link>
          {film && (
            <>
              {" · "}
              <Link to={`/films/${film.id}#history`} className="link">
                The film’s history
              </Link>
            </>
          )}
        </Notice>
      )}
      {film && offer && (
        <article className="frame max-w-260">
          <div className="p-4 tablet:p-6">
            <p className="max-w-[40em] text-figure font-medium text-pretty">
              {noBreak(
                `${film.name}: ${expandedStress(offer.stress.value, offer.stress.standardUncertainty)}, k = 2, goes into its history.`,
              )}
            </p>
            {offer.stress.remark && <p className="mt-1 max-w-[60em]">{noBreak(offer.stress.remark)}</p>}
          </div>
          <BeforeAndAfter acceptance={acceptance} film={film} offer={offer} />
          <AcceptForm
            scan={scan}
            film={film}
            instruments={offer.instruments}
            measuredOn={measuredOn}
            instrument={instrument}
            lastResult={lastResult}
          />
        </article>
      )}
    </>
  );
}

interface Offered {
  acceptance: Acceptance;
  film: NonNullable<Acceptance["film"]>;
  offer: NonNullable<Acceptance["offer"]>;
}

function BeforeAndAfter({ acceptance: { flows }, film, offer: { mean } }: Offered) {
  const rows = [
    {
      name: "In use now",
      value: formatMeasured(film.stress, "stress", { unit: "MPa", sign: true }),
      from: [film.stress.source, film.stress.note].filter(Boolean).join(", "),
    },
    {
      name: film.usesMean ? "In use after it" : "Mean after it",
      value: libraryStress(mean.stress),
      from: `${mean.stress.note ?? ""}. ${meanSentence(mean)}`,
    },
  ];
  return (
    <section className="border-t border-line p-4 tablet:px-6" aria-labelledby="becomes">
      <h2 id="becomes" className="font-semibold">
        What becomes of the value in use
      </h2>
      <dl className="mt-1">
        {rows.map(({ name, value, from }) => (
          <div
            key={name}
            className="grid grid-cols-[7rem_minmax(0,1fr)] gap-x-3 border-t border-line py-2 first:border-0 tablet:grid-cols-[9rem_9rem_minmax(0,1fr)]"
          >
            <dt className="text-quiet">{name}</dt>
            <dd className="font-medium whitespace-nowrap">{value}</dd>
            <dd className="text-quiet max-tablet:col-span-2">{noBreak(from)}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-1 max-w-[60em] text-label text-quiet">{noBreak(toleranceWords(mean))}</p>
      <p className="mt-2 max-w-[60em]">{consequence(film, flows)}</p>
    </section>
  );
}

function consequence({ usesMean }: { usesMean: boolean }, flows: number): string {
  const used =
    flows === 0
      ? "No flow of your programs uses the film."
      : `${sentenceCase(count(flows))} ${flows === 1 ? "flow" : "flows"} of your programs ${flows === 1 ? "uses" : "use"} the film: assessments say that they are out of date, and by how much they move.`;
  return usesMean
    ? `The film uses the mean of its accepted values, so its value in use follows at once. ${used}`
    : `The value in use stays, unless you tick the box below. With the mean in use: ${used.charAt(0).toLowerCase()}${used.slice(1)}`;
}
