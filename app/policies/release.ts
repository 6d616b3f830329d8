import type { RevisionState } from "#app/schemas/sheet-revision.ts";
import type { StoodInFor } from "./roles.ts";

/** What decides whether a person may release a revision. */
export interface ReleaseCase {
  state: RevisionState;
  /** who asked for the review, and who ran the assessment */
  askedBy: string;
  assessedBy: string;
  /** the newest assessment of its flow is another one, or its inputs have changed */
  outOfDate: boolean;
  newer: boolean;
  /** inputs and results are those that the review was asked for */
  unchanged: boolean;
  /** findings that block and that no deviation in force covers */
  open: number;
}

/** One thing that stands in the way, and what to do about it. */
export interface Obstacle {
  what: string;
  remedy: string;
}

/**
 * Everything that keeps this person from releasing this revision; empty when nothing does. Who may release in the program at all is
 * the permissions' affair.
 * @param standsInFor in whose place the person releases, who may not by a role of their own
 */
export function releaseObstacles(
  personId: string,
  standsInFor: readonly StoodInFor[],
  revision: ReleaseCase,
): Obstacle[] {
  const { state, askedBy, assessedBy, outOfDate, newer, unchanged, open } = revision;
  const found: Obstacle[] = [];
  if (state !== "in review")
    found.push({
      what: `This revision is ${state}, not in review.`,
      remedy: "Ask for a review of a newer assessment.",
    });
  if (personId === askedBy || personId === assessedBy)
    found.push({
      what: "It is your own work: you ran the assessment or asked for the review.",
      remedy: "Another process owner of the program has to release it.",
    });
  const theirs = standsInFor.find(({ id }) => id === askedBy || id === assessedBy);
  if (theirs)
    found.push({
      what: `It is the work of ${theirs.name}, in whose place you act here.`,
      remedy: "Another process owner of the program has to release it.",
    });
  if (!unchanged)
    found.push({
      what: "The stored assessment is not the one that the review was asked for.",
      remedy: "Return it, and tell your administrator: a stored assessment never changes by itself.",
    });
  if (newer)
    found.push({
      what: "The flow has been assessed again since.",
      remedy: "Return this one, and ask for a review of the newest assessment.",
    });
  else if (outOfDate)
    found.push({
      what: "The assessment is out of date: its inputs have changed since.",
      remedy: "Return it, run the assessment again, and ask for a review of that one.",
    });
  if (open > 0)
    found.push({
      what: `${open === 1 ? "One finding blocks" : `${open} findings block`} the release and no deviation covers ${open === 1 ? "it" : "them"}.`,
      remedy:
        "Change the flow, or record a deviation with reason, scope and expiry, and have it signed by a second person.",
    });
  return found;
}
