import type { Actor, Role } from "./roles.ts";

/** Whether somebody signs in with one-time codes; `missing`: a role of theirs asks for codes and they have none. */
export type CodesState = "on" | "off" | "missing";

/** Whether somebody holds one of the roles that sign in with one-time codes; who stands in for a process owner acts as one. */
export function needsCodes({ siteRole, memberships }: Actor, codesFor: readonly Role[]): boolean {
  if (siteRole && codesFor.includes(siteRole)) return true;
  return memberships.some(
    ({ role, standsInFor = [] }) =>
      codesFor.includes(role) || (standsInFor.length > 0 && codesFor.includes("process owner")),
  );
}
