import type { ReactNode } from "react";

const EDGES = { error: "border-stop", caution: "border-caution", done: "border-clear" } as const;

/** A sentence that belongs to the whole page: what went wrong, what to mind, what was done. */
export function Notice({ kind, title, children }: { kind: keyof typeof EDGES; title: string; children?: ReactNode }) {
  return (
    <div role={kind === "error" ? "alert" : "status"} className={`frame mb-4 border-l-4 p-3 ${EDGES[kind]}`}>
      <p className="font-semibold">{title}</p>
      {children && <div className="mt-1">{children}</div>}
    </div>
  );
}
