import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { Deviation } from "#app/db/entities/deviation.ts";
import { SheetDocument } from "#app/db/entities/sheet-document.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import { sentenceCase } from "#app/lib/assessment-steps.ts";
import { floorSteps } from "#app/lib/floor/floor-steps.ts";
import { coveredBy } from "../sheets/release-case.server.ts";

/**
 * What a released revision says, leg by leg: its frozen papers, the assessment that it rests on, and which of the findings that block
 * are let run by a deviation that is in force now.
 */
export async function sheetParts(em: EntityManager, revision: { id: string; assessment: { id: string } }) {
  const documents = await em.find(SheetDocument, { revision: revision.id }, { orderBy: { leg: "asc" } });
  const { result } = await em.findOneOrFail(Assessment, { id: revision.assessment.id });
  const deviations = await em.find(Deviation, { revision: revision.id, signedAt: { $ne: null } });
  const covered = coveredBy(deviations);
  const legs = result.legs ?? [];
  return {
    result,
    parts: documents.map(({ leg, document }) => ({
      leg,
      document,
      name: leg === 0 ? "All slots" : sentenceCase(slotsInWords(legs[leg - 1]?.slots ?? [])),
    })),
    /** the steps of one leg */
    steps: (leg: number) => floorSteps(result, leg, covered),
  };
}
