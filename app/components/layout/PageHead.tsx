import type { ReactNode } from "react";
import { Link } from "react-router";

interface Props {
  title: string;
  /** a quiet remark beside the title: how many, of when */
  remark?: string;
  crumbs?: { name: string; path: string }[];
  actions?: ReactNode;
}

/** Title of a page, the way back, and what can be done here. */
export function PageHead({ title, remark, crumbs, actions }: Props) {
  return (
    <div className="screen-only flex flex-wrap items-center gap-x-4 gap-y-2 py-4">
      <div>
        {crumbs && (
          <nav aria-label="Path" className="text-quiet">
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
        <h1 className={crumbs ? "text-figure font-medium" : "text-answer font-medium"}>{title}</h1>
      </div>
      {remark && <p className="self-end pb-1 text-quiet">{remark}</p>}
      {actions && <div className="ml-auto flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
}
