import type { ReactNode } from "react";

interface Props {
  /** what is built */
  build: ReactNode;
  /** the answer, without anything that takes the focus but what leads to a field */
  answer: ReactNode;
  findings: ReactNode;
}

/**
 * What I build and what follows from it: two panes side by side, the right one staying in sight; on one pane the answer comes
 * first, then the stack, then the rest.
 */
export function StackPanes({ build, answer, findings }: Props) {
  return (
    <div className="frame grid grid-cols-[minmax(0,1fr)] wide:grid-cols-[minmax(0,736fr)_minmax(0,656fr)]">
      <div className="order-2 min-w-0 border-ink max-wide:border-y wide:order-none wide:border-r">{build}</div>
      <aside
        aria-label="What follows from the stack"
        className="contents wide:sticky wide:top-0 wide:block wide:self-start"
      >
        <div className="order-1 min-w-0">{answer}</div>
        <div className="order-3 min-w-0 max-wide:[&>:first-child]:border-t-0">{findings}</div>
      </aside>
    </div>
  );
}
