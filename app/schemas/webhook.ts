import type { ProofAsked } from "./proof.ts";
import { z } from "zod";
import type { ProgramPermission } from "#app/policies/permissions.ts";
import { words } from "./written.ts";

interface WebhookEvent {
  words: string;
  /** what whoever made the webhook must be allowed in the program to be sent it */
  readers: ProgramPermission;
}

/** What a webhook may tell of. */
export const WEBHOOK_EVENTS = {
  "sheet.released": { words: "A sheet is released", readers: "see released sheets" },
  "sheet.superseded": { words: "A sheet is superseded", readers: "see released sheets" },
  "assessment.out_of_date": { words: "An assessment is out of date", readers: "see the work" },
  "incident.reported": { words: "An incident is reported", readers: "see the work" },
  "step.stopped": { words: "A step is stopped", readers: "see the work" },
} as const satisfies Record<string, WebhookEvent>;

export type WebhookEventName = keyof typeof WEBHOOK_EVENTS;
export const WEBHOOK_EVENT_NAMES = Object.keys(WEBHOOK_EVENTS) as [WebhookEventName, ...WebhookEventName[]];

/** What a delivery tells: an event, or that somebody tries whether deliveries arrive. */
export type DeliveredEvent = WebhookEventName | "test";
export const eventWords = (event: DeliveredEvent): string =>
  event === "test" ? "A test" : WEBHOOK_EVENTS[event].words;

/**
 * How far a delivery is. 'sending' is written before the receiver is talked to, so that what was left in the middle is found;
 * 'parked' was given up with its reason.
 */
export const DELIVERY_STATES = ["waiting", "sending", "sent", "parked"] as const;
export type DeliveryState = (typeof DELIVERY_STATES)[number];

/** One attempt at a delivery. */
export interface DeliveryAttempt {
  /** ISO */
  at: string;
  milliseconds: number;
  /** of the answer; null where there was none */
  status: number | null;
  /** the beginning of what was answered, or why there was no answer */
  said: string;
}

/** Longest address that is taken. */
const LONGEST_ADDRESS = 500;

/** An address that a webhook may be for, as far as it can be told from its text. @param overHttp whether it may do without TLS */
const receiverAddress = (overHttp: boolean) =>
  words("Write the address that deliveries go to.", LONGEST_ADDRESS).transform((text, { addIssue }) => {
    const refuse = (message: string) => {
      addIssue({ code: "custom", message });
      return z.NEVER;
    };
    const url = URL.canParse(text) ? new URL(text) : null;
    if (!url || !["https:", "http:"].includes(url.protocol))
      return refuse("Write the whole address, beginning with https://.");
    if (url.protocol === "http:" && !overHttp)
      return refuse("It takes an address that begins with https://: deliveries do not go without TLS.");
    if (url.username !== "" || url.password !== "")
      return refuse("Leave name and password out of the address: every delivery is signed.");
    if (url.hash !== "") return refuse("Leave out what follows the #: it is not sent.");
    return url.href;
  });

/** The form in which somebody makes a webhook. */
export const newWebhookSchema = (overHttp: boolean) =>
  z.object({
    name: words("Name what receives it.", 80),
    program: z.uuid("Choose a program."),
    address: receiverAddress(overHttp),
    events: z.array(z.enum(WEBHOOK_EVENT_NAMES, "Choose from the list.")).min(1, "Choose at least one event."),
  });
export type NewWebhook = z.output<ReturnType<typeof newWebhookSchema>>;

/** One webhook as lists show it. Times are ISO. */
export interface WebhookRow {
  id: string;
  name: string;
  program: string;
  address: string;
  events: WebhookEventName[];
  madeBy: string;
  state: "on" | "off";
  /** why it is off; empty where somebody switched it off, or it is on */
  offReason: string;
  /** whether whoever made it has left the program or the site, so that nothing is sent */
  makerLeft: boolean;
  /** attempts in a row that have failed, and since when */
  failures: number;
  failingSince: string | null;
  lastSentAt: string | null;
}

export interface WebhooksView {
  rows: WebhookRow[];
  programs: { id: string; name: string }[];
  proofAsked: ProofAsked;
}

export interface DeliveryRow {
  id: string;
  event: DeliveredEvent;
  /** what it is of, in a few words */
  about: string;
  state: DeliveryState;
  attempts: number;
  reason: string;
  createdAt: string;
  nextTryAt: string;
  sentAt: string | null;
}

export interface DeliveryView extends DeliveryRow {
  webhook: { id: string; name: string; program: string; address: string };
  eventId: string;
  body: string;
  tries: DeliveryAttempt[];
  /** who had it sent by hand; null for what an event wrote */
  byHand: string | null;
  mayReplay: boolean;
}
