import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { AuditEvent } from "#app/db/entities/audit-event.ts";
import { Membership } from "#app/db/entities/membership.ts";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { Person } from "#app/db/entities/person.ts";
import type { Proof } from "#app/schemas/proof.ts";
import type { InviteValues, RoleValues } from "#app/schemas/person-form.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { requireRecentProof } from "./recent-proof.server.ts";
import { endTokens, mailLink } from "./tokens.server.ts";

const MANAGE = "manage people";

/** Who administers is looked at by one at a time: two who demote each other must not both succeed. */
const lockAdministrators = (em: EntityManager) =>
  em.execute("select pg_advisory_xact_lock(hashtextextended('administrators', 0))");

/**
 * Invites somebody: the account is there with its roles, and not active until a password is set, so that no mail of a program goes to an
 * address that nobody has answered from.
 * @returns the new id, or null where the address is that of an account already
 */
export async function invitePerson(
  scope: ActorScope,
  { name, email, siteRole, memberships }: Omit<InviteValues, keyof Proof>,
): Promise<string | null> {
  requireOnSite(scope, MANAGE);
  requireRecentProof(scope);
  return inScope(scope, async (em) => {
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`invitation of ${email}`]);
    if (await em.findOne(Person, { email })) return null;
    const id = randomUUID();
    const now = new Date();
    em.create(Person, { id, email, name, siteRole, active: false, invitedAt: now, createdAt: now });
    await em.flush();
    await giveRoles(em, id, memberships);
    await mailLink(em, { purpose: "invitation", person: id, address: email, by: scope.actor.id });
    return id;
  });
}

/** Mails an invitation anew; the link before it works no more. @throws 409 for somebody who is not invited */
export async function inviteAgain(scope: ActorScope, id: string | undefined): Promise<void> {
  await withPerson(scope, id, async (em, person) => {
    if (!person.invitedAt || person.active)
      throw problem(409, "This invitation was answered or taken back. Open the page again.");
    await mailLink(em, { purpose: "invitation", person: person.id, address: person.email, by: scope.actor.id });
  });
}

/**
 * Changes what somebody is on the site and in its programs. One's own roles are changed by another administrator, so the last one can't
 * take the role from themselves, nor anybody let themselves into a program.
 */
export async function changeRoles(scope: ActorScope, id: string | undefined, given: RoleValues): Promise<void> {
  requireOnSite(scope, MANAGE);
  requireRecentProof(scope);
  await withPerson(scope, id, async (em, person) => {
    refuseSelf(scope, person);
    if (person.siteRole === "administrator" && given.siteRole !== "administrator") await refuseLast(em, person);
    person.siteRole = given.siteRole;
    await giveRoles(em, person.id, given.memberships);
  });
}

async function giveRoles(em: EntityManager, person: string, memberships: RoleValues["memberships"]): Promise<void> {
  const held = await em.find(Membership, { person });
  for (const { program, role } of memberships) {
    const known = held.find((each) => each.program.id === program);
    if (known && role === null) em.remove(known);
    else if (known && role !== null) known.role = role;
    else if (role !== null) em.create(Membership, { id: randomUUID(), person, program, role, createdAt: new Date() });
  }
  await em.flush();
}

/** Shuts an account: its sessions and links end at once, what the person did stays. */
export async function deactivatePerson(scope: ActorScope, id: string | undefined): Promise<void> {
  await withPerson(scope, id, async (em, person) => {
    refuseSelf(scope, person);
    if (person.siteRole === "administrator") await refuseLast(em, person);
    Object.assign(person, { active: false, invitedAt: null });
    await em.flush();
    await endTokens(em, person.id);
    await em.execute("select end_sessions_of(?)", [person.id]);
  });
}

/** Ends every session of somebody whose device is lost or in strange hands; the account stays as it is, and the trail says so. */
export async function signOutEverywhere(scope: ActorScope, id: string | undefined): Promise<void> {
  requireOnSite(scope, MANAGE);
  requireRecentProof(scope);
  await withPerson(scope, id, async (em, person) => {
    refuseSelf(scope, person);
    await em.execute("select end_sessions_of(?)", [person.id]);
    em.create(AuditEvent, {
      id: randomUUID(),
      at: new Date(),
      actorId: scope.actor.id,
      programId: null,
      action: "signed out",
      subject: "session",
      subjectId: person.id,
      field: null,
      from: null,
      to: null,
      requestId: scope.requestId,
    });
  });
}

/** Opens an account again, with a link to set a password: the one before may be known to others by now. */
export async function reactivatePerson(scope: ActorScope, id: string | undefined): Promise<void> {
  requireOnSite(scope, MANAGE);
  requireRecentProof(scope);
  await withPerson(scope, id, async (em, person) => {
    if (person.active || person.invitedAt) throw problem(409, "This account is in use already. Open the page again.");
    person.invitedAt = new Date();
    await em.flush();
    await mailLink(em, { purpose: "invitation", person: person.id, address: person.email, by: scope.actor.id });
  });
}

/** Takes the one-time codes off somebody's account, whose sessions end at once; a mail tells them. @throws 409 where they have none */
export async function resetCodes(scope: ActorScope, id: string | undefined): Promise<void> {
  requireOnSite(scope, MANAGE);
  requireRecentProof(scope);
  await withPerson(scope, id, async (em, person) => {
    refuseSelf(scope, person);
    const codes = await em.findOne(OneTimeCodes, { person: person.id });
    if (!codes) throw problem(409, "This account has no one-time codes. Open the page again.");
    await em.remove(codes).flush();
    await em.execute("select end_sessions_of(?)", [person.id]);
    await mailAccount(em, { kind: "codes reset", person: person.id, key: randomUUID(), by: scope.actor.id });
  });
}

async function withPerson(
  scope: ActorScope,
  id: string | undefined,
  work: (em: EntityManager, person: Person) => Promise<void>,
): Promise<void> {
  requireOnSite(scope, MANAGE);
  await inScope(scope, async (em) => {
    await lockAdministrators(em);
    const person = await em.findOne(Person, { id: idFrom(id, "person") });
    if (!person) throw notFound("person");
    await work(em, person);
    await em.flush();
  });
}

function refuseSelf({ actor }: ActorScope, { id }: Person): void {
  if (id === actor.id)
    throw problem(
      409,
      "This is your own account. Another administrator changes its roles, deactivates it or resets its codes.",
    );
}

async function refuseLast(em: EntityManager, { id }: Person): Promise<void> {
  const others = await em.count(Person, { siteRole: "administrator", active: true, id: { $ne: id } });
  if (others === 0) throw problem(409, "This is the last administrator. Make somebody else an administrator first.");
}
