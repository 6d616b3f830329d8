import { BlockList, isIP } from "node:net";
import { z } from "zod";

/** An IPv6 address in its one short form, and an IPv4 address that is written as IPv6 as itself; null for what is no address. */
export function plainAddress(text: string): string | null {
  // The zone of a link-local address says which cable, not which network.
  const address = text.trim().replace(/%.*$/, "");
  if (isIP(address) === 4) return address;
  if (isIP(address) !== 6) return null;
  const short = new URL(`http://[${address}]`).hostname.slice(1, -1);
  const [, high, low] = /^::ffff:([\da-f]{1,4}):([\da-f]{1,4})$/.exec(short) ?? [];
  if (high === undefined || low === undefined) return short;
  const bits = [high, low].map((part) => Number.parseInt(part, 16));
  return bits.flatMap((part) => [part >> 8, part & 255]).join(".");
}

/** Networks as a list to be asked; those of IPv6 and of IPv4 are kept apart by what they are. */
export function networks(list: readonly string[]): BlockList {
  const made = new BlockList();
  for (const network of list) {
    const [address = "", bits] = network.split("/");
    const kind = isIP(address) === 6 ? "ipv6" : "ipv4";
    made.addSubnet(address, Number(bits ?? (kind === "ipv6" ? 128 : 32)), kind);
  }
  return made;
}

/** Whether an address lies in one of the networks; what is no address lies in none. */
export function liesIn(list: BlockList, text: string): boolean {
  const address = plainAddress(text);
  return address !== null && list.check(address, isIP(address) === 6 ? "ipv6" : "ipv4");
}

function isNetwork(text: string): boolean {
  const [, address = "", bits] = /^([^/\s]+)(?:\/(\d{1,3}))?$/.exec(text) ?? [];
  const family = isIP(address);
  return family !== 0 && !address.includes("%") && Number(bits ?? 0) <= (family === 6 ? 128 : 32);
}

/** A setting that names networks, separated by commas: 10.20.0.0/16, ::1, 192.0.2.7. */
export const networkList = z
  .string()
  .default("")
  .transform((text, { addIssue }) => {
    const named = text
      .split(",")
      .map((network) => network.trim())
      .filter(Boolean);
    const wrong = named.find((network) => !isNetwork(network));
    if (wrong === undefined) return networks(named);
    addIssue({
      code: "custom",
      message: `${wrong} is no network: write an address, or 10.20.0.0/16, with commas between`,
    });
    return z.NEVER;
  });
