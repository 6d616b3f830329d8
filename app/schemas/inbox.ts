/** A mail in the list of the demo's inbox. */
export interface InboxRow {
  id: string;
  subject: string;
  /** ISO */
  arrivedAt: string;
}
