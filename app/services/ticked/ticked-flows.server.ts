import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { TickedRow, TickedRows } from "#app/lib/ticked-rows.ts";
import { mayInProgram, programsWhere } from "#app/policies/permissions.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { assessWithin } from "../assessments/assessments.server.ts";
import { outOfDateAmong } from "../assessments/out-of-date.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";

const RUN = "run assessments";

/** What would become of each of the flows that are ticked: only those are assessed again that something has changed for. */
export async function tickedFlows(scope: ActorScope, ids: readonly string[]): Promise<TickedRows> {
  requireInSomeProgram(scope, RUN);
  return inScope(scope, async (em) => {
    const rows = await flowRows(em, scope, ids);
    return { rows, hidden: ids.length - rows.length };
  });
}

async function flowRows(em: EntityManager, scope: ActorScope, ids: readonly string[]): Promise<TickedRow[]> {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  const flows = await em.find(Flow, { id: { $in: [...ids] }, program: { $in: programs } }, { populate: ["program"] });
  const assessments = await em.find(
    Assessment,
    { flow: { $in: flows.map(({ id }) => id) }, lotNumber: 0 },
    { fields: ["id", "flow", "number"], orderBy: { number: "asc" } },
  );
  // Later ones overwrite earlier ones, so the newest of each flow is left.
  const newest = new Map(assessments.map((assessment) => [assessment.flow.id, assessment]));
  const stale = await outOfDateAmong(
    em,
    scope,
    [...newest.values()].map(({ id }) => id),
  );
  return ids.flatMap((id) =>
    flows
      .filter((flow) => flow.id === id)
      .map(({ name, program, version }): TickedRow => {
        const latest = newest.get(id);
        const revision = latest && revisionLetters(latest.number);
        const row = { id, name, program: program.name, path: `/flows/${id}`, version };
        if (!mayInProgram(scope.actor, RUN, program.id))
          return {
            ...row,
            state: "left",
            words: `Your role in ${program.name} may not ${RUN}. Ask its process owner.`,
          };
        if (!latest) return { ...row, state: "to do", words: "Not assessed yet." };
        if (stale.has(latest.id)) return { ...row, state: "to do", words: `Revision ${revision} is out of date.` };
        return {
          ...row,
          state: "left",
          words: `Revision ${revision} is up to date: nothing that it rests on has changed.`,
        };
      }),
  );
}

/**
 * Assesses those of the flows that are not up to date, one after the other, each in a transaction of its own: an assessment that is
 * stored stays, whatever comes of the next flow. Whether a flow is up to date is asked when its turn comes, so that the same flows
 * asked for twice at once get one revision, not two.
 */
export async function assessTicked(scope: ActorScope, ids: readonly string[]): Promise<TickedRows> {
  requireInSomeProgram(scope, RUN);
  const rows: TickedRow[] = [];
  for (const id of ids) rows.push(...(await inScope(scope, (em) => assessed(em, scope, id))));
  return { rows, hidden: ids.length - rows.length };
}

/** The flow's row with what was done; none when the flow is gone, or not the person's to see. */
async function assessed(em: EntityManager, scope: ActorScope, id: string): Promise<TickedRow[]> {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`ticked flow ${id}`]);
  const rows = await flowRows(em, scope, [id]);
  return Promise.all(rows.map((row) => (row.state === "to do" ? assessedRow(em, scope, row) : row)));
}

async function assessedRow(em: EntityManager, scope: ActorScope, row: TickedRow): Promise<TickedRow> {
  const ran = await assessWithin(em, scope, row.id);
  if (ran.outcome === "not computable") {
    const where = ran.step === null ? "" : `Step ${ran.step}: `;
    return { ...row, state: "left", words: `It cannot be computed. ${where}${ran.reason}` };
  }
  const { number, outcome } = await em.findOneOrFail(Assessment, { id: ran.id }, { fields: ["number", "outcome"] });
  return {
    ...row,
    path: `/assessments/${ran.id}`,
    state: "done",
    words: `Revision ${revisionLetters(number)}: ${outcome}.`,
  };
}
