import type { AnnouncementKind } from "#app/schemas/announcement.ts";

/** What each kind of mail is about, as people choose it. */
export const KIND_WORDS: Record<AnnouncementKind, string> = {
  "review asked": "A review is asked of you",
  "review returned": "What you prepared is returned",
  incident: "An incident is reported",
  "step stopped": "A step is stopped",
  "lot held": "A lot is held",
  "sheet released": "A sheet is released",
  "sheet superseded": "A sheet is superseded",
  "sheet withdrawn": "A sheet is withdrawn",
  "assessment out of date": "An assessment is out of date",
  "webhook switched off": "A webhook of yours was switched off",
};
