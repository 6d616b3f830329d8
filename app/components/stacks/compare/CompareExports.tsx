import { Link } from "react-router";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { comparisonSearch, type ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import { PictureButton } from "./PictureButton.tsx";

/** The comparison as files and on paper. */
export function CompareExports({ asked }: { asked: ComparisonAsked }) {
  const search = comparisonSearch({ ...asked, query: "" });
  const inBrowser = useInBrowser();
  return (
    <>
      <a href={`/stacks/compare.csv${search}`} className="btn" download>
        CSV
      </a>
      <a href={`/stacks/compare.svg${search}`} className="btn" download>
        SVG
      </a>
      {inBrowser ? <PictureButton drawing={`/stacks/compare.svg${search}`} /> : null}
      <Link to={`/stacks/compare/print${search}`} className="btn">
        Print
      </Link>
    </>
  );
}
