import { Link } from "react-router";
import { PrintButton } from "#app/components/sheet/PrintButton.tsx";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { comparisonSearch, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";

const CHOICE = "link aria-[current=true]:font-semibold aria-[current=true]:text-ink aria-[current=true]:no-underline";

/** The way back, the paper and the print command; on screen only. */
export function PaperBar({ asked, paper }: { asked: ComparisonAsked; paper: Paper }) {
  const search = comparisonSearch(asked);
  return (
    <header className="screen-only border-b border-ink">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 tablet:px-6">
        <Link to={`/stacks/compare${search}`} className="link">
          Back to the comparison
        </Link>
        <nav aria-label="Paper" className="ml-auto flex gap-3">
          {(Object.keys(PAPERS) as Paper[]).map((each) => (
            <Link
              key={each}
              to={each === "a4" ? search : `${search}&paper=${each}`}
              replace
              aria-current={each === paper ? "true" : undefined}
              className={CHOICE}
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
