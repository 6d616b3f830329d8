import type { ReactNode } from "react";
import { Link } from "react-router";
import { HungSection } from "#app/components/ui/HungSection.tsx";

interface Props {
  title: string;
  /** what the order or the group means, in a few words */
  remark?: string;
  /** where the rest is, when not all rows are shown */
  more?: { count: number; to: string } | null;
  children: ReactNode;
}

/** A group of Today, its rows ruled off from each other, with the way to those that are not shown. */
export function TodaySection({ title, remark, more, children }: Props) {
  return (
    <HungSection title={title} remark={remark}>
      {children}
      {more && more.count > 0 && (
        <p className="border-t border-line pt-2">
          <Link to={more.to} className="link">
            {more.count} more
          </Link>
        </p>
      )}
    </HungSection>
  );
}
