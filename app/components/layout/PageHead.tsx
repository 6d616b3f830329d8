import type { ReactNode } from "react";
import { Link, useLocation } from "react-router";
import { Mark } from "#app/components/drawings/Mark.tsx";
import { StarButton } from "#app/components/kept/StarButton.tsx";
import { keptRecordAt } from "#app/lib/kept-kinds.ts";
import { MethodLink } from "./MethodLink.tsx";

interface Props {
  title: string;
  /** a quiet remark beside the title: how many, of when */
  remark?: string;
  crumbs?: { name: string; path: string }[];
  actions?: ReactNode;
}

/** Title of a page with its star where it is that of a record, the way back, where its method is told, and what can be done here. */
export function PageHead({ title, remark, crumbs, actions }: Props) {
  const { pathname } = useLocation();
  const record = keptRecordAt(pathname);
  return (
    <>
      <PaperHead />
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 py-4 print:py-2">
        {crumbs && (
          <nav aria-label="Path" className="screen-only -mb-2 basis-full text-quiet">
            {crumbs.map(({ name, path }) => (
              <span key={path}>
                <Link to={path} className="link text-quiet">
                  {name}
                </Link>
                <span aria-hidden> / </span>
              </span>
            ))}
          </nav>
        )}
        <div className="flex items-center gap-1">
          <h1 className={crumbs ? "text-figure font-medium" : "text-answer font-medium"}>{title}</h1>
          {record && <StarButton {...record} />}
        </div>
        <p className="text-quiet">
          {remark && <span className="mr-3">{remark}</span>}
          <span className="screen-only">
            <MethodLink />
          </span>
        </p>
        {actions && <div className="screen-only ml-auto flex flex-wrap gap-2">{actions}</div>}
      </div>
    </>
  );
}

/** What a page that is printed as it stands is headed by: whose it is, and that paper does not follow what changes. */
function PaperHead() {
  return (
    <p className="print-only flex items-center gap-2 border-b border-line pb-1">
      <Mark size={16} />
      <span className="font-semibold">Planeward</span>
      <span className="ml-auto text-label">Uncontrolled when printed</span>
    </p>
  );
}
