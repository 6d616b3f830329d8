import type { Announcement } from "#app/schemas/announcement.ts";
import { oneLine, severalLines } from "./one-line.ts";

/** What one announcement says, in the words of the pages; figures stay on the page that it leads to. */
export interface AnnouncementWords {
  subject: string;
  /** one sentence: who did what */
  sentence: string;
  /** the record, line by line */
  facts: { label: string; value: string }[];
  /** what somebody wrote, or what changed, under a heading; null where there is nothing */
  said: { heading: string; lines: string[] } | null;
  /** what hands are to mind; null where none are at it */
  mind: string | null;
  /** the words of the link to the page */
  open: string;
}

const PROCEDURES =
  "Your site's procedures and safety rules come first. If a wafer has broken: shards of thin silicon cut, so keep hands and eyes protected.";

/** Words of an announcement. */
export function announcementWords(announcement: Announcement): AnnouncementWords {
  const program = oneLine(announcement.program);
  const words = wordsOf(announcement);
  return {
    ...words,
    subject: `${program}: ${words.subject}`,
    facts: [{ label: "Program", value: program }, ...words.facts],
  };
}

function wordsOf(announcement: Announcement): AnnouncementWords {
  switch (announcement.kind) {
    case "review asked":
    case "review returned":
      return ofReview(announcement);
    case "sheet released":
    case "sheet superseded":
    case "sheet withdrawn":
      return ofSheet(announcement);
    case "assessment out of date":
      return ofAssessment(announcement);
    case "webhook switched off":
      return ofWebhook(announcement);
    case "incident":
    case "step stopped":
    case "lot held":
      return ofFloor(announcement);
  }
}

type Of<Kind extends Announcement["kind"]> = Extract<Announcement, { kind: Kind }>;

function ofReview(announcement: Of<"review asked" | "review returned">): AnnouncementWords {
  const { by, sheet, flow } = names(announcement);
  const facts = [
    { label: "Sheet", value: sheet },
    { label: "Flow", value: flow },
  ];
  if (announcement.kind === "review asked")
    return {
      subject: `review asked for sheet ${sheet}`,
      sentence: `${by} asks you to review sheet ${sheet}. Release it, or return it with a reason.`,
      facts,
      said: saidBy(`${by} writes`, announcement.note),
      mind: null,
      open: "Open the review",
    };
  return {
    subject: `sheet ${sheet} returned`,
    sentence: `${by} has returned sheet ${sheet} to you. It is not released.`,
    facts,
    said: saidBy("Reason", announcement.reason),
    mind: null,
    open: "Open what was returned",
  };
}

function ofSheet(announcement: Of<"sheet released" | "sheet superseded" | "sheet withdrawn">): AnnouncementWords {
  const { by, sheet, flow } = names(announcement);
  const revision = oneLine(announcement.revision);
  const named = `Sheet ${sheet}, revision ${revision},`;
  const facts = [
    { label: "Sheet", value: sheet },
    { label: "Revision", value: revision },
    { label: "Flow", value: flow },
  ];
  switch (announcement.kind) {
    case "sheet released": {
      const changes = announcement.changes.map(oneLine).filter(Boolean);
      return {
        subject: `sheet ${sheet} ${revision} released`,
        sentence: `${named} was released by ${by} and is the one to work from.`,
        facts,
        said: changes.length > 0 ? { heading: "Changed since the last revision", lines: changes } : null,
        mind: "Take older prints out of use.",
        open: "Open the sheet",
      };
    }
    case "sheet superseded": {
      const next = oneLine(announcement.supersededBy);
      return {
        subject: `sheet ${sheet} ${revision} superseded by ${next}`,
        sentence: `${named} is superseded by revision ${next}, which ${by} released.`,
        facts,
        said: null,
        mind: `Do not work from revision ${revision} any more, and take its prints out of use.`,
        open: `Open revision ${next}`,
      };
    }
    case "sheet withdrawn":
      return {
        subject: `sheet ${sheet} ${revision} withdrawn`,
        sentence: `${named} was withdrawn by ${by}. No revision takes its place.`,
        facts,
        said: saidBy("Reason", announcement.reason),
        mind: `Do not work from it any more, take its prints out of use, and ask the process owner before you go on.`,
        open: "Open the sheet",
      };
  }
}

function ofAssessment(announcement: Of<"assessment out of date">): AnnouncementWords {
  const flow = oneLine(announcement.flow);
  const assessment = oneLine(announcement.assessment);
  const { more } = announcement;
  const lines = announcement.changes.map(oneLine);
  return {
    subject: `assessment ${assessment} is out of date`,
    sentence: `Assessment ${assessment} of the flow ${flow} rests on values that have changed since. Run it again before anybody relies on it.`,
    facts: [
      { label: "Assessment", value: assessment },
      { label: "Flow", value: flow },
    ],
    said: { heading: "Changed since", lines: more > 0 ? [...lines, `and ${more} more`] : lines },
    mind: null,
    open: "See what has changed",
  };
}

function ofWebhook(announcement: Of<"webhook switched off">): AnnouncementWords {
  const webhook = oneLine(announcement.webhook);
  return {
    subject: `webhook ${webhook} was switched off`,
    sentence: `The webhook ${webhook} was switched off, because ${announcement.failures} attempts in a row have failed in three days. Nothing is sent to it any more.`,
    facts: [{ label: "Webhook", value: webhook }],
    said: null,
    mind: "Mend the receiver, then switch the webhook on again and send a test. What was not taken can be sent once more from its log.",
    open: "Open the webhook",
  };
}

function ofFloor(announcement: Of<"incident" | "step stopped" | "lot held">): AnnouncementWords {
  const by = oneLine(announcement.by);
  switch (announcement.kind) {
    case "incident": {
      const { lot, step } = { lot: oneLine(announcement.lot), step: oneLine(announcement.step) };
      return {
        subject: `incident with lot ${lot}`,
        sentence: `${by} has reported an incident with lot ${lot} at step ${step}.`,
        facts: [
          { label: "Lot", value: lot },
          { label: "Step", value: step },
        ],
        said: saidBy("What happened", announcement.what),
        mind: PROCEDURES,
        open: "Open the incident",
      };
    }
    case "step stopped": {
      const { flow, step } = { flow: oneLine(announcement.flow), step: oneLine(announcement.step) };
      return {
        subject: `stopped, step ${step}`,
        sentence: `${by} has stopped step ${step}, in the flow ${flow}, for every lot. Nothing goes on there until the stop is cleared.`,
        facts: [
          { label: "Step", value: step },
          { label: "Flow", value: flow },
        ],
        said: saidBy("Reason", announcement.reason),
        mind: PROCEDURES,
        open: "Open the stop",
      };
    }
    case "lot held": {
      const lot = oneLine(announcement.lot);
      return {
        subject: `lot ${lot} is held`,
        sentence: `${by} holds lot ${lot}. It goes nowhere until the hold is cleared; other lots go on.`,
        facts: [{ label: "Lot", value: lot }],
        said: saidBy("Reason", announcement.reason),
        mind: PROCEDURES,
        open: "Open the lot",
      };
    }
  }
}

function names({ by, sheet, flow }: { by: string; sheet: string; flow: string }) {
  return { by: oneLine(by), sheet: oneLine(sheet), flow: oneLine(flow) };
}

function saidBy(heading: string, text: string): AnnouncementWords["said"] {
  const lines = severalLines(text);
  return lines === "" ? null : { heading, lines: lines.split("\n") };
}
