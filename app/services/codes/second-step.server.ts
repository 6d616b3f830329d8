import { countAttempt, forgiveAttempt } from "#app/server/rate-limit.server.ts";
import { inScope } from "#app/server/scope.server.ts";
import { startSession, type StartedSession } from "../sessions.server.ts";
import { noteAttempt } from "../sign-in.server.ts";
import { whoIsHalfSignedIn } from "./half-signed-in.server.ts";
import { CODE_REFUSED, takeCode } from "./take-code.server.ts";

/** From where the code comes. */
interface Sender {
  address: string;
  userAgent: string;
  requestId: string;
}

/** `over`: the first step does not count any more. */
type SecondStep =
  | { outcome: "over" }
  | { outcome: "too many"; sentence: string }
  | { outcome: "refused"; sentence: string }
  | { outcome: "signed in"; session: StartedSession };

/** Ends signing in with a code: a new session for who has given their password just now. Guesses are counted before they are made. */
export async function takeSecondStep(held: string, code: string, sender: Sender): Promise<SecondStep> {
  const { address, userAgent, requestId } = sender;
  const person = await whoIsHalfSignedIn(held, requestId);
  if (!person) return { outcome: "over" };
  const counted = [
    ["account from address", `code of ${person.id} ${address}`],
    ["codes", person.id],
    ["address", address],
  ] as const;
  if (!(await countAttempt(counted)))
    return {
      outcome: "too many",
      sentence: "Too many attempts to sign in have failed. Wait an hour, then try again.",
    };
  const good = await inScope({ personId: person.id, atTheDoor: true, requestId }, (em) =>
    takeCode(em, person.id, code),
  );
  await noteAttempt(person.id, good, requestId);
  if (!good) return { outcome: "refused", sentence: CODE_REFUSED };
  await forgiveAttempt(counted);
  return { outcome: "signed in", session: await startSession(person.id, userAgent, requestId) };
}
