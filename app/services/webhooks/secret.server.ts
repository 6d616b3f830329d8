import { randomBytes } from "node:crypto";
import { seal, unseal } from "#app/server/sealed-secret.server.ts";

/** By what the secret of a webhook is known for one of ours, where somebody finds it in a file. */
const PREFIX = "pwh_";

const purposeOf = (webhookId: string) => `webhook ${webhookId}`;

/** A new secret of a webhook, and the same as it is kept. */
export function newSecret(webhookId: string): { secret: string; sealedSecret: string } {
  const secret = `${PREFIX}${randomBytes(32).toString("base64url")}`;
  return { secret, sealedSecret: seal(secret, purposeOf(webhookId)) };
}

/** @throws where it was sealed under another secret of the environment */
export function readSecret(webhookId: string, sealedSecret: string): string {
  const secret = unseal(sealedSecret, purposeOf(webhookId));
  if (secret === null)
    throw new Error("The secret of a webhook does not open: SECRET_KEY is not the one that it was made with.");
  return secret;
}
