import { announcementWords } from "#app/lib/mail/announcement-words.ts";
import { KIND_WORDS } from "#app/lib/mail/kind-words.ts";
import { KINDS_OF_MAIL } from "#app/lib/mail/mail-choices.ts";
import type { Announcement } from "#app/schemas/announcement.ts";
import type { Letter, LetterPart } from "./letter.ts";

/** What a mail is written with besides what it tells. */
interface Written {
  /** the beginning of every link */
  address: string;
  /** of the reader, for the link that stops a kind of mail */
  unsubscribeToken: string;
}

/** Where a kind of mail is stopped without signing in; 'digest' stops all that goes into it. */
export function unsubscribeAddress(
  { address, unsubscribeToken }: Written,
  kind: Announcement["kind"] | "digest",
): string {
  return `${address}/unsubscribe/${unsubscribeToken}?kind=${encodeURIComponent(kind)}`;
}

/** The mail that tells one thing. */
export function announcementLetter(announcement: Announcement, written: Written): Letter {
  const part = partOf(announcement, written.address);
  const about = KIND_WORDS[announcement.kind];
  const choices = { words: "Choose what Planeward mails you", address: `${written.address}/preferences/mail` };
  const { essential } = KINDS_OF_MAIL[announcement.kind];
  return {
    subject: announcementWords(announcement).subject,
    opening: null,
    parts: [part],
    foot: essential
      ? {
          why: `You get this mail because somebody waits for you or hands may be at risk ('${about}'). It always comes at once.`,
          links: [choices],
        }
      : {
          why: `You get this mail because you work with this program ('${about}').`,
          links: [
            choices,
            {
              words: "Stop mail of this kind",
              address: unsubscribeAddress(written, announcement.kind),
            },
          ],
        },
  };
}

/** The mail of a day: everything that waited for it, the oldest first. */
export function digestLetter(announcements: readonly Announcement[], written: Written): Letter {
  const count = announcements.length === 1 ? "one thing" : `${announcements.length} things`;
  return {
    subject: `Planeward, the day's digest: ${count}`,
    opening: `Since the last digest there ${announcements.length === 1 ? "was" : "were"} ${count} that you wanted to read of once a day.`,
    parts: announcements.map((announcement) => partOf(announcement, written.address)),
    foot: {
      why: "You get this mail once a day, when there is something for it.",
      links: [
        { words: "Choose what Planeward mails you", address: `${written.address}/preferences/mail` },
        { words: "Stop the digest", address: unsubscribeAddress(written, "digest") },
      ],
    },
  };
}

function partOf(announcement: Announcement, address: string): LetterPart {
  const { subject, sentence, facts, said, mind, open } = announcementWords(announcement);
  return { heading: subject, sentence, facts, said, mind, link: { words: open, address: address + announcement.path } };
}
