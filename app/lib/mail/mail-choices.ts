import type { ProgramPermission } from "#app/policies/permissions.ts";
import type { AnnouncementKind } from "#app/schemas/announcement.ts";

/** When somebody wants to be told of a kind of thing by mail. */
export const MAIL_CHOICES = ["at once", "daily digest", "not at all"] as const;
export type MailChoice = (typeof MAIL_CHOICES)[number];

interface KindOfMail {
  /** asks somebody to act, or keeps hands and wafers from harm: sent at once, whatever was chosen */
  essential: boolean;
  delivered: MailChoice;
  /** whoever may not do this in the program is not told: the page behind it would not open for them */
  readers: ProgramPermission;
}

/** Every kind of mail, in the order in which people are asked about them. */
export const KINDS_OF_MAIL: Record<AnnouncementKind, KindOfMail> = {
  "review asked": { essential: true, delivered: "at once", readers: "see the work" },
  "review returned": { essential: true, delivered: "at once", readers: "see the work" },
  incident: { essential: true, delivered: "at once", readers: "see the work" },
  "step stopped": { essential: true, delivered: "at once", readers: "see the work" },
  "lot held": { essential: true, delivered: "at once", readers: "see the work" },
  "sheet released": { essential: false, delivered: "at once", readers: "see released sheets" },
  "sheet superseded": { essential: false, delivered: "at once", readers: "see released sheets" },
  "sheet withdrawn": { essential: false, delivered: "at once", readers: "see released sheets" },
  "assessment out of date": { essential: false, delivered: "daily digest", readers: "see the work" },
  "webhook switched off": { essential: true, delivered: "at once", readers: "keep webhooks" },
};

export const ANNOUNCEMENT_KINDS = Object.keys(KINDS_OF_MAIL) as AnnouncementKind[];

/** Kinds that a person decides about. */
export const CHOSEN_KINDS = ANNOUNCEMENT_KINDS.filter((kind) => !KINDS_OF_MAIL[kind].essential);

/** What a person has chosen; a kind that is not in it goes as delivered. */
export type MailChoices = Partial<Record<AnnouncementKind, MailChoice>>;

/** When a kind is sent to somebody who has chosen so. */
export function choiceFor(kind: AnnouncementKind, chosen: MailChoices): MailChoice {
  const { essential, delivered } = KINDS_OF_MAIL[kind];
  return essential ? delivered : (chosen[kind] ?? delivered);
}
