/** Records whose changes are told to who looks at them; a flow's new assessments are changes of the flow, revisions those of their sheet. */
export const WATCHED = ["stack", "flow", "sheet", "job"] as const;
export type Watched = (typeof WATCHED)[number];

/** How things stand with what somebody looks at: another text once it has changed. */
export interface StandNow {
  stand: string;
  /** it was changed by the very person who looks */
  own: boolean;
}
