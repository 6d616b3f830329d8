import { environment } from "#app/server/environment.server.ts";
import { liesIn } from "#app/server/networks.server.ts";
import { isPublicAddress } from "./public-address.ts";
import { postTo } from "./send-request.ts";

/** Whether a webhook may be sent to an address: one of the public internet, or of a network that the operator names. */
export const mayReach = (address: string): boolean =>
  isPublicAddress(address) || liesIn(environment.WEBHOOK_NETWORKS, address);

/** Posts as the operator allows it. */
export const postWebhook = (posted: { address: string; headers: Record<string, string>; body: string }) =>
  postTo({ ...posted, mayReach });
