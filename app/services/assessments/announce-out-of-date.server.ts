import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import type { AssessmentInput, InputChange } from "#app/schemas/assessment-changes.ts";
import { inScope, type ActorScope, type Scope } from "#app/server/scope.server.ts";
import { actorById } from "../actor.server.ts";
import { raiseEvent } from "../webhooks/raise-event.server.ts";
import { announce } from "../mail/announce.server.ts";
import { outOfDateAmong } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";
import { saversOf } from "./savers.server.ts";

/** Changes that a mail names; the page has them all. */
const NAMED = 5;

/** What this process has told already, so that a look pays only for what is new. The outbox has the last word on it. */
const told = new Set<string>();

/**
 * Tells whoever prepared an assessment, and the process owners of its program, that it is out of date: of each flow the newest one,
 * each once. It looks by itself, program by program and as one of its process owners, because an assessment goes out of date by any
 * save of anything that it rests on, and by a new engine; several saves in a row make one mail.
 */
export async function announceOutOfDate(): Promise<void> {
  const work: Scope = { personId: null, atWork: true, requestId: randomUUID() };
  const owners = await inScope(work, (em) =>
    em.execute<{ program_id: string; person_id: string }[]>("select * from app_process_owners()"),
  );
  for (const program of new Set(owners.map(({ program_id }) => program_id))) {
    const people = owners.filter(({ program_id }) => program_id === program).map(({ person_id }) => person_id);
    const [first] = people;
    const actor = first === undefined ? null : await actorById(first, work.requestId);
    if (!actor) continue;
    const found = await outOfDateIn(program, { actor, requestId: work.requestId });
    for (const { id, slug, preparedBy, onlyBy, ...said } of found) {
      await inScope(work, async (em) => {
        await announce(em, {
          program,
          key: id,
          to: [preparedBy, ...people],
          by: onlyBy,
          announcement: { kind: "assessment out of date", ...said, path: `/assessments/${id}` },
        });
        await raiseEvent(em, {
          program: { id: program, slug, name: said.program },
          event: "assessment.out_of_date",
          key: id,
          about: said.assessment,
          by: null,
          data: { assessment_id: id, assessment: said.assessment, flow: said.flow },
        });
      });
      told.add(id);
    }
  }
}

interface Found {
  id: string;
  program: string;
  slug: string;
  flow: string;
  assessment: string;
  changes: string[];
  more: number;
  preparedBy: string;
  /** who made all of the changes, and so knows; null when several did, or nobody is named */
  onlyBy: string | null;
}

interface NewestRow {
  id: string;
  flow_id: string;
  flow_name: string;
  document_number: number;
  created_at: Date | string;
  created_by_id: string;
  program: string;
  slug: string;
}

/** The newest assessments of a program that are out of date and of which nobody was told yet. */
async function outOfDateIn(program: string, scope: ActorScope): Promise<Found[]> {
  return inScope(scope, async (em) => {
    const newest = await em.execute<NewestRow[]>(
      `select a.*, p.name as program, p.slug
         from (select distinct on (flow_id) id, program_id, flow_id, flow_name, document_number, created_at, created_by_id
                 from assessment where lot is null and program_id = ? order by flow_id, number desc) a
         join program p on p.id = a.program_id
        where not exists (select from mail_outbox m where m.kind = 'assessment out of date' and m.key = a.id::text)`,
      [program],
    );
    const untold = newest.filter(({ id }) => !told.has(id));
    const ids = untold.map(({ id }) => id);
    const stale = await outOfDateAmong(em, scope, ids);
    const found: Found[] = [];
    for (const row of untold) if (stale.has(row.id)) found.push(await describe(em, scope, row));
    return found;
  });
}

async function describe(em: EntityManager, scope: ActorScope, row: NewestRow): Promise<Found> {
  const [stored] = await em.execute<{ input: AssessmentInput; engine_version: string }[]>(
    "select input, engine_version from assessment where id = ?",
    [row.id],
  );
  const { flow, input } = await presentFlow(em, scope, row.flow_id);
  const changes = stored ? inputChanges(stored.input, input) : [];
  const engine =
    stored && stored.engine_version !== ENGINE_VERSION
      ? [`The engine, ${ENGINE_VERSION} in place of ${stored.engine_version}`]
      : [];
  const lines = [...engine, ...new Set(changes.map(inWords))];
  const savers = await saversOf(em, changes, row.flow_id, new Date(row.created_at));
  const [only] = savers;
  return {
    id: row.id,
    program: row.program,
    slug: row.slug,
    flow: flow.name,
    assessment: recordNumber("assessment", row.slug, row.document_number),
    changes: lines.slice(0, NAMED),
    more: Math.max(0, lines.length - NAMED),
    preparedBy: row.created_by_id,
    onlyBy: engine.length === 0 && savers.length === 1 && only !== undefined ? only : null,
  };
}

/** What changed and not its values: a recipe does not leave the site by mail. */
const inWords = ({ subject, property }: InputChange): string => `${subject}: ${property}`;
