import { Link, useSearchParams } from "react-router";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { DataTable } from "#app/components/ui/DataTable.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import type { HistoryAnswer } from "#app/lib/history-answer.ts";
import { withParams } from "#app/lib/list-params.ts";
import { UNNAMED } from "#app/lib/stress-values.ts";
import type { FilmStressHistory } from "#app/schemas/film-stress.ts";
import { StressCharts } from "./StressCharts.tsx";
import { StressInUse } from "./StressInUse.tsx";
import { StressMeanLine } from "./StressMeanLine.tsx";
import { stressColumns } from "./stress-columns.tsx";
import { TypedValueForm } from "./TypedValueForm.tsx";

interface Props {
  history: FilmStressHistory;
  answer: HistoryAnswer | null;
}

const STATES = [
  { value: "accepted", label: "Counts" },
  { value: "set aside", label: "Set aside" },
];

/** What was measured of a film's stress: its mean, charts of drift, every value, and every stress that was in use. */
export function StressHistory({ history, answer }: Props) {
  const { all, mayEdit } = history;
  return (
    <section aria-labelledby="history" className="mt-8">
      <h2 id="history" className="scroll-mt-4 text-lead font-semibold">
        Stress history
      </h2>
      {answer?.refused && <Notice kind="error" title={answer.refused} />}
      {all === 0 ? (
        <p className="mt-1 mb-4 max-w-[60em] text-quiet">
          {`No measured stress has been accepted yet. ${mayEdit ? "Open a scan of this film and accept it" : "An engineer or process owner accepts a scan of this film"}: its stress then stands here, with drift and limits, and the mean of the accepted values can be put into use.`}{" "}
          <Link to="/scans" className="link">
            To the scans
          </Link>
        </p>
      ) : (
        <div className="frame mt-3">
          <StressMeanLine history={history} />
          {history.chart && <Instruments instruments={history.instruments} chosen={history.chart.instrument} />}
          {history.chart && <StressCharts chart={history.chart} />}
        </div>
      )}
      {all > 0 && <Values history={history} />}
      <StressInUse rows={history.inUse} />
      {mayEdit && <TypedValueForm version={history.film.version} lastResult={answer?.lastResult ?? null} />}
    </section>
  );
}

/** Values of different instruments are not drawn as one process: a change of tool would look like a change of the film. */
function Instruments({ instruments, chosen }: { instruments: string[]; chosen: string }) {
  const [search] = useSearchParams();
  if (instruments.length < 2) return null;
  return (
    <nav
      aria-label="Instrument"
      className="screen-only flex flex-wrap gap-x-4 gap-y-1 border-t border-line p-4 tablet:px-6"
    >
      <span className="text-quiet">Chart of</span>
      {instruments.map((name) => (
        <Link
          key={name}
          to={withParams(search, { instrument: name || UNNAMED })}
          preventScrollReset
          aria-current={name === chosen ? "true" : undefined}
          className={name === chosen ? "font-semibold" : "link"}
        >
          {name || UNNAMED}
        </Link>
      ))}
    </nav>
  );
}

function Values({ history: { page, film, mayEdit } }: { history: FilmStressHistory }) {
  const [search] = useSearchParams();
  const searched = page.params.query !== "" || Boolean(page.params.filters["state"]);
  return (
    <section aria-labelledby="values" className="mt-6">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-4">
        <h3 id="values" className="font-semibold">
          Values
        </h3>
        <a href={`/films/${film.id}/stress.csv?${search.toString()}`} className="link screen-only" download>
          Download as CSV
        </a>
      </div>
      <ListHead what="instruments, wafers and reasons" filters={[{ name: "state", label: "State", options: STATES }]} />
      {page.rows.length > 0 ? (
        <DataTable
          caption="Values of the stress history"
          columns={stressColumns(mayEdit ? film.version : null)}
          page={page}
          rowKey={({ id }) => id}
        />
      ) : (
        <p className="mb-4 text-quiet">
          {searched ? "No value fits. Change the search, or take the filter away." : "No value on this page."}
        </p>
      )}
    </section>
  );
}
