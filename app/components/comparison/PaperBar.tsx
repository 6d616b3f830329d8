import { Link } from "react-router";
import { PrintButton } from "#app/components/sheet/PrintButton.tsx";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";

const CHOICE = "link aria-[current=true]:font-semibold aria-[current=true]:text-ink aria-[current=true]:no-underline";

interface Props {
  /** address of the page with all that is asked of it */
  back: string;
  /** what that page is called, such as 'the comparison' */
  backTo: string;
  paper: Paper;
}

/** The way back, the paper and the print command; on screen only. */
export function PaperBar({ back, backTo, paper }: Props) {
  const search = back.includes("?") ? back.slice(back.indexOf("?")) : "";
  return (
    <header className="screen-only border-b border-ink">
      <div className="mx-auto flex max-w-page flex-wrap items-center gap-x-4 gap-y-2 px-4 py-3 tablet:px-6">
        <Link to={back} className="link">
          Back to {backTo}
        </Link>
        <nav aria-label="Paper" className="ml-auto flex gap-3">
          {(Object.keys(PAPERS) as Paper[]).map((each) => (
            <Link
              key={each}
              to={`${search}${search === "" ? "?" : "&"}paper=${each}`}
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
