import type { ReactNode } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";

/** Something about a record that is no measured property. */
export interface Fact {
  label: string;
  value: ReactNode;
}

/** What a record is and has besides its measured properties. */
export function Facts({ facts }: { facts: Fact[] }) {
  return (
    <dl>
      {facts.map(({ label, value }) => (
        <div
          key={label}
          className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-3 border-t border-line py-2 first:border-0"
        >
          <dt className="text-quiet">{label}</dt>
          <dd>{typeof value === "string" ? noBreak(value) : value}</dd>
        </div>
      ))}
    </dl>
  );
}
