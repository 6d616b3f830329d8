import type { ReactNode } from "react";
import { Link } from "react-router";

interface Props {
  /** the wafer as it lies, where there is one */
  drawing?: ReactNode;
  title: string;
  children?: ReactNode;
  /** outcome or state, in a column of its own */
  state?: ReactNode;
  action: { words: string; to: string };
}

/** One thing that waits: what it is, how it stands, and the one thing to do about it. */
export function TodayRow({ drawing, title, children, state, action }: Props) {
  const below = drawing ? "max-tablet:col-start-2" : "max-tablet:col-span-2";
  return (
    <li className="grid grid-cols-[84px_minmax(0,1fr)] items-start gap-x-4 gap-y-1 border-t border-line py-(--row-space) first:border-0 first:pt-0 tablet:min-h-(--row-least) tablet:grid-cols-[84px_minmax(0,1fr)_148px_104px]">
      <div className={drawing ? "" : "max-tablet:hidden"}>{drawing}</div>
      <div className={`min-w-0 ${drawing ? "" : "max-tablet:col-span-2"}`}>
        <h3 className="font-semibold wrap-anywhere">{title}</h3>
        {children && <p>{children}</p>}
      </div>
      <div className={below}>{state}</div>
      <p className={`${below} tablet:text-right`}>
        <Link to={action.to} className="link" aria-label={`${action.words}: ${title}`}>
          {action.words}
        </Link>
      </p>
    </li>
  );
}
