import { randomUUID } from "node:crypto";
import { LockMode } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { z } from "zod";
import { MailOutbox } from "#app/db/entities/mail-outbox.ts";
import { LONGEST_ATTEMPT, type Delivery, type MailTransport } from "#app/integrations/mail/transport.ts";
import { isAccountMail } from "#app/lib/account-mail.ts";
import { KINDS_OF_MAIL } from "#app/lib/mail/mail-choices.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { backOff, MOST_ATTEMPTS } from "./back-off.ts";
import { composeMail } from "./compose-mail.server.ts";
import { queueMail } from "./queue-mail.server.ts";

const payloadSchema = z.object({ id: z.uuid() });

/** Longer than an attempt can last, so that two processes are never at the same mail, milliseconds. */
const LEASE = LONGEST_ATTEMPT + 10_000;

const UNSURE = "It may have arrived: the connection or the process ended before the mail server had answered.";

/**
 * Sends one mail of the outbox and notes how that ended. 'sending' is committed before the mail server is spoken to, so what a process
 * that dies leaves behind shows that it may have been sent. Where somebody can tell whether it was, they are asked; where nobody can,
 * an essential mail is sent again under the same Message-ID, by which a reader of mail knows the second for the first, and any other
 * is parked: better a letter that somebody looks at than one too many.
 */
export async function sendMail(payload: unknown, transport: MailTransport | null): Promise<void> {
  const { id } = payloadSchema.parse(payload);
  // Without a mail server everything stays as it is, and is looked for once there is one.
  if (transport === null) return;
  const work: Scope = { personId: null, atWork: true, requestId: randomUUID() };
  const attempt = await takeUp(work, id, transport);
  if (attempt === null) return;
  const delivery = await transport.send(attempt.mail);
  await inScope(work, async (em) => {
    // Only the attempt that is under way has a say in how it ended.
    const row = await em.findOne(MailOutbox, { id, attemptId: attempt.id, state: "sending" });
    if (row) await note(em, row, delivery);
  });
}

/** Writes the mail and marks it as being sent; null when there is nothing to send now. */
async function takeUp(work: Scope, id: string, transport: MailTransport) {
  const row = await inScope(work, (em) => em.findOne(MailOutbox, { id, state: { $in: ["waiting", "sending"] } }));
  if (!row) return null;
  const composed = await composeMail(work, row);
  return inScope(work, async (em) => {
    const locked = await em.findOne(
      MailOutbox,
      { id, state: { $in: ["waiting", "sending"] } },
      { lockMode: LockMode.PESSIMISTIC_PARTIAL_WRITE },
    );
    // Another worker has it under its hands.
    if (!locked) return null;
    if (!(await isDue(em, locked, transport))) return null;
    if ("dropped" in composed) {
      end(locked, "dropped", composed.dropped);
      await em.flush();
      return null;
    }
    const attemptId = randomUUID();
    Object.assign(locked, {
      state: "sending",
      attemptId,
      leaseUntil: new Date(Date.now() + LEASE),
      attempts: locked.attempts + 1,
    });
    await em.flush();
    return { id: attemptId, mail: composed.mail };
  });
}

/** Whether an attempt may begin now. What is for later is put back into the queue; what was left in the middle is settled. */
async function isDue(em: EntityManager, row: MailOutbox, transport: MailTransport): Promise<boolean> {
  const now = Date.now();
  const from = row.state === "sending" ? row.leaseUntil : row.nextTryAt;
  if (from && from.getTime() > now) {
    await queueMail(em, row.id, from);
    return false;
  }
  if (row.state === "waiting") return true;
  // Whoever was sending it is gone.
  const arrived = await transport.has(row.messageId);
  if (arrived === false) return true;
  if (arrived === null && isEssential(row)) return true;
  if (arrived) end(row, "sent", "");
  else end(row, "parked", UNSURE);
  await em.flush();
  return false;
}

async function note(em: EntityManager, row: MailOutbox, delivery: Delivery): Promise<void> {
  if (delivery.outcome === "accepted") end(row, "sent", "");
  else if (delivery.outcome === "refused") end(row, "parked", `The mail server refused it: ${delivery.reason}`);
  else if (delivery.outcome === "unsure" && !isEssential(row)) end(row, "parked", `${UNSURE} ${delivery.reason}`);
  else if (row.attempts >= MOST_ATTEMPTS)
    end(row, "parked", `It could not be sent in ${row.attempts} attempts, lastly: ${delivery.reason}`);
  else {
    const nextTryAt = new Date(Date.now() + backOff(row.attempts, Math.random()));
    Object.assign(row, { state: "waiting", attemptId: null, leaseUntil: null, nextTryAt, reason: delivery.reason });
    await queueMail(em, row.id, nextTryAt);
  }
  await em.flush();
}

function end(row: MailOutbox, state: "sent" | "parked" | "dropped", reason: string): void {
  Object.assign(row, {
    state,
    reason,
    attemptId: null,
    leaseUntil: null,
    sentAt: state === "sent" ? new Date() : null,
  });
}

const isEssential = ({ kind }: MailOutbox): boolean =>
  isAccountMail(kind) || (kind !== "digest" && KINDS_OF_MAIL[kind].essential);
