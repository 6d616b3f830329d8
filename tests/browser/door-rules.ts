import {
  mayInProgram,
  mayOnSite,
  programsWhere,
  type ProgramPermission,
  type SitePermission,
} from "#app/policies/permissions.ts";
import type { Actor, ProgramRole } from "#app/policies/roles.ts";
import type { Role } from "./support.ts";

/** Who comes to a door: somebody of each role in the program that it is of, and somebody who is not signed in. */
export const VISITORS = [
  "nobody",
  "guest",
  "technician",
  "engineer",
  "process owner",
  "shift lead",
  "administrator",
] as const satisfies ("nobody" | Role)[];
type Visitor = (typeof VISITORS)[number];

/** What a visitor is answered. */
export type Door = (visitor: Visitor) => number;

const OWN = "the program of all of them";

/** The actor of a role; site roles are held by guests of the program. */
function actorOf(role: Role): Actor {
  const siteRole = role === "shift lead" || role === "administrator" ? role : null;
  const held: ProgramRole = siteRole ? "guest" : (role as ProgramRole);
  const memberships = [{ programId: OWN, programName: "", programSlug: "", role: held }];
  return { id: "", name: "", email: "", siteRole, memberships };
}

/** Nobody is sent to sign in. */
const SENT_AWAY = 302;
const signedInOnly =
  (answer: (actor: Actor) => number): Door =>
  (visitor) =>
    visitor === "nobody" ? SENT_AWAY : answer(actorOf(visitor));

/** Open to everybody, signed in or not. */
export const everybody =
  (ok = 200): Door =>
  () =>
    ok;
/** The page to sign in, which sends away who is. */
export const atTheDoor = (): Door => (visitor) => (visitor === "nobody" ? 200 : SENT_AWAY);
/** Open to everybody who is signed in. */
export const signedIn = (ok = 200): Door => signedInOnly(() => ok);
/** Of what the site shares. */
export const onSite = (permission: SitePermission, ok = 200): Door =>
  signedInOnly((actor) => (mayOnSite(actor, permission) ? ok : 403));
/** Of no program in particular, for who may in any. */
export const inSome = (permission: ProgramPermission, ok = 200): Door =>
  signedInOnly((actor) => (programsWhere(actor, permission).length > 0 ? ok : 403));
/** Of something of one program: who may not see its work is not told that it is there. */
export const inProgram = (permission: ProgramPermission, ok = 200): Door =>
  signedInOnly((actor) => {
    if (mayInProgram(actor, permission, OWN)) return ok;
    return mayInProgram(actor, "see the work", OWN) ? 403 : 404;
  });
/** Of something that is shown to who may, and to everybody else as if it were not there. */
export const hidden = (permission: ProgramPermission, ok = 200): Door =>
  signedInOnly((actor) => (mayInProgram(actor, permission, OWN) ? ok : 404));
