import type { RevisionState } from "#app/schemas/sheet-revision.ts";

/** How a revision stands, in words. */
export function revisionState(state: RevisionState, supersededBy: string | null): string {
  if (state === "superseded" && supersededBy !== null) return `Superseded by ${supersededBy}`;
  return state.charAt(0).toUpperCase() + state.slice(1);
}

/** Its weight: what is in force is plain, what must not be used stands out. */
export const REVISION_CLASSES: Readonly<Record<RevisionState, string>> = {
  "in review": "text-caution font-semibold",
  returned: "text-quiet",
  released: "text-clear font-semibold",
  superseded: "text-stop font-semibold",
  withdrawn: "text-stop font-semibold",
};
