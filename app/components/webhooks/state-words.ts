import { minuteOf } from "#app/lib/minute-of.ts";
import type { WebhookRow } from "#app/schemas/webhook.ts";

/** How a webhook stands, in words and in the colour of them. */
export function stateWords({
  state,
  offReason,
  makerLeft,
  failures,
  failingSince,
}: Pick<WebhookRow, "state" | "offReason" | "makerLeft" | "failures" | "failingSince">): {
  words: string;
  tone: string;
} {
  if (state === "off")
    return { words: `off${offReason && `: ${offReason}`}`, tone: offReason ? "text-stop" : "text-quiet" };
  if (makerLeft)
    return {
      words: "on, but whoever made it is not of the program any more: nothing is sent",
      tone: "font-semibold text-caution",
    };
  if (failures === 0 || failingSince === null) return { words: "on", tone: "font-semibold text-clear" };
  const attempts = failures === 1 ? "one attempt has" : `${failures} attempts in a row have`;
  return { words: `on, but ${attempts} failed since ${minuteOf(failingSince)}`, tone: "font-semibold text-caution" };
}
