import { Form, Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ratesSentence } from "#app/lib/rate-words.ts";
import type { IncidentRatesView } from "#app/schemas/incident-rates.ts";
import { BreakageMap } from "./BreakageMap.tsx";
import { LimitTable } from "./LimitTable.tsx";
import { RateTable } from "./RateTable.tsx";

/** How often wafers break, by what steps have in common, each rate with its interval. */
export function IncidentRates({ rates, limits, program, programs }: IncidentRatesView) {
  const { all, byStep, bySupport, byThickness, byFilms, map } = rates;
  return (
    <>
      <PageHead
        title="Rates of breakage"
        crumbs={[{ name: "Incidents", path: "/incidents" }]}
        actions={
          <Link to="/predictions" className="btn">
            Predicted against measured
          </Link>
        }
      />
      {programs.length > 1 && (
        <Form method="get" className="screen-only mb-4 flex flex-wrap items-end gap-3">
          <div className="field">
            <label htmlFor="rates-program">Program</label>
            <select id="rates-program" name="program" defaultValue={program}>
              <option value="">All of yours</option>
              {programs.map(({ value, label }) => (
                <option key={value} value={value}>
                  {label}
                </option>
              ))}
            </select>
          </div>
          <button type="submit" className="btn">
            Show
          </button>
        </Form>
      )}
      <p className="max-w-160 text-lead">{ratesSentence(all)}</p>
      {all.incidents === 0 && all.through === 0 ? (
        <EmptyState
          title="No rate yet"
          actions={
            <Link to="/incidents/new" className="btn">
              Report an incident
            </Link>
          }
        >
          A rate needs both: incidents, and how many wafers went through without one. The floor counts them when a step
          is entered as done.
        </EmptyState>
      ) : (
        <>
          <p className="mt-2 max-w-160 text-quiet">
            In brackets the interval of Clopper and Pearson, 95 %, as if every wafer broke for itself. Wafers of one lot
            share their fate, so the truth is less certain than that. Wafers that went through are those that a report
            or the floor has counted, the larger of both; else all of the lot, where the floor has done the step.
          </p>
          <BreakageMap map={map} all={all} />
          <LimitTable limits={limits} rates={rates} />
          <RateTable caption="By support" head="Held by" rows={bySupport} all={all} />
          <RateTable caption="By silicon thickness" head="Silicon" rows={byThickness} all={all} />
          <RateTable caption="By step" head="Step" rows={byStep} all={all} />
          <RateTable caption="By film stack" head="Films on the wafer then" rows={byFilms} all={all} />
        </>
      )}
    </>
  );
}
