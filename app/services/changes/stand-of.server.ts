import type { EntityManager } from "@mikro-orm/postgresql";
import { WATCHED, type Watched } from "#app/schemas/changes.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/** As many records as a page has that are watched at once. */
const MOST = 50;

/** What is another text after each change of a record; the database writes a row anew for each of them. */
const STAND: Record<Watched, string> = {
  stack: "select xmin::text as stand from stack where id = ?",
  flow: `select xmin::text || '+' || (select count(*) from assessment where flow_id = flow.id) as stand from flow where id = ?`,
  sheet: "select string_agg(xmin::text, '+' order by id) as stand from sheet_revision where sheet_id = ?",
  job: "select xmin::text as stand from job where id = ?",
};

interface Watch {
  what: Watched;
  id: string;
}

/** @throws 400 for what is no record that is watched */
export function watchedRecords(asked: readonly string[]): Watch[] {
  if (asked.length === 0 || asked.length > MOST)
    throw problem(400, `Say of one to ${MOST} records that you want to hear of, such as of=stack: and its id.`);
  return asked.map((each) => {
    const [kind = "", id] = each.split(":");
    const what = WATCHED.find((known) => known === kind);
    if (!what) throw problem(400, `Changes are told of ${WATCHED.join(", ")}.`);
    return { what, id: idFrom(id, what) };
  });
}

/**
 * How things stand with these records, as one text.
 * @throws 404 where one of them is not there or not for the person
 */
export function standOf(scope: ActorScope, records: readonly Watch[]): Promise<string> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => (await Promise.all(records.map((each) => standOfOne(em, each)))).join(" "));
}

async function standOfOne(em: EntityManager, { what, id }: Watch): Promise<string> {
  const [row] = await em.execute<{ stand: string | null }[]>(STAND[what], [id]);
  if (!row?.stand) throw notFound(what);
  return row.stand;
}
