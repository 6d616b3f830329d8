import { Link } from "react-router";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { PictureButton } from "./PictureButton.tsx";

interface Props {
  /** address of the page */
  page: string;
  /** what is asked of it, as a search */
  search: string;
  /** file name of the picture, without its ending */
  picture: string;
}

/** What a page shows, as files and on paper. */
export function ExportLinks({ page, search, picture }: Props) {
  const inBrowser = useInBrowser();
  return (
    <>
      <a href={`${page}.csv${search}`} className="btn" download>
        CSV
      </a>
      <a href={`${page}.svg${search}`} className="btn" download>
        SVG
      </a>
      {inBrowser ? <PictureButton drawing={`${page}.svg${search}`} name={picture} /> : null}
      <Link to={`${page}/print${search}`} className="btn">
        Print
      </Link>
    </>
  );
}
