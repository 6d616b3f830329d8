import { z } from "zod";
import { importProfileSchema } from "./import-profile.ts";
import { scanSchema } from "./scan.ts";

const UNREADABLE = "How the file is read did not arrive. Open the page again.";

/** An import profile as text, since a form has nothing else. */
export const profileText = z
  .string(UNREADABLE)
  .max(100_000, UNREADABLE)
  .transform((text, context) => {
    try {
      return JSON.parse(text) as unknown;
    } catch {
      context.addIssue({ code: "custom", message: UNREADABLE });
      return z.NEVER;
    }
  })
  .pipe(importProfileSchema);

/** A pair of files of an import: what the scan is of, and by what profile each file is read. */
export const scanImportSchema = scanSchema
  .omit({ positionUnit: true, heightUnit: true, decimalMark: true })
  .extend({ profileBefore: profileText, profileAfter: profileText });

/** What the server answers to a pair. */
export type PairAnswer =
  | { outcome: "stored" | "already"; id: string }
  | { outcome: "refused"; which: "before" | "after" | null; reason: string }
  /** by field: what is wrong with what all pairs of the batch share */
  | { outcome: "fields"; errors: Record<string, string[]> };

/** What came of keeping an import profile: its name, or what stands in the way. */
export interface KeptAnswer {
  kept?: string;
  fault?: string;
}
