/** The one-time codes of a person's own account. Times are ISO. */
export interface OwnCodes {
  /** since when signing in asks for them; null where it does not */
  since: string | null;
  /** what the person's app is to be given, while no first code has shown that it has it */
  waiting: CodesToConfirm | null;
  recovery: { left: number; madeAt: string; usedAt: string | null } | null;
}

/** A secret on its way into an app. */
export interface CodesToConfirm {
  /** as it is typed, in groups of four */
  secret: string;
  /** opens an app on the same device */
  address: string;
  /** the same as a square code */
  code: { size: number; path: string };
}
