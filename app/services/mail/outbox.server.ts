import { LockMode } from "@mikro-orm/core";
import type { FilterQuery } from "@mikro-orm/postgresql";
import { MailOutbox } from "#app/db/entities/mail-outbox.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import { MAIL_STATES, type OutboxRow } from "#app/schemas/outbox.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { idFrom } from "../uuid.server.ts";
import { queueMail } from "./queue-mail.server.ts";

export const OUTBOX_SORTS = ["written"] as const;

/** The mail of the programs that the person looks after, the newest first; an administrator sees the digests and mail about accounts as well. */
export async function listOutbox(scope: ActorScope, params: ListParams): Promise<ListPage<OutboxRow>> {
  requireInSomeProgram(scope, "see the outbox");
  const { query, filters, descending, page } = params;
  const state = MAIL_STATES.find((known) => known === filters["state"]);
  const pattern = { $ilike: `%${escapeLike(query)}%` };
  const looked: FilterQuery<MailOutbox> = {
    $or: [
      { program: programFilter(scope.actor, "see the outbox", filters["program"]) },
      ...(seesDigests(scope) && !filters["program"] ? [{ program: null }] : []),
    ],
  };
  return inScope(scope, async (em) => {
    const [rows, total] = await em.findAndCount(
      MailOutbox,
      {
        $and: [
          looked,
          state ? { state } : {},
          query ? { $or: [{ kind: pattern }, { person: { name: pattern } }, { person: { email: pattern } }] } : {},
        ],
      },
      {
        populate: ["program", "person"],
        orderBy: [{ createdAt: descending ? "desc" : "asc" }, { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (page - 1) * PAGE_SIZE,
      },
    );
    return { rows: rows.map(rowOf), total, params };
  });
}

type Shown = MailOutbox & { program?: { name: string } | null; person: { name: string; email: string } };

function rowOf(mail: Shown): OutboxRow {
  const { id, kind, state, attempts, reason } = mail;
  return {
    id,
    kind,
    program: mail.program?.name ?? null,
    to: mail.person.name,
    email: mail.address ?? mail.person.email,
    state,
    attempts,
    reason,
    createdAt: mail.createdAt.toISOString(),
    nextTryAt: mail.nextTryAt.toISOString(),
    sentAt: mail.sentAt?.toISOString() ?? null,
  };
}

/**
 * Has a mail tried again now, with all its attempts before it: one that is parked, or one that waits for its next attempt.
 * @throws 404 for one of a program that the person does not look after, 409 for one that is under way or has ended
 */
export async function tryAgain(scope: ActorScope, id: string | undefined): Promise<void> {
  await inScope(scope, async (em) => {
    const mail = await em.findOne(MailOutbox, { id: idFrom(id, "mail") }, { lockMode: LockMode.PESSIMISTIC_WRITE });
    if (!mail || !maySee(scope, mail.program?.id ?? null)) throw notFound("mail");
    if (mail.state !== "parked" && mail.state !== "waiting")
      throw problem(
        409,
        "Only mail that waits or is parked is tried again. Open the outbox anew to see how it stands.",
      );
    const now = new Date();
    Object.assign(mail, { state: "waiting", attempts: 0, nextTryAt: now });
    await em.flush();
    await queueMail(em, mail.id, now);
  });
}

const seesDigests = ({ actor }: ActorScope): boolean => actor.siteRole === "administrator";

const maySee = (scope: ActorScope, program: string | null): boolean =>
  program === null ? seesDigests(scope) : mayInProgram(scope.actor, "see the outbox", program);
