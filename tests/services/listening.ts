import { WEBHOOK_EVENT_NAMES } from "#app/schemas/webhook.ts";
import { asOwner, type TestDatabase } from "#tests/db/test-database.ts";

/** Puts a webhook of a demo person into a program, which hears of everything and is never sent to. */
export const listen = (database: TestDatabase, account: string, slug: string) =>
  asOwner(
    database,
    `insert into webhook (id, program_id, name, address, events, sealed_secret, secret_made_at, state, off_reason, failures, created_at,
                          created_by_id)
       select gen_random_uuid(), program.id, 'Listening', 'https://receiver.example/', ?::jsonb, '', now(), 'on', '', 0, now(), person.id
         from program, person where program.slug = ? and person.email = ?`,
    [JSON.stringify(WEBHOOK_EVENT_NAMES), slug, `${account}@kestrel-ridge.example`],
  );

/** What webhooks were told of something, by the id of its row. */
export async function heardOf(database: TestDatabase, key: string): Promise<object[]> {
  const rows = await asOwner<{ body: string }>(
    database,
    "select body from webhook_delivery where key = ? order by created_at, id",
    [key],
  );
  return rows.map(({ body }) => JSON.parse(body) as object);
}
