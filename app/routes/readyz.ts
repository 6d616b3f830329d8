import { databaseAnswers } from "#app/services/readiness.server.ts";

/** Ready: the database answers too. */
export async function loader() {
  const ready = await databaseAnswers();
  return new Response(ready ? "ready\n" : "the database does not answer\n", {
    status: ready ? 200 : 503,
    headers: { "Content-Type": "text/plain", "Cache-Control": "no-store" },
  });
}
