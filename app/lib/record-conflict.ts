/** A property in which what somebody has typed differs from what is saved by now. */
export interface ConflictRow {
  label: string;
  mine: string;
  theirs: string;
}

/** Somebody else saved a record after this person had opened it: where the two differ. */
export interface RecordConflict {
  by: string;
  rows: ConflictRow[];
}
