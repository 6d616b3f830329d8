import type { ReactNode } from "react";

/** Terms and what is said of them, side by side. */
export function DetailList({ children }: { children: ReactNode }) {
  return <dl className="grid grid-cols-[5.5rem_minmax(0,1fr)] gap-x-4 gap-y-1 [&>dt]:text-quiet">{children}</dl>;
}
