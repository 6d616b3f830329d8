import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Webhook } from "#app/db/entities/webhook.ts";
import { mayInProgram, programsWhere } from "#app/policies/permissions.ts";
import type { NewWebhook, WebhookRow, WebhooksView } from "#app/schemas/webhook.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { proofAsked, requireRecentProof } from "../people/recent-proof.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { newSecret } from "./secret.server.ts";

/** Webhooks that one person may have in one program. */
const MOST = 10;

/** The webhooks of which the person may know: their own, and those of the programs that they look after. */
export async function webhooksView(scope: ActorScope): Promise<WebhooksView> {
  requireInSomeProgram(scope, "keep webhooks");
  const programs = programsWhere(scope.actor, "keep webhooks");
  return inScope(scope, async (em) => {
    const found = await em.find(
      Webhook,
      { program: { $in: programs.map(({ programId }) => programId) } },
      { populate: ["program"], orderBy: { name: "asc", id: "asc" } },
    );
    const names = await namesOf(em, found);
    const left = await leftAlone(em, scope, found);
    return {
      rows: found
        .filter((webhook) => maySee(scope, webhook))
        .map((webhook) => rowOf(webhook, webhook.program.name, names, left)),
      programs: programs.map(({ programId, programName }) => ({ id: programId, name: programName })),
      proofAsked: proofAsked(scope),
    };
  });
}

const maySee = ({ actor }: ActorScope, { program, createdBy }: Webhook): boolean =>
  mayInProgram(actor, "look after webhooks", program.id) ||
  (createdBy.id === actor.id && mayInProgram(actor, "keep webhooks", program.id));

/** Names of who made webhooks; a guest sees no people, but is told their own. */
async function namesOf(em: EntityManager, webhooks: readonly Webhook[]): Promise<Map<string, string>> {
  const people = await em.execute<{ id: string; name: string }[]>(
    "select id, name from person where id = any(array[?]::uuid[])",
    [[randomUUID(), ...webhooks.map(({ createdBy }) => createdBy.id)]],
  );
  return new Map(people.map(({ id, name }) => [id, name]));
}

/** Ids of those whose maker is not of their program any more, as far as the person may see who is: of programs that they work in. */
async function leftAlone(em: EntityManager, { actor }: ActorScope, webhooks: readonly Webhook[]): Promise<Set<string>> {
  const asked = webhooks.filter(({ program }) => mayInProgram(actor, "see the work", program.id));
  if (asked.length === 0) return new Set();
  const heard = await em.execute<{ id: string }[]>(
    `select w.id from webhook w, jsonb_array_elements_text(w.events) event, webhook_listeners(w.program_id, event) l
      where l.webhook_id = w.id`,
  );
  const hearing = new Set(heard.map(({ id }) => id));
  return new Set(asked.filter(({ id, state }) => state === "on" && !hearing.has(id)).map(({ id }) => id));
}

function rowOf(webhook: Webhook, program: string, names: Map<string, string>, left: Set<string>): WebhookRow {
  const { id, name, address, events, state, offReason, failures } = webhook;
  return {
    id,
    name,
    program,
    address,
    events,
    madeBy: names.get(webhook.createdBy.id) ?? "somebody of another program",
    state,
    offReason,
    makerLeft: left.has(id),
    failures,
    failingSince: webhook.failingSince?.toISOString() ?? null,
    lastSentAt: webhook.lastSentAt?.toISOString() ?? null,
  };
}

/** The webhook that an id names. @throws 404 for one that is not there or of which the person may not know */
export async function findWebhook(em: EntityManager, scope: ActorScope, id: string | undefined) {
  const webhook = await em.findOne(Webhook, { id: idFrom(id, "webhook") }, { populate: ["program"] });
  if (!webhook || !maySee(scope, webhook)) throw notFound("webhook");
  return webhook;
}

/** One webhook with when its secret was made. */
export async function webhookPage(scope: ActorScope, id: string | undefined) {
  return inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, id);
    const left = await leftAlone(em, scope, [webhook]);
    const row = rowOf(webhook, webhook.program.name, await namesOf(em, [webhook]), left);
    return {
      webhook: { ...row, secretMadeAt: webhook.secretMadeAt.toISOString() },
      proofAsked: proofAsked(scope),
    };
  });
}

/** Makes a webhook in the actor's own name, who has just proved to be that. Its secret is in what comes back and nowhere else to be read. */
export async function makeWebhook(
  scope: ActorScope,
  { name, program, address, events }: NewWebhook,
): Promise<{ id: string; secret: string } | { refused: string }> {
  requireInProgram(scope, "keep webhooks", program, "program");
  requireRecentProof(scope);
  return inScope(scope, async (em) => {
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`webhooks of ${scope.actor.id}`]);
    if ((await em.count(Webhook, { program, createdBy: scope.actor.id })) >= MOST)
      return { refused: `You have ${MOST} webhooks in this program. Delete one that is not used.` };
    const id = randomUUID();
    const now = new Date();
    const { secret, sealedSecret } = newSecret(id);
    em.create(Webhook, {
      id,
      program,
      name,
      address,
      events: [...new Set(events)],
      sealedSecret,
      secretMadeAt: now,
      state: "on",
      offReason: "",
      failures: 0,
      failingSince: null,
      lastSentAt: null,
      createdAt: now,
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { id, secret };
  });
}

/** Gives a webhook another secret; what is sent from then on, old deliveries included, is signed with it. */
export async function renewSecret(scope: ActorScope, id: string | undefined): Promise<string> {
  requireRecentProof(scope);
  return inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, id);
    const { secret, sealedSecret } = newSecret(webhook.id);
    Object.assign(webhook, { sealedSecret, secretMadeAt: new Date() });
    await em.flush();
    return secret;
  });
}

/** Switches a webhook on or off. What waits for one that is off is parked when its turn comes; failures are counted anew from there on. */
export async function switchWebhook(scope: ActorScope, id: string | undefined, state: "on" | "off"): Promise<void> {
  await inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, id);
    Object.assign(webhook, { state, offReason: "", failures: 0, failingSince: null });
    await em.flush();
  });
}

/** Deletes a webhook with its log; the trail keeps that it was there. An attempt that is under way may still arrive. */
export async function deleteWebhook(scope: ActorScope, id: string | undefined): Promise<void> {
  await inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, id);
    await em.remove(webhook).flush();
  });
}
