import { Link } from "react-router";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { bowWord, stressText, senseOf } from "#app/lib/scan-answer.ts";
import type { ScanRow } from "#app/schemas/scan-view.ts";
import { TodayRow } from "./TodayRow.tsx";
import { TodaySection } from "./TodaySection.tsx";

interface Props {
  scans: ScanRow[];
  mayUpload: boolean;
  /** one for the whole page */
  exaggeration: number;
}

/** The newest scans, and where to bring the next. */
export function TodayScans({ scans, mayUpload, exaggeration }: Props) {
  return (
    <TodaySection title="Latest scans" remark="newest first">
      {scans.length === 0 ? (
        <p className="text-quiet">No scans yet. A profile before a film and one after it give the film’s stress.</p>
      ) : (
        <ul>
          {scans.map((scan) => (
            <TodayRow
              key={scan.id}
              title={scan.film ? `${scan.label}, ${scan.film}` : scan.label}
              state={
                <span className="text-quiet">
                  {scan.createdAt.slice(0, 10)}
                  <span className="block text-label">{scan.createdBy}</span>
                </span>
              }
              drawing={
                !scan.curled && (
                  <BowLine
                    diameter={scan.diameter}
                    shape={{ kind: "bowed", bow: scan.bowChange }}
                    deviceSideUp
                    holding="bare"
                    exaggeration={exaggeration}
                    width={84}
                    height={36}
                    label=""
                  />
                )
              }
              action={{ words: "See scan", to: `/scans/${scan.id}` }}
            >
              {scan.curled
                ? "The wafer has rolled up: no stress, no bow. "
                : `${stressText(scan)}, ${senseOf(scan)}; ${bowWord(scan.bowChange, scan.bowUncertainty)}. `}
              <span className="text-quiet">{scan.program}</span>
            </TodayRow>
          ))}
        </ul>
      )}
      {mayUpload && (
        <p className="border-t border-line pt-3">
          <Link to="/scans/new" className="link">
            Upload scans
          </Link>
        </p>
      )}
    </TodaySection>
  );
}
