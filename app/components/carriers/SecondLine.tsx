import type { ReactNode } from "react";

/** A quiet second line in a cell: what the figure above it is for. */
export function SecondLine({ children }: { children: ReactNode }) {
  return <span className="block text-label text-quiet">{children}</span>;
}
