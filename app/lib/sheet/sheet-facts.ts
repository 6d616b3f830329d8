/** What a sheet says of its release, beside what was assessed. */
export interface SheetFacts {
  /** null for a draft */
  release: null | {
    /** document number of the sheet, 'TRN-H003' */
    number: string;
    /** 'A', 'B', … */
    revision: string;
    status: "released" | "superseded" | "withdrawn";
    /** letter of the revision that took its place; with status superseded */
    supersededBy: string | null;
    /** ISO date-time */
    effectiveFrom: string;
    preparedBy: string;
    checkedBy: string;
    releasedBy: string;
    /** absolute address that the code on paper leads to */
    statusAddress: string;
    /** what changed since the last released revision, at most three lines; empty for a first one */
    changes: string[];
    /** deviations in force: what is allowed, within which scope, until when */
    deviations: { text: string; scope: string; until: string }[];
  };
  /** lots that it is pinned to; empty: any lot of the program */
  lots: string[];
  whomToCall: string | null;
}

/** What a draft has: nobody has checked or released it. */
export const DRAFT_FACTS: SheetFacts = { release: null, lots: [], whomToCall: null };
