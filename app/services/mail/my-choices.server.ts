import { randomBytes, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { MailChoice } from "#app/db/entities/mail-choice.ts";
import {
  ANNOUNCEMENT_KINDS,
  choiceFor,
  CHOSEN_KINDS,
  KINDS_OF_MAIL,
  type MailChoices,
} from "#app/lib/mail/mail-choices.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { MailChoiceRow } from "#app/schemas/mail-choice.ts";
import type { AnnouncementKind } from "#app/schemas/announcement.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope, type Scope } from "#app/server/scope.server.ts";

/** Kinds of mail that can reach the person, with what they have chosen; of a guest only those of sheets and webhooks. */
export async function mailChoices(scope: ActorScope): Promise<MailChoiceRow[]> {
  const chosen = await inScope(scope, (em) => chosenBy(em, scope.actor.id));
  return ANNOUNCEMENT_KINDS.filter((kind) => programsWhere(scope.actor, KINDS_OF_MAIL[kind].readers).length > 0).map(
    (kind) => ({ kind, essential: KINDS_OF_MAIL[kind].essential, choice: choiceFor(kind, chosen) }),
  );
}

/** Keeps what the person has chosen; kinds that were not asked stay as they were. */
export async function saveMailChoices(scope: ActorScope, given: MailChoices): Promise<void> {
  await inScope(scope, (em) => keep(em, scope.actor.id, given));
}

/** What a link in a mail stops: one kind, or everything that goes into the digest. */
export type Stopped = AnnouncementKind | "digest";

interface ByToken {
  /** the recipient's address, so that whoever has it open sees whose mail it stops */
  email: string;
  /** kinds that it stops and that are not stopped already */
  kinds: AnnouncementKind[];
}

/**
 * What a link in a mail would stop, for whoever has it, signed in or not.
 * @throws 404 for a token that is nobody's
 */
export async function askedToStop(token: string, what: Stopped, requestId: string): Promise<ByToken> {
  const found = await byToken(token, requestId);
  return { email: found.email, kinds: stoppable(what, found.chosen) };
}

/**
 * Stops it. Done twice it stays as it is.
 * @throws 404 for a token that is nobody's
 */
export async function stopMail(token: string, what: Stopped, requestId: string): Promise<void> {
  const { personId, chosen } = await byToken(token, requestId);
  const given = Object.fromEntries(stoppable(what, chosen).map((kind) => [kind, "not at all"]));
  await inScope({ personId, requestId }, (em) => keep(em, personId, given));
}

function stoppable(what: Stopped, chosen: MailChoices): AnnouncementKind[] {
  const asked = CHOSEN_KINDS.filter((kind) =>
    what === "digest" ? choiceFor(kind, chosen) === "daily digest" : kind === what,
  );
  return asked.filter((kind) => choiceFor(kind, chosen) !== "not at all");
}

async function byToken(token: string, requestId: string) {
  const door: Scope = { personId: null, atTheDoor: true, requestId };
  const choice = await inScope(door, (em) =>
    em.findOne(MailChoice, { unsubscribeToken: token.slice(0, 100) }, { populate: ["person"] }),
  );
  if (!choice) throw notFound("link to stop mail");
  return { personId: choice.person.id, email: choice.person.email, chosen: choice.value };
}

async function chosenBy(em: EntityManager, person: string): Promise<MailChoices> {
  return (await em.findOne(MailChoice, { person }))?.value ?? {};
}

async function keep(em: EntityManager, person: string, given: MailChoices): Promise<void> {
  await em.execute(
    `insert into mail_choice (id, person_id, value, unsubscribe_token, at) values (?, ?, ?::jsonb, ?, now())
       on conflict (person_id) do update set value = mail_choice.value || excluded.value, at = excluded.at`,
    [randomUUID(), person, JSON.stringify(given), randomBytes(32).toString("base64url")],
  );
}
