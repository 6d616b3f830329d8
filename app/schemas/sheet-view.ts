import { z } from "zod";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";
import { SHEET_PAGES, type RevisionState, type SheetPages } from "./sheet-revision.ts";

/** One revision in the list of sheets. */
export interface SheetRow {
  id: string;
  assessmentId: string;
  /** 'TERN-H003' */
  sheet: string;
  /** null before it is released */
  letter: string | null;
  state: RevisionState;
  flow: string;
  program: string;
  /** ISO date-time of its release, or of when a review was asked for */
  at: string;
  /** letter of the one that took its place */
  supersededBy: string | null;
}

export interface PrintView {
  by: string;
  at: string;
  place: string;
  paper: Paper;
  pages: SheetPages;
}

/** The page of a revision that was released. */
export interface RevisionView {
  id: string;
  sheet: string;
  letter: string;
  state: "released" | "superseded" | "withdrawn";
  title: string;
  program: string;
  releasedAt: string;
  /** null for a guest, who reads on the paper who released it */
  releasedBy: string | null;
  remark: string;
  changes: string[];
  supersededBy: { letter: string; id: string } | null;
  endedAt: string | null;
  endedBy: string | null;
  endReason: string | null;
  /** the papers of a flow that parts by slot, by their number and slots; one with number 0 where it does not */
  papers: { leg: number; name: string }[];
  deviations: { scope: string; until: string; over: boolean }[];
  /** null for a guest, as is all that follows */
  staff: null | {
    assessmentId: string;
    sheetId: string;
    prints: PrintView[];
    revisions: { id: string; letter: string; state: RevisionState; at: string }[];
    mayWithdraw: boolean;
  };
}

const number = z
  .string()
  .regex(/^\d{1,3}$/, "Choose one of the sheets.")
  .transform(Number);

/** What is asked for when a sheet is taken out to be printed. */
export const printFormSchema = z.object({
  paper: z.enum(Object.keys(PAPERS) as [Paper, ...Paper[]], "Choose a paper."),
  pages: z.enum(SHEET_PAGES, "Choose the pages."),
  leg: number.default(0),
  place: z.string().trim().max(200, "Keep it under 200 characters.").default(""),
});
export type PrintForm = z.output<typeof printFormSchema>;

/** How a paper stands, as its public page says it. */
export interface SheetStatus {
  sheet: string;
  letter: string;
  state: "released" | "superseded" | "withdrawn";
  /** ISO date-times */
  releasedAt: string;
  endedAt: string | null;
  supersededBy: string | null;
  /** token of the revision that is in force now, if there is one */
  current: string | null;
  deviationUntil: string | null;
}
