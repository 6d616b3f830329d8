import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { choiceFor, KINDS_OF_MAIL, type MailChoices } from "#app/lib/mail/mail-choices.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { Actor, ProgramRole, SiteRole } from "#app/policies/roles.ts";
import { announcementSchema, type Announcement, type AnnouncementInput } from "#app/schemas/announcement.ts";
import { messageIdFor } from "./message-id.server.ts";
import { queueMail } from "./queue-mail.server.ts";

interface NewAnnouncement {
  /** id of the program that it is of */
  program: string;
  announcement: AnnouncementInput;
  /** what of its kind it tells, such as the id of a revision: nobody is told the same twice, however often this is called */
  key: string;
  /** ids of the people to be told; who may not be, or does not want to, is passed over */
  to: readonly string[];
  /** who did it, and so knows; null for Planeward itself */
  by: string | null;
}

interface Reader {
  person_id: string;
  role: ProgramRole;
  site_role: SiteRole | null;
  choices: MailChoices;
}

/**
 * Writes one mail for each person into the outbox, within the caller's transaction: what happened and its mail are there together or
 * not at all. Passed over are whoever did it, people who are not active or not of the program, who may not open the page behind it,
 * and who has switched the kind off.
 */
export async function announce(
  em: EntityManager,
  { program, announcement: given, key, to, by }: NewAnnouncement,
): Promise<void> {
  const announcement = announcementSchema.parse(given);
  const people = [...new Set(to)].filter((id) => id !== by);
  if (people.length === 0) return;
  // What waits in the unit of work comes first: the mail may be about it.
  await em.flush();
  const readers = await em.execute<Reader[]>("select * from mail_readers(?, array[?]::uuid[])", [program, people]);
  const now = new Date();
  for (const reader of readers) {
    const choice = choiceFor(announcement.kind, reader.choices);
    if (choice === "not at all" || !mayRead(reader, announcement.kind, program)) continue;
    const id = randomUUID();
    // No conflict is named, because whoever announces may not read the outbox.
    await em.execute(
      `insert into mail_outbox (id, program_id, person_id, kind, key, announcement, state, message_id, attempts, next_try_at, reason,
                                created_at, created_by_id)
         values (?, ?, ?, ?, ?, ?::jsonb, ?, ?, 0, ?, '', ?, ?) on conflict do nothing`,
      [
        id,
        program,
        reader.person_id,
        announcement.kind,
        key,
        JSON.stringify(forReader(announcement, reader)),
        choice === "at once" ? "waiting" : "digest",
        messageIdFor(id),
        now,
        now,
        by,
      ],
    );
    if (choice === "at once") await queueMail(em, id, now);
  }
}

function mayRead({ person_id, role, site_role }: Reader, kind: Announcement["kind"], program: string): boolean {
  const actor: Actor = {
    id: person_id,
    name: "",
    email: "",
    siteRole: site_role,
    memberships: [{ programId: program, programName: "", programSlug: "", role }],
  };
  return mayInProgram(actor, KINDS_OF_MAIL[kind].readers, program);
}

/** A guest is told that a sheet came, changed or went, and nothing that the people of the program wrote to each other about it. */
function forReader(announcement: Announcement, { role, site_role }: Reader): Announcement {
  if (role !== "guest" || site_role !== null) return announcement;
  if (announcement.kind === "sheet released") return { ...announcement, changes: [] };
  return "reason" in announcement ? { ...announcement, reason: "" } : announcement;
}
