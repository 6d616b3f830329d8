import { z } from "zod";
import { firstDay, lastDay, words, YEAR } from "./written.ts";

/** The form in which a process owner names who stands in for them; days are UTC, the last one counts to its end. */
export const delegationSchema = z
  .object({
    intent: z.literal("name"),
    /** program and person, by their ids */
    whom: z
      .string("Choose who stands in.")
      .regex(/^[0-9a-f-]{36} [0-9a-f-]{36}$/, "Choose who stands in.")
      .transform((text) => {
        const [program = "", person = ""] = text.split(" ");
        return { program, person };
      }),
    from: firstDay("Type the first day as 2026-12-31."),
    until: lastDay("Type the last day as 2026-12-31."),
    reason: words("Say why, such as a leave.", 300),
  })
  .check(({ value: { from, until }, issues }) => {
    const add = (message: string) => issues.push({ code: "custom", message, path: ["until"], input: until });
    if (until < from) add("The last day is before the first.");
    else if (until.getTime() - from.getTime() > YEAR) add("Nobody stands in for longer than a year.");
  });
export type DelegationValues = z.output<typeof delegationSchema>;

export const endDelegationSchema = z.object({ intent: z.literal("end"), delegation: z.uuid("Open the page again.") });

/** One delegation as the page lists it. */
export interface DelegationRow {
  id: string;
  program: string;
  owner: string;
  delegate: string;
  /** ISO days */
  from: string;
  until: string;
  reason: string;
  state: "coming" | "running" | "over" | "ended";
  /** ISO day of an early end */
  endedAt: string | null;
  mayEnd: boolean;
}

export interface DelegatesView {
  rows: DelegationRow[];
  /** who may be named, by the program in which the reader is a process owner; empty for everybody else */
  choices: { program: string; people: { value: string; label: string }[] }[];
}
