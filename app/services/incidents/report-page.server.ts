import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import { Lot } from "#app/db/entities/lot.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { sentenceCase } from "#app/lib/assessment-steps.ts";
import { numberedLegs } from "#app/lib/step-prediction.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { ReportGround } from "#app/schemas/incident.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { isUuid } from "../uuid.server.ts";

export interface ReportPage {
  /** assessments to choose from; asked for while none is chosen */
  choices: { value: string; label: string }[];
  ground: ReportGround | null;
}

const MOST_LOTS = 200;

/**
 * What the form of a report shows: first the flow, then its steps and the lots of the program.
 * @throws 403 for a role that may not report anywhere, 404 for an assessment that is not the person's own
 */
export async function reportPage(scope: ActorScope, search: URLSearchParams): Promise<ReportPage> {
  requireInSomeProgram(scope, "report incidents");
  return inScope(scope, async (em) => {
    const asked = search.get("assessment");
    if (!asked) return { choices: await choicesOf(em, scope), ground: null };
    const assessment = await findAssessment(em, scope, asked);
    const { program, result } = assessment;
    requireInProgram(scope, "report incidents", program.id, "assessment");
    const legs = numberedLegs(result);
    const given = await givenPlace(em, program.id, search);
    return {
      choices: [],
      ground: {
        assessment: {
          id: assessment.id,
          number: recordNumber("assessment", program.slug, assessment.documentNumber),
          flow: assessment.flowName,
          program: program.name,
          lot: assessment.lot?.name ?? null,
        },
        legs: legs
          .filter(({ leg }) => leg > 0)
          .map(({ leg, slots }) => ({ value: String(leg), label: sentenceCase(slotsInWords(slots)) })),
        steps: result.steps.map(({ number, title }) => ({ value: String(number), label: `Step ${number}, ${title}` })),
        lots: await lotNames(em, program.id),
        given: {
          step: numberIn(search, "step"),
          leg: numberIn(search, "leg") || String(legs[0]?.leg ?? 0),
          lot: given.lot || (assessment.lot?.name ?? ""),
          wafer: given.wafer,
          id: randomUUID(),
          occurredAt: new Date().toISOString().slice(0, 16).replace("T", " "),
        },
      },
    };
  });
}

const numberIn = (search: URLSearchParams, name: string) => {
  const text = search.get(name) ?? "";
  return /^\d{1,3}$/.test(text) ? text : "";
};

/** Lot and wafer of the address, by id or by name. */
async function givenPlace(em: EntityManager, program: string, search: URLSearchParams) {
  const textOf = (name: string) => (search.get(name) ?? "").replaceAll("\0", "").trim().slice(0, 80);
  const [lot, wafer] = [textOf("lot"), textOf("wafer")];
  const known = isUuid(wafer) ? await em.findOne(Wafer, { id: wafer, program }, { populate: ["lot"] }) : null;
  const ofLot = isUuid(lot) ? await em.findOne(Lot, { id: lot, program }) : (known?.lot ?? null);
  return {
    lot: ofLot?.name ?? (isUuid(lot) ? "" : lot),
    wafer: known?.name ?? (isUuid(wafer) ? "" : wafer),
  };
}

async function lotNames(em: EntityManager, program: string): Promise<string[]> {
  const lots = await em.find(Lot, { program }, { orderBy: { createdAt: "desc" }, limit: MOST_LOTS, fields: ["name"] });
  return lots.map(({ name }) => name);
}

/** The newest assessment of each flow of the programs in which the person may report. */
async function choicesOf(em: EntityManager, { actor }: ActorScope): Promise<ReportPage["choices"]> {
  const programs = programsWhere(actor, "report incidents").map(({ programId }) => programId);
  const rows = await em.execute<{ id: string; name: string; program: string; slug: string; document: number }[]>(
    `select * from (
       select distinct on (a.flow_id) a.id, a.flow_name as name, p.name as program, p.slug, a.document_number as document
         from assessment a join program p on p.id = a.program_id
        where a.lot is null and a.program_id = any(array[?]::uuid[])
        order by a.flow_id, a.number desc) newest
      order by program, name`,
    [programs],
  );
  return rows.map(({ id, name, program, slug, document }) => ({
    value: id,
    label: `${program}: ${name}, ${recordNumber("assessment", slug, document)}`,
  }));
}
