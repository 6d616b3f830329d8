import { Link } from "react-router";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { PrintButton } from "./PrintButton.tsx";

/** The way back, the paper and the print command; on screen only. */
export function SheetBar({ assessmentId, paper }: { assessmentId: string; paper: Paper }) {
  return (
    <header className="screen-only border-b border-ink">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 tablet:px-6">
        <Link to={`/assessments/${assessmentId}`} className="link">
          Back to the assessment
        </Link>
        <nav aria-label="Paper" className="ml-auto flex gap-3">
          {(Object.keys(PAPERS) as Paper[]).map((each) => (
            <Link
              key={each}
              to={each === "a4" ? "?" : `?paper=${each}`}
              replace
              aria-current={each === paper ? "true" : undefined}
              className="link aria-[current=true]:font-semibold aria-[current=true]:text-ink aria-[current=true]:no-underline"
            >
              {PAPERS[each].name}
            </Link>
          ))}
        </nav>
        <PrintButton />
      </div>
    </header>
  );
}
