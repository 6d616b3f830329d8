/** What can be done, as the trail has it. */
export const AUDIT_ACTIONS = ["created", "changed", "removed", "signed in", "signed out", "refused"] as const;

/** One event of the audit trail. */
export interface AuditRow {
  id: string;
  at: string;
  /** who; null for the product itself, or somebody whom it did not let in */
  actor: string | null;
  program: string | null;
  action: string;
  subject: string;
  subjectId: string | null;
  field: string | null;
  /** as JSON; null where there is none */
  from: string | null;
  to: string | null;
  requestId: string;
}

/** Whether the trail is whole. */
export interface AuditState {
  /** how many events are sealed */
  sealed: number;
  chains: { program: string | null; count: number; hash: string; at: string }[];
  faults: { program: string | null; number: number | null; eventId: string; fault: string }[];
}
