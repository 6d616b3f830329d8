import { notFound } from "#app/server/problem.server.ts";

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[1-8][0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/i;

/** Whether a text can be an id at all. */
export const isUuid = (text: string): boolean => UUID.test(text);

/** An id from an address. Anything that is not one names nothing, and must not reach the database as if it could. */
export function idFrom(text: string | undefined, what: string): string {
  if (!text || !isUuid(text)) throw notFound(what);
  return text.toLowerCase();
}
