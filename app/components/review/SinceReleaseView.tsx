import { ChangeTable } from "#app/components/assessments/ChangeTable.tsx";
import { ComparisonTable } from "#app/components/assessments/ComparisonTable.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { SinceRelease } from "#app/lib/since-release.ts";

/** What is different from the last released revision: inputs, answer, steps. */
export function SinceReleaseView({ since }: { since: SinceRelease | null }) {
  if (since === null) return <p>No revision of this sheet was released before: all of it is new.</p>;
  const { changes, engine, rows, before, after, letter } = since;
  const moved = before.join(" ") !== after.join(" ");
  return (
    <>
      {moved ? (
        <dl className="grid gap-x-6 gap-y-1 tablet:grid-cols-2">
          <div>
            <dt className="text-label text-quiet">{letter}, released</dt>
            <dd>{noBreak(before.join(" "))}</dd>
          </div>
          <div>
            <dt className="text-label text-quiet">This one</dt>
            <dd>{noBreak(after.join(" "))}</dd>
          </div>
        </dl>
      ) : (
        <p>The answer is the same as that of {letter}.</p>
      )}
      {engine && (
        <p className="mt-2">
          The engine is {engine.to}; {letter} was computed with {engine.from}.
        </p>
      )}
      {changes.length > 0 ? (
        <>
          <h3 className="mt-4 font-semibold">Inputs</h3>
          <ChangeTable
            changes={changes}
            caption={`Inputs that differ from ${letter}`}
            heads={{ from: letter, to: "This one" }}
          />
        </>
      ) : (
        <p className="mt-2">No input differs.</p>
      )}
      {rows.length > 0 ? (
        <>
          <h3 className="mt-4 font-semibold">Steps</h3>
          <ComparisonTable rows={rows} before={letter} after="This one" caption={`Steps that differ from ${letter}`} />
        </>
      ) : (
        <p className="mt-2">No finding, support or figure of a step differs.</p>
      )}
    </>
  );
}
