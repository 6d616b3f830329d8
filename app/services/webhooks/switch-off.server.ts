import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Webhook } from "#app/db/entities/webhook.ts";
import { actorById } from "../actor.server.ts";
import { announce } from "../mail/announce.server.ts";

/** A webhook is switched off after so many attempts in a row that failed, the first of them so long ago (milliseconds). */
const MOST_FAILURES = 20;
const LONGEST_FAILING = 3 * 24 * 3600e3;

/** Counts an attempt that failed, and switches a webhook off that nobody seems to look after, which its maker is told by mail. */
export async function switchOffWhatFails(em: EntityManager, webhookId: string, now: Date): Promise<void> {
  await em.execute(
    "update webhook set failures = failures + 1, failing_since = coalesce(failing_since, ?::timestamptz) where id = ?",
    [now, webhookId],
  );
  const webhook = await em.findOne(Webhook, { id: webhookId }, { refresh: true });
  if (!webhook || webhook.state === "off") return;
  const { failures, failingSince } = webhook;
  if (failures < MOST_FAILURES || !failingSince || now.getTime() - failingSince.getTime() < LONGEST_FAILING) return;
  Object.assign(webhook, { state: "off", offReason: `${failures} attempts in a row have failed in three days.` });
  await em.flush();
  const maker = await actorById(webhook.createdBy.id, randomUUID());
  const held = maker?.memberships.find(({ programId }) => programId === webhook.program.id);
  // Whoever has left the program since is told nothing of it.
  if (!held) return;
  await announce(em, {
    program: webhook.program.id,
    key: `${webhook.id} ${now.toISOString()}`,
    to: [webhook.createdBy.id],
    by: null,
    announcement: {
      kind: "webhook switched off",
      program: held.programName,
      webhook: webhook.name,
      failures,
      path: `/webhooks/${webhook.id}`,
    },
  });
}
