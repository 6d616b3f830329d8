import type { BlockList } from "node:net";
import { z } from "zod";
import { liesIn, networkList, plainAddress } from "./networks.server.ts";

/** Whose word about where a request came from is believed: so many proxies in a row, or those in some networks. */
type TrustedProxies = number | BlockList;

/** A setting that says how many proxies stand in front, or where they are: 1, or 10.0.0.5, 10.1.0.0/24. Nobody when not set. */
export const trustedProxies = z
  .string()
  .default("0")
  .transform((text, { addIssue }): TrustedProxies => {
    if (/^\s*\d\s*$/.test(text)) return Number(text);
    const parsed = networkList.safeParse(text);
    if (parsed.success) return parsed.data;
    addIssue({
      code: "custom",
      message: `write how many proxies stand in front, or where: ${parsed.error.issues[0]?.message}`,
    });
    return z.NEVER;
  });

/**
 * The address that a request came from. Each proxy adds to the right of X-Forwarded-For whom it was asked by; what stands further
 * left than the trusted ones have written is whatever the client made up.
 * @param peer who is connected to this process
 * @param forwarded the header, as it came
 */
export function clientAddress(peer: string, forwarded: string | undefined, trusted: TrustedProxies): string {
  const said = (forwarded ?? "").split(",").map((entry) => entry.trim());
  let address = plainAddress(peer) ?? peer;
  for (let passed = 0; said.length > 0; passed++) {
    const believed = typeof trusted === "number" ? passed < trusted : liesIn(trusted, address);
    const next = believed ? addressIn(said.pop() ?? "") : null;
    if (next === null) break;
    address = next;
  }
  return address;
}

/** An address as proxies write it: alone, with a port, or an IPv6 address in brackets. */
function addressIn(entry: string): string | null {
  const [, bracketed] = /^\[([^\]]+)\](?::\d+)?$/.exec(entry) ?? [];
  const [, withPort] = /^([\d.]+):\d+$/.exec(entry) ?? [];
  return plainAddress(bracketed ?? withPort ?? entry);
}
