import { z } from "zod";
import { INCIDENT_KINDS, INCIDENT_STATES, SEVERITIES, type WaferSpot } from "./incident.ts";
import { line, wholeNumber } from "./record-fields.ts";

/** The clock of a tool and that of the server may differ by so much, ms. */
const CLOCKS = 5 * 60_000;
const WHEN = "Type day and time in UTC as 2026-12-01 14:30.";

/** A minute in UTC, as whoever reports types it. */
const happenedAt = z
  .string(WHEN)
  .trim()
  .regex(/^\d{4}-\d{2}-\d{2}[ T]\d{2}:\d{2}$/, WHEN)
  .transform((text, context) => {
    const at = new Date(`${text.slice(0, 10)}T${text.slice(11)}:00Z`);
    const fault = Number.isNaN(at.getTime())
      ? WHEN
      : at.getTime() > Date.now() + CLOCKS
        ? "That is still to come. The time is UTC."
        : at.getUTCFullYear() < 1990
          ? "A day before 1990 is none of an incident here."
          : null;
    if (fault === null) return at;
    context.addIssue({ code: "custom", message: fault });
    return z.NEVER;
  });

/** A number with point or comma that may be left blank, as null. */
const optionalNumber = (message: string, { least, most }: { least: number; most: number }) =>
  z
    .string()
    .trim()
    .max(20, message)
    .optional()
    .transform((text, context): number | null => {
      if (!text) return null;
      const value = /^\d+(?:[.,]\d+)?$/.test(text) ? Number(text.replace(",", ".")) : Number.NaN;
      if (value >= least && value <= most) return value;
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    });

const wafers = (least: number, message: string) =>
  z
    .string()
    .trim()
    .optional()
    .transform((text, context): number | null => {
      if (!text) return null;
      if (/^\d{1,4}$/.test(text) && Number(text) >= least) return Number(text);
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    });

const id = (message: string) => z.uuid(message);

/** What somebody reports of an incident. */
export interface IncidentValues {
  /** made before it is sent, so that a report counts once however often it comes */
  id: string;
  assessment: string;
  leg: number;
  step: number;
  lot: string;
  wafer: string;
  kind: (typeof INCIDENT_KINDS)[number];
  severity: (typeof SEVERITIES)[number];
  spot: WaferSpot | null;
  affected: number;
  broken: number;
  through: number | null;
  words: string;
  occurredAt: Date;
}

/** A report as its form sends it: the place in per cent of the radius and degrees from the notch. */
export const incidentSchema = z
  .object({
    id: id("Open the form again: its own number is missing."),
    assessment: id("Choose the flow first."),
    leg: wholeNumber("Choose the slots.", { least: 0, most: 25 }),
    step: wholeNumber("Choose the step at which it happened.", { least: 1, most: 200 }),
    lot: z.string("Name the lot, as it stands on its box.").trim().min(1).max(80, "Keep it under 80 characters."),
    wafer: line(80),
    kind: z.enum(INCIDENT_KINDS, "Say what happened."),
    severity: z.enum(SEVERITIES, "Say how bad it was."),
    radius: optionalNumber("Type 0 to 100, in per cent of the radius, or leave it blank.", { least: 0, most: 100 }),
    azimuth: optionalNumber("Type 0 to 360, in degrees from the notch, or leave it blank.", { least: 0, most: 360 }),
    affected: wafers(1, "Type how many wafers, from 1 on."),
    broken: wafers(0, "Type how many wafers broke, 0 for none."),
    through: wafers(1, "Type how many wafers went through the step, from 1 on, or leave it blank."),
    words: z
      .string("Say in a few words what happened.")
      .trim()
      .min(1, "Say in a few words what happened.")
      .max(4000, "Keep it under 4000 characters."),
    occurredAt: happenedAt,
  })
  .transform(({ radius, azimuth, ...form }, context): IncidentValues => {
    const refuse = (field: string, message: string) => {
      context.addIssue({ code: "custom", path: [field], message });
      return z.NEVER;
    };
    const affected = form.affected ?? 1;
    const broken = form.broken ?? 0;
    if (broken > affected) return refuse("broken", "More wafers broke than it happened to. Put one of the two right.");
    if (form.through !== null && form.through < affected)
      return refuse("through", "Fewer went through the step than it happened to. Put one of the two right.");
    if (form.severity === "wafer lost" && broken === 0)
      return refuse("broken", "A wafer was lost: say how many broke or had to be scrapped.");
    if (radius === null && azimuth !== null)
      return refuse("radius", "Say how far out as well, in per cent of the radius, or clear the angle.");
    if (azimuth === null && radius !== null && radius > 0)
      return refuse("azimuth", "Say at which angle from the notch as well, or clear how far out.");
    const spot = radius === null ? null : { radius: radius / 100, azimuth: (((azimuth ?? 0) % 360) * Math.PI) / 180 };
    return { ...form, affected, broken, spot };
  });

/** A note that follows an incident up, closes it or opens it again. */
export const followUpSchema = z.object({
  state: z.enum(INCIDENT_STATES, "Say how it stands now."),
  text: z
    .string("Say what was found or done.")
    .trim()
    .min(1, "Say what was found or done.")
    .max(4000, "Keep it under 4000 characters."),
});
export type FollowUpValues = z.output<typeof followUpSchema>;
