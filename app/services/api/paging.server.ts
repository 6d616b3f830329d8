import type { EntityManager, EntityName, FilterQuery, Loaded } from "@mikro-orm/postgresql";
import { z } from "zod";
import { isUuid } from "../uuid.server.ts";
import { ApiRefused } from "./refused.server.ts";

const MOST = 100;

/** What every list can be asked. */
export const pageQuery = {
  limit: z
    .string()
    .regex(/^\d{1,3}$/, "Give a whole number from 1 to 100.")
    .transform(Number)
    .pipe(z.number().min(1, "Give a whole number from 1 to 100.").max(MOST, "Give a whole number from 1 to 100."))
    .optional()
    .describe("Most records of a page, 1 to 100; 50 where nothing is said."),
  cursor: z.string().max(200).optional().describe("`next_cursor` of the page before."),
};

/** A page of a list, the newest first; `next_cursor` is null on the last one. */
export const pageOf = <Row extends z.ZodType>(row: Row) =>
  z.object({ data: z.array(row), next_cursor: z.string().nullable() });

interface Listed {
  id: string;
}

interface Cursor {
  at: Date;
  id: string;
}

/**
 * A page of records, the newest first, from where the cursor stands: what is added meanwhile comes before it, so that nothing is told
 * twice or left out.
 * @param column the time that they are ordered by, which never changes
 */
export async function keysetPage<Entity extends Listed, Hint extends string = never>(
  em: EntityManager,
  entity: EntityName<Entity>,
  where: FilterQuery<Entity>,
  column: keyof Entity & string,
  { limit = 50, cursor }: { limit?: number | undefined; cursor?: string | undefined },
  { populate = [] }: { populate?: readonly Hint[] } = {},
): Promise<{ rows: Loaded<Entity, Hint>[]; next_cursor: string | null }> {
  const from = cursor === undefined ? null : readCursor(cursor);
  const after = from && {
    $or: [{ [column]: { $lt: from.at } }, { [column]: from.at, id: { $lt: from.id } }],
  };
  const found = await em.find(
    entity,
    { $and: [where, ...(after ? [after] : [])] } as FilterQuery<Entity>,
    { populate, orderBy: [{ [column]: "desc" }, { id: "desc" }], limit: limit + 1 } as never,
  );
  const rows = found.slice(0, limit) as unknown as (Loaded<Entity, Hint> & Entity)[];
  const last = found.length > limit ? rows.at(-1) : undefined;
  return { rows, next_cursor: last ? writeCursor({ at: last[column] as Date, id: last.id }) : null };
}

const writeCursor = ({ at, id }: Cursor) => Buffer.from(`${at.toISOString()} ${id}`).toString("base64url");

function readCursor(text: string): Cursor {
  const [at = "", id = ""] = Buffer.from(text, "base64url").toString("utf8").split(" ");
  const time = new Date(at);
  if (Number.isNaN(time.getTime()) || time.toISOString() !== at || !isUuid(id))
    throw new ApiRefused(400, "Something in the query is wrong.", [
      { pointer: "/cursor", detail: "is none. Send next_cursor of the page before as it came." },
    ]);
  return { at: time, id };
}
