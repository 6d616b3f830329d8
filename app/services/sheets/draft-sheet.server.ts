import { legAnswer, type LegsView } from "#app/lib/assessment-leg.ts";
import { DRAFT_FACTS } from "#app/lib/sheet/sheet-facts.ts";
import { sheetDocumentOf } from "#app/lib/sheet/sheet-document-of.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { sheetSourceOf } from "./sheet-source.server.ts";

export interface DraftSheet {
  assessmentId: string;
  document: SheetDocument;
  /** the slots that it is for and those of the other sheets; null where the flow does not part by slot */
  legs: LegsView | null;
}

/**
 * The sheet that an assessment would become, as a draft.
 * @param askedLeg number of the leg, as the address gives it, of a flow that parts by slot; the worst when it names none
 */
export async function draftSheet(
  scope: ActorScope,
  assessmentId: string | undefined,
  askedLeg: string | null,
): Promise<DraftSheet> {
  const sources = await inScope(scope, (em) => sheetSourceOf(em, scope, assessmentId));
  const [first] = sources;
  if (!first) throw new Error("an assessment makes at least one sheet");
  const { legs } = legAnswer(first.result, askedLeg);
  const source = sources.find(({ leg }) => leg === (legs?.chosen.number ?? null)) ?? first;
  return { assessmentId: source.head.id, document: sheetDocumentOf(source, DRAFT_FACTS), legs };
}
