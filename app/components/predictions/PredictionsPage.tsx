import { Link, useSearchParams } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { withParams } from "#app/lib/list-params.ts";
import { predictionSentences } from "#app/lib/prediction-words.ts";
import type { Predictions } from "#app/schemas/prediction.ts";
import { ParityFigure } from "./ParityFigure.tsx";
import { ParityGroups } from "./ParityGroups.tsx";
import { predictionColumns } from "./prediction-columns.tsx";

/** Predicted against measured: the answer, the parity plot, where the model is off, and every point. */
export function PredictionsPage({ predictions }: { predictions: Predictions }) {
  const { of, all, filters, points } = predictions;
  const [search] = useSearchParams();
  return (
    <>
      <PageHead
        title="Predicted against measured"
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={points.length === 1 ? "1 point" : `${points.length} points`}
        actions={
          points.length > 0 && (
            <a href={`/predictions/points.csv?${search.toString()}`} className="btn" download>
              Download as CSV
            </a>
          )
        }
      />
      <Kinds predictions={predictions} />
      <ListHead
        what={of === "bow" ? "lots, wafers and steps" : "wafers and films"}
        filters={[
          { name: "program", label: "Program", options: filters.programs },
          { name: "film", label: "Film", options: filters.films },
          { name: "flow", label: "Flow", options: filters.flows },
        ]}
      >
        <input type="hidden" name="of" value={of} />
      </ListHead>
      {all ? <Compared predictions={predictions} all={all} /> : <Nothing predictions={predictions} />}
    </>
  );
}

function Kinds({ predictions: { of, counts } }: { predictions: Predictions }) {
  const [search] = useSearchParams();
  const kinds = [
    { kind: "bow", label: "Bow after a step" },
    { kind: "stress", label: "Stress of a film" },
  ] as const;
  return (
    <nav aria-label="What is compared" className="screen-only mb-4 flex flex-wrap gap-x-6 gap-y-1">
      {kinds.map(({ kind, label }) => (
        <Link
          key={kind}
          to={withParams(search, { of: kind, page: null, sort: null })}
          aria-current={kind === of ? "page" : undefined}
          className={kind === of ? "font-semibold" : "link"}
        >
          {label} ({counts[kind]})
        </Link>
      ))}
    </nav>
  );
}

function Compared({ predictions, all }: { predictions: Predictions; all: NonNullable<Predictions["all"]> }) {
  const { of, points, groups, flows, page, working } = predictions;
  const [first, ...more] = predictionSentences(of, all, groups);
  const off = new Set(groups.filter(({ isOff }) => isOff).map(({ step }) => step));
  return (
    <>
      <article className="frame">
        <div className="p-4 tablet:p-6">
          <p className="max-w-[44em] text-figure font-medium text-pretty">{noBreak(first ?? "")}</p>
          <p className="mt-1 max-w-[60em]">{noBreak(more.join(" "))}</p>
          <p className="mt-1 max-w-[60em] text-quiet">{RESTS_ON[of]}</p>
        </div>
        <div className="grid border-t border-line wide:grid-cols-[minmax(0,2fr)_minmax(0,3fr)]">
          <section className="min-w-0 p-4 tablet:p-6" aria-label="Parity plot">
            <ParityFigure key={of} of={of} points={points} off={off} />
          </section>
          <section
            className="min-w-0 border-line p-4 max-wide:border-t tablet:p-6 wide:border-l"
            aria-labelledby="where"
          >
            <h2 id="where" className="mb-1 font-semibold">
              {of === "bow" ? "Step by step" : "Film by film"}
            </h2>
            <ParityGroups of={of} what={of === "bow" ? "Step" : "Film"} groups={groups} />
            {flows.length > 0 && (
              <>
                <h2 className="mt-4 mb-1 font-semibold">Flow by flow</h2>
                <ParityGroups of={of} what="Flow" groups={flows} />
              </>
            )}
            {working && (
              <details className="screen-only mt-3">
                <summary className="link w-fit cursor-pointer">Working over all points</summary>
                <div className="mt-2">
                  <WorkingView working={working} level={3} />
                </div>
              </details>
            )}
          </section>
        </div>
      </article>
      <h2 className="mt-6 mb-2 text-lead font-semibold">Points</h2>
      {page.rows.length > 0 ? (
        <DataTable caption="Points" columns={predictionColumns(of)} page={page} rowKey={({ id }) => id} />
      ) : (
        <p className="text-quiet">No point fits the search. The plot above has all that the filters leave.</p>
      )}
    </>
  );
}

const RESTS_ON = {
  bow: "Predicted: what the assessment says of the step at 25\u00A0°C, with the tolerances of its inputs. Measured: bows recorded after a step, and bows that lots came in with; where nobody stated an uncertainty a half-width of 2\u00A0µm is taken. What is held against one assessment shares its error, so more wafers do not make the bias better known than that.",
  stress:
    "Predicted: the stress that the film had in use when the wafer was measured, with its tolerance. Measured: the stress of the scan. What a film’s history has set aside is left out.",
} as const;

function Nothing({ predictions: { of, page } }: { predictions: Predictions }) {
  const filtered = Object.values(page.params.filters).some(Boolean);
  if (filtered)
    return (
      <EmptyState title="Nothing is compared here">Take a filter away, or look at the other kind above.</EmptyState>
    );
  return (
    <EmptyState
      title={of === "bow" ? "No measured bow yet" : "No scan of a film yet"}
      actions={
        <Link to={of === "bow" ? "/flows" : "/scans"} className="btn">
          {of === "bow" ? "To the flows" : "To the scans"}
        </Link>
      }
    >
      {of === "bow"
        ? "Open an assessment of a flow and choose ‘Measured after a step’: bows of a lot stand here beside what was predicted."
        : "Scans that name a film of the library stand here beside the stress that the film had in use then."}
    </EmptyState>
  );
}
