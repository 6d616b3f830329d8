import { SEVERITY_CLASSES } from "#app/components/incidents/incident-words.ts";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { TodayGroup, TodayIncident } from "#app/schemas/today.ts";
import { TodayRow } from "./TodayRow.tsx";
import { TodaySection } from "./TodaySection.tsx";

/** Incidents that nobody follows up yet. */
export function TodayIncidents({ incidents }: { incidents: TodayGroup<TodayIncident> }) {
  const { rows, total } = incidents;
  if (total === 0) return null;
  return (
    <TodaySection
      title="To follow up"
      remark="incidents, oldest first"
      more={{ count: total - rows.length, to: "/incidents?state=open" }}
    >
      <ul>
        {rows.map(({ id, title, severity, words, lot, program, at }) => (
          <TodayRow
            key={id}
            title={noBreak(title)}
            state={
              <>
                <span className={SEVERITY_CLASSES[severity]}>{severity}</span>
                <span className="block text-label text-quiet">{at.slice(0, 10)}</span>
              </>
            }
            action={{ words: "Follow it up", to: `/incidents/${id}` }}
          >
            <span className="wrap-anywhere">{words} </span>
            <span className="text-quiet">{`lot ${lot}, ${program}`}</span>
          </TodayRow>
        ))}
      </ul>
    </TodaySection>
  );
}
