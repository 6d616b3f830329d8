import { describe, expect, test } from "vitest";
import { announcementWords } from "#app/lib/mail/announcement-words.ts";
import { ANNOUNCEMENT_KINDS, KINDS_OF_MAIL } from "#app/lib/mail/mail-choices.ts";
import { announcementSchema, type Announcement } from "#app/schemas/announcement.ts";
import { letterHtml } from "#app/services/mail/letter-html.ts";
import { letterText } from "#app/services/mail/letter-text.ts";
import { announcementLetter, digestLetter } from "#app/services/mail/write-letter.ts";
import { ANNOUNCEMENTS } from "#tests/fixtures/announcements.ts";

const WRITTEN = { address: "https://planeward.site.example", unsubscribeToken: "token-of-a-person" };

const SUBJECTS: Record<Announcement["kind"], string> = {
  "review asked": "Tern: review asked for sheet TERN-S001",
  "review returned": "Tern: sheet TERN-S001 returned",
  "sheet released": "Tern: sheet TERN-S001 B released",
  "sheet superseded": "Tern: sheet TERN-S001 A superseded by B",
  "sheet withdrawn": "Tern: sheet TERN-S001 B withdrawn",
  "assessment out of date": "Tern: assessment TERN-A003 is out of date",
  incident: "Tern: incident with lot T-0412",
  "step stopped": "Tern: stopped, step 14, debond",
  "webhook switched off": "Tern: webhook Line board was switched off",
  "lot held": "Tern: lot T-0412 is held",
};

const spaced = (text: string) => text.replace(/\s+/g, " ");
/** What an HTML mail shows, without its markup. */
const shown = (html: string) =>
  spaced(
    html
      .replace(/<style>[^]*?<\/style>/g, "")
      .replace(/<[^>]+>/g, " ")
      .replaceAll("&#39;", "'"),
  );

test("there is a letter for every kind of mail", () => {
  expect(ANNOUNCEMENTS.map(({ kind }) => kind).toSorted()).toEqual(ANNOUNCEMENT_KINDS.toSorted());
});

describe.each(ANNOUNCEMENTS.map((announcement) => ({ kind: announcement.kind, announcement })))(
  "$kind",
  ({ kind, announcement }) => {
    const letter = announcementLetter(announcement, WRITTEN);
    const text = letterText(letter);
    const html = letterHtml(letter);

    test("says what happened, as text and as HTML", () => {
      expect(letter.subject).toBe(SUBJECTS[kind]);
      const { sentence, facts, said, mind } = announcementWords(announcement);
      for (const words of [sentence, ...facts.map(({ value }) => value), ...(said?.lines ?? []), mind ?? ""]) {
        expect(spaced(text)).toContain(spaced(words));
        expect(shown(html)).toContain(spaced(words));
      }
    });

    test("leads to its page, and nowhere else but to the choices of mail", () => {
      const links = [...html.matchAll(/(?:href|src)="([^"]+)"/g)].map(([, link]) => link);
      const stop = KINDS_OF_MAIL[kind].essential
        ? []
        : [`https://planeward.site.example/unsubscribe/token-of-a-person?kind=${encodeURIComponent(kind)}`];
      expect(links).toEqual([
        "cid:mark@planeward",
        `https://planeward.site.example${announcement.path}`,
        "https://planeward.site.example/preferences/mail",
        ...stop,
      ]);
      for (const link of links.slice(1)) expect(text).toContain(`\n${link}\n`);
    });

    test("has no line of text wider than a terminal, but for addresses", () => {
      const wide = text.split("\n").filter((line) => line.length > 78 && !line.startsWith("https://"));
      expect(wide).toEqual([]);
    });
  },
);

test("floor mails tell whose procedures come first, and that shards cut", () => {
  for (const announcement of ANNOUNCEMENTS.filter(({ kind }) =>
    ["incident", "step stopped", "lot held"].includes(kind),
  ))
    expect(spaced(letterText(announcementLetter(announcement, WRITTEN)))).toMatch(
      /site's procedures and safety rules come first.*shards of thin silicon cut/,
    );
});

test("a digest has everything of the day, each with its own link", () => {
  const letter = digestLetter(ANNOUNCEMENTS.slice(2, 6), WRITTEN);
  expect(letter.subject).toBe("Planeward, the day's digest: 4 things");
  const text = letterText(letter);
  for (const { kind } of ANNOUNCEMENTS.slice(2, 6)) expect(spaced(text)).toContain(SUBJECTS[kind]);
  expect(text).toContain("https://planeward.site.example/unsubscribe/token-of-a-person?kind=digest");
  expect(letterHtml(letter).match(/<h1/g)).toHaveLength(4);
});

describe("hostile names", () => {
  const hostile: Announcement = {
    kind: "lot held",
    program: "Tern\r\nBcc: everybody@site.example",
    by: `<script>alert("1")</script>`,
    lot: `T\u0000-1"><img src=x onerror=alert(1)>\u202egnp`,
    reason: "first\r\n.\r\nRCPT TO:<x@site.example>\u2028</p><a href='https://elsewhere.example'>here</a>",
    path: "/lots/1",
  };
  const letter = announcementLetter(hostile, WRITTEN);

  test("end no line of the subject", () => {
    expect(letter.subject).toBe(`Tern Bcc: everybody@site.example: lot T -1"><img src=x onerror=alert(1)>gnp is held`);
  });

  test("are text in the HTML, never markup", () => {
    const html = letterHtml(letter);
    expect(html).not.toMatch(/<script|<img src=x|elsewhere\.example'>/);
    expect(html).toContain("&lt;script&gt;alert(&quot;1&quot;)&lt;/script&gt;");
    expect([...html.matchAll(/href="([^"]+)"/g)].map(([, link]) => link)).toEqual([
      "https://planeward.site.example/lots/1",
      "https://planeward.site.example/preferences/mail",
    ]);
  });

  test("lead to no other site", () => {
    for (const path of ["//elsewhere.example", "https://elsewhere.example", "/a\nb", "/\\elsewhere.example", "x"])
      expect(announcementSchema.safeParse({ ...hostile, path }).success).toBe(false);
  });
});
