import { z } from "zod";
import { localPath } from "#app/lib/local-path.ts";

/** Names of people and records, as they stood when it happened. */
const name = z.string().trim().min(1).max(300);
/** What somebody wrote about it; empty where they wrote nothing. */
const note = z.string().trim().max(4000).default("");
/** The page of Planeward that it leads to, within the site. */
const path = z
  .string()
  .max(500)
  .refine((text) => localPath(text) === text && !/\s/.test(text), "A path within the site, such as /sheets/…");

/** What every announcement says: the program by its name, who did it, the page. */
const about = { program: name, by: name, path };
/** Of a sheet by its number, and the flow that it is of. */
const sheet = { ...about, sheet: name, flow: name };
/** A revision by its letter. */
const revision = z.string().trim().min(1).max(20);

/** What people are told by mail, by its kind. The figures of it stay on the page: mail leaves the site. */
export const announcementSchema = z.discriminatedUnion("kind", [
  z.object({ kind: z.literal("review asked"), ...sheet, note }),
  z.object({ kind: z.literal("review returned"), ...sheet, reason: note }),
  z.object({
    kind: z.literal("sheet released"),
    ...sheet,
    revision,
    /** what changed since the last one, in short lines */
    changes: z.array(name).max(5).default([]),
  }),
  z.object({ kind: z.literal("sheet superseded"), ...sheet, revision, supersededBy: revision }),
  z.object({ kind: z.literal("sheet withdrawn"), ...sheet, revision, reason: note }),
  z.object({
    kind: z.literal("assessment out of date"),
    program: name,
    flow: name,
    /** the document number of the assessment, as the page shows it */
    assessment: name,
    /** what differs now, the first few in words */
    changes: z.array(name).min(1).max(6),
    /** how many more there are */
    more: z.int().nonnegative(),
    path,
  }),
  z.object({
    kind: z.literal("incident"),
    ...about,
    lot: name,
    /** where it happened: the step by number and title */
    step: name,
    what: note,
  }),
  z.object({ kind: z.literal("step stopped"), ...about, flow: name, step: name, reason: note }),
  z.object({
    kind: z.literal("webhook switched off"),
    program: name,
    webhook: name,
    /** attempts in a row that have failed */
    failures: z.int().positive(),
    path,
  }),
  z.object({ kind: z.literal("lot held"), ...about, lot: name, reason: note }),
]);

/** What people are told, as it is stored and written. */
export type Announcement = z.infer<typeof announcementSchema>;
/** The same as a caller gives it, where what may be empty can be left out. */
export type AnnouncementInput = z.input<typeof announcementSchema>;
export type AnnouncementKind = Announcement["kind"];
