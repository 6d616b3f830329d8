import { generateSync } from "otplib";
import type { ActorScope, SessionOfScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, type TestDatabase } from "#tests/db/test-database.ts";

/** The code that an app with the secret shows so many steps from now. */
export const codeIn = (secret: string, steps = 0): string =>
  generateSync({ secret: secret.replaceAll(" ", ""), epoch: Date.now() / 1000 + steps * 30 });

type SignedIn = ActorScope & { session: SessionOfScope | null };

/** Somebody's scope with a session of their own, and its token. */
export async function signedIn(database: TestDatabase, who: string): Promise<{ scope: SignedIn; token: string }> {
  const { startSession, resumeSession } = await import("#app/services/sessions.server.ts");
  const scope = await scopeOfPerson(database, who);
  const { token } = await startSession(scope.actor.id, "a browser", "test");
  const resumed = await resumeSession(token, "test");
  return { scope: { ...scope, session: resumed?.session ?? null }, token };
}

/** Turns somebody's codes on; the code that did so is good once more, so that no test waits for the next. */
export async function codesOn(database: TestDatabase, who: string) {
  const { beginCodes, confirmCodes, ownCodes } = await import("#app/services/codes/own-codes.server.ts");
  await asOwner(database, "delete from one_time_codes using person where person.id = person_id and person.email = ?", [
    `${who}@kestrel-ridge.example`,
  ]);
  const { scope, token } = await signedIn(database, who);
  await beginCodes(scope);
  const secret = (await ownCodes(scope)).waiting?.secret ?? "";
  const confirmed = await confirmCodes(scope, codeIn(secret));
  if ("fault" in confirmed) throw new Error(confirmed.fault);
  await asOwner(database, "update one_time_codes set last_step = null where person_id = ?", [scope.actor.id]);
  const { resumeSession } = await import("#app/services/sessions.server.ts");
  const session = (await resumeSession(token, "test"))?.session ?? null;
  return { scope: { ...scope, session }, token, secret, recovery: confirmed.recovery };
}
