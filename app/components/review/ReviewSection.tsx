import { useId, type ReactNode } from "react";

/** A part of the review: its heading hangs at the left, as on Today. */
export function ReviewSection({ title, remark, children }: { title: string; remark?: string; children: ReactNode }) {
  const id = useId();
  return (
    <section
      aria-labelledby={id}
      className="grid gap-x-4 border-t border-ink pt-3 tablet:grid-cols-[144px_minmax(0,1fr)]"
    >
      <div className="max-tablet:mb-2">
        <h2 id={id} className="font-semibold">
          {title}
        </h2>
        {remark && <p className="text-label text-quiet">{remark}</p>}
      </div>
      <div className="min-w-0">{children}</div>
    </section>
  );
}
