import type { ReactNode } from "react";

interface Props {
  id: string;
  title: string;
  /** links into the section */
  aside?: ReactNode;
  children: ReactNode;
}

/** A section of the method page: on a wide screen its heading hangs beside it and stays while one reads. */
export function MethodSection({ id, title, aside, children }: Props) {
  return (
    <section
      aria-labelledby={id}
      className="grid gap-x-8 gap-y-4 border-t border-ink py-6 wide:grid-cols-[200px_minmax(0,1fr)]"
    >
      <div className="self-start wide:sticky wide:top-4">
        <h2 id={id} className="scroll-mt-4 text-lead font-semibold">
          {title}
        </h2>
        {aside}
      </div>
      <div className="min-w-0 max-w-240">{children}</div>
    </section>
  );
}
