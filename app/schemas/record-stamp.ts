/** Dates and names that a page or form shows about a record. */
export interface RecordStamp {
  version: number;
  updatedAt: string;
  updatedBy: string;
}
