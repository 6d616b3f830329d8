import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { endedNotice, markWords, statusWord, type RevisionStanding } from "./revision-words.ts";

/** The paper of a released revision as it is handed out once it has ended: the same words, and across them that it must not be used. */
export function markedDocument(document: SheetDocument, standing: RevisionStanding): SheetDocument {
  const notice = endedNotice(standing);
  return {
    ...document,
    mark: markWords(standing),
    titleBlock: { ...document.titleBlock, status: statusWord(standing) },
    hands: { ...document.hands, notices: [...(notice === null ? [] : [notice]), ...document.hands.notices] },
  };
}
