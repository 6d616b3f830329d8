import type { Actor } from "./roles.ts";

/** What a person is, in one word for the top bar: the site role, else the strongest program role. */
export function roleInWords(actor: Actor): string {
  if (actor.siteRole) return actor.siteRole;
  const order = ["process owner", "engineer", "technician", "guest"] as const;
  return order.find((role) => actor.memberships.some((held) => held.role === role)) ?? "no program yet";
}
