import { isIP } from "node:net";
import { liesIn, networks, plainAddress } from "#app/server/networks.server.ts";

/**
 * What is no address of a host of the public internet: the registries of special-purpose addresses that IANA keeps by RFC 6890, as they
 * stood in 2025, and multicast. Link-local holds the address at which clouds answer a machine about itself; the last one of the list
 * does so in public space.
 */
const SPECIAL = networks([
  "0.0.0.0/8",
  "10.0.0.0/8",
  "100.64.0.0/10",
  "127.0.0.0/8",
  "169.254.0.0/16",
  "172.16.0.0/12",
  "192.0.0.0/24",
  "192.0.2.0/24",
  "192.31.196.0/24",
  "192.52.193.0/24",
  "192.88.99.0/24",
  "192.168.0.0/16",
  "192.175.48.0/24",
  "198.18.0.0/15",
  "198.51.100.0/24",
  "203.0.113.0/24",
  "224.0.0.0/4",
  "240.0.0.0/4",
  "168.63.129.16/32",
  // Protocol assignments, Teredo and overlay identifiers; documentation; addresses with an IPv4 address inside.
  "2001::/23",
  "2001:db8::/32",
  "2002::/16",
  "2620:4f:8000::/48",
  "3fff::/20",
]);

/** All that has been given to hosts of the public internet so far. */
const GLOBAL_UNICAST = networks(["2000::/3"]);

/** Whether an address is one of the public internet. What is no address is not. */
export function isPublicAddress(text: string): boolean {
  const address = plainAddress(text);
  if (address === null || liesIn(SPECIAL, address)) return false;
  return isIP(address) === 4 || liesIn(GLOBAL_UNICAST, address);
}
