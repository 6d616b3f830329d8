import type { ReactNode } from "react";
import { Mark } from "#app/components/drawings/Mark.tsx";

interface Props {
  person: string;
  /** set on pages that may be kept on the device, for this person alone */
  personId?: string;
  children?: ReactNode;
}

/** The head of every screen of the floor: which sheet, whether it is in force, which lot, who, and the small way out. */
export function FloorHead({ person, personId, children }: Props) {
  return (
    <header
      data-floor-person={personId}
      className="flex min-h-14 flex-wrap items-center gap-x-5 gap-y-1 border-b border-ink px-4 py-2 text-lead tablet:px-6"
    >
      <a href="/floor" className="flex min-h-11 min-w-11 items-center" aria-label="Floor, find a lot">
        <Mark size={20} />
      </a>
      {children}
      <span className="ml-auto text-quiet">{person}</span>
      <a href="/" className="link flex min-h-11 items-center print:hidden">
        Desk
      </a>
    </header>
  );
}
