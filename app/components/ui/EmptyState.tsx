import type { ReactNode } from "react";

/** A place with nothing in it yet: what belongs here, and the first thing to do. */
export function EmptyState({ title, children, actions }: { title: string; children: ReactNode; actions?: ReactNode }) {
  return (
    <section className="empty max-w-160">
      <h2 className="font-semibold">{title}</h2>
      <p className="mt-1 text-quiet">{children}</p>
      {actions && <div className="mt-4 flex flex-wrap gap-2">{actions}</div>}
    </section>
  );
}
