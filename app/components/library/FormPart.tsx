import { useId, type ReactNode } from "react";

/** A part of a long form under its heading. */
export function FormPart({ title, children }: { title: string; children: ReactNode }) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="space-y-4 border-t border-ink pt-4">
      <h2 id={id} className="text-lead font-semibold">
        {title}
      </h2>
      {children}
    </section>
  );
}
