import { useId, type ReactNode } from "react";

interface Props {
  title: string;
  /** what the order or the group means, in a few words */
  remark?: string | undefined;
  children: ReactNode;
}

/** A part of a page whose heading hangs at the left of it, ruled off from the part above. */
export function HungSection({ title, remark, children }: Props) {
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
      <div className="min-w-0">{children}</div>
    </section>
  );
}
