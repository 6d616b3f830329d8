import { useId, type ReactNode } from "react";
import { Link } from "react-router";

interface Props {
  title: string;
  /** what the order or the group means, in a few words */
  remark?: string;
  /** where the rest is, when not all rows are shown */
  more?: { count: number; to: string } | null;
  children: ReactNode;
}

/** A group of Today: its heading hangs at the left, its rows are ruled off from each other. */
export function TodaySection({ title, remark, more, children }: Props) {
  const id = useId();
  return (
    <section
      aria-labelledby={id}
      className="grid gap-x-4 border-t border-ink pt-3 pb-6 tablet:grid-cols-[144px_minmax(0,1fr)]"
    >
      <div className="max-tablet:mb-2">
        <h2 id={id} className="font-semibold">
          {title}
        </h2>
        {remark && <p className="text-label text-quiet">{remark}</p>}
      </div>
      <div className="min-w-0">
        {children}
        {more && more.count > 0 && (
          <p className="border-t border-line pt-2">
            <Link to={more.to} className="link">
              {more.count} more
            </Link>
          </p>
        )}
      </div>
    </section>
  );
}
