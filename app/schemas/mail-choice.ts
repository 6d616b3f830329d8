import { z } from "zod";
import { CHOSEN_KINDS, MAIL_CHOICES, type MailChoice, type MailChoices } from "#app/lib/mail/mail-choices.ts";
import type { AnnouncementKind } from "./announcement.ts";

/** One kind of mail on the page where a person chooses. */
export interface MailChoiceRow {
  kind: AnnouncementKind;
  essential: boolean;
  choice: MailChoice;
}

/** The name of a kind's field: a form's names have no spaces. */
export const mailField = (kind: AnnouncementKind): string => kind.replaceAll(" ", "_");

const choice = z.enum(MAIL_CHOICES, "Choose at once, in the daily digest or not at all.").optional();

/** What a form of choices holds; essential kinds are not in it, whatever was sent. */
export const mailChoicesFormSchema = z
  .object(Object.fromEntries(CHOSEN_KINDS.map((kind) => [mailField(kind), choice])))
  .transform((fields): MailChoices =>
    Object.fromEntries(
      CHOSEN_KINDS.flatMap((kind) => {
        const chosen = fields[mailField(kind)];
        return chosen === undefined ? [] : [[kind, chosen]];
      }),
    ),
  );
