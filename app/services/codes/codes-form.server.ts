import { postedForm } from "#app/server/form.server.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { ProofFault } from "#app/schemas/proof.ts";
import { proveAgain } from "../people/recent-proof.server.ts";
import { beginCodes, confirmCodes, renewRecoveryCodes, turnCodesOff } from "./own-codes.server.ts";

/** What a form about one's own codes comes to. */
type Taken =
  | "begun"
  | "off"
  | { intent: string; recovery: string[] }
  | { intent: string; codeFault: string }
  | { intent: string; proofFault: ProofFault };

/** Takes a form about the person's own one-time codes. */
export async function takeCodesForm(request: Request, scope: ActorScope): Promise<Taken> {
  const formData = await postedForm(request);
  const intent = String(formData.get("intent"));
  const proof = postedProof(formData);
  if (intent === "off") {
    const proofFault = await turnCodesOff(scope, proof);
    return proofFault === null ? "off" : { intent, proofFault };
  }
  if (!["begin", "confirm", "renew"].includes(intent))
    throw problem(400, "This form could not be read. Open the page again and send it once more.");
  const proven = await proveAgain(scope, proof);
  if (proven.fault !== null) return { intent, proofFault: proven.fault };
  if (intent === "renew") return { intent, recovery: await renewRecoveryCodes(proven.scope) };
  if (intent === "begin") {
    await beginCodes(proven.scope);
    return "begun";
  }
  const code = formData.get("code");
  const confirmed = await confirmCodes(proven.scope, typeof code === "string" ? code : "");
  return "fault" in confirmed ? { intent, codeFault: confirmed.fault } : { intent, ...confirmed };
}
