/** How a released revision stands, as its paper says it. */
export interface RevisionStanding {
  status: "released" | "superseded" | "withdrawn";
  /** letter of the revision that took its place; with status superseded */
  supersededBy: string | null;
}

/** For the title block: 'Superseded by C'. */
export function statusWord({ status, supersededBy }: RevisionStanding): string {
  if (status === "released") return "Released";
  if (status === "withdrawn") return "Withdrawn";
  return supersededBy ? `Superseded by ${supersededBy}` : "Superseded";
}

/** For the mark across its pages; null while it is in force. */
export function markWords({ status, supersededBy }: RevisionStanding): string | null {
  if (status === "released") return null;
  if (status === "withdrawn") return "withdrawn";
  return supersededBy ? `superseded by ${supersededBy}` : "superseded";
}

/** What its page says before anything else once it is not in force; null while it is. */
export function endedNotice(standing: RevisionStanding): string | null {
  return standing.status === "released" ? null : `${statusWord(standing)}: do not work from this paper`;
}
