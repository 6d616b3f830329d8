import { Link } from "react-router";
import type { LegsView } from "#app/lib/assessment-leg.ts";
import { legQuery } from "#app/lib/leg-query.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { PrintButton } from "./PrintButton.tsx";

interface Props {
  assessmentId: string;
  paper: Paper;
  /** the slots that it is for and the others, each of which has a sheet of its own; null for all slots */
  legs: LegsView | null;
}

const CHOICE = "link aria-[current=true]:font-semibold aria-[current=true]:text-ink aria-[current=true]:no-underline";

/** The way back, the slots, the paper and the print command; on screen only. */
export function SheetBar({ assessmentId, paper, legs }: Props) {
  const leg = legs?.chosen.number;
  return (
    <header className="screen-only border-b border-ink">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 tablet:px-6">
        <Link to={`/assessments/${assessmentId}${legQuery("?", leg)}`} className="link">
          Back to the assessment
        </Link>
        {legs ? (
          <nav aria-label="Slots" className="flex flex-wrap gap-3">
            {legs.rows.map(({ number, name }) => (
              <Link
                key={number}
                to={`?leg=${number}&paper=${paper}`}
                replace
                aria-current={number === leg ? "true" : undefined}
                className={CHOICE}
              >
                {name}
              </Link>
            ))}
          </nav>
        ) : null}
        <nav aria-label="Paper" className="ml-auto flex gap-3">
          {(Object.keys(PAPERS) as Paper[]).map((each) => (
            <Link
              key={each}
              to={`?paper=${each}${legQuery("&", leg)}`}
              replace
              aria-current={each === paper ? "true" : undefined}
              className={CHOICE}
            >
              {PAPERS[each].name}
            </Link>
          ))}
        </nav>
        <a href={`/sheets/${assessmentId}/draft.pdf?paper=${paper}${legQuery("&", leg)}`} download className="btn">
          PDF
        </a>
        <PrintButton />
      </div>
    </header>
  );
}
