import { useId, type ReactNode } from "react";

/** One part of the side pane under its heading. `id` is where links on the page lead to. */
export function PaneSection({ title, id, children }: { title: string; id?: string; children: ReactNode }) {
  const own = useId();
  return (
    <section id={id} className="scroll-mt-4 p-4" aria-labelledby={own}>
      <h2 id={own} className="mb-1 font-semibold">
        {title}
      </h2>
      {children}
    </section>
  );
}
