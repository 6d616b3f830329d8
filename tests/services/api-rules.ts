import {
  mayInProgram,
  mayOnSite,
  programsWhere,
  type ProgramPermission,
  type SitePermission,
} from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";

/** What an operation answers somebody with a token of one program, about something of that program. */
export type OperationRule = (actor: Actor, program: string) => number;

const onSite =
  (permission: SitePermission, ok = 200): OperationRule =>
  (actor) =>
    mayOnSite(actor, permission) ? ok : 403;
const inSome =
  (permission: ProgramPermission, ok = 200): OperationRule =>
  (actor) =>
    programsWhere(actor, permission).length > 0 ? ok : 403;
/** Who may not see the work of the program is not told that something is there; a program in a body is refused as a fault of it. */
const inProgram =
  (permission: ProgramPermission, ok = 200, unknown: 404 | 422 = 404): OperationRule =>
  (actor, program) => {
    if (mayInProgram(actor, permission, program)) return ok;
    return mayInProgram(actor, "see the work", program) ? 403 : unknown;
  };

/** Who may do what by the API. An operation without a line here fails the tests. */
export const OPERATION_RULES: Record<string, OperationRule> = {
  estimate: onSite("see the library"),
  listFilms: onSite("see the library"),
  getFilm: onSite("see the library"),
  listSilicon: onSite("see the library"),
  listStacks: inSome("see the work"),
  getStack: inProgram("see the work"),
  createStack: inProgram("edit stacks and flows", 201, 422),
  changeStack: inProgram("edit stacks and flows"),
  listFlows: inSome("see the work"),
  getFlow: inProgram("see the work"),
  listAssessments: inSome("see the work"),
  getAssessment: inProgram("see the work"),
  listSheetRevisions: inSome("see released sheets"),
  getSheetRevision: inProgram("see released sheets"),
  listScans: inSome("see the work"),
  // The same file again is known.
  uploadScan: inProgram("upload scans"),
  getScan: inProgram("see the work"),
  getJob: inProgram("see the work"),
  listStresses: inSome("see the work"),
  listLots: inSome("see the work"),
  getLot: inProgram("see the work"),
  createLot: inProgram("upload scans", 201, 422),
  // A lot goes back to another revision only for a reason, and is on this one already.
  assignSheet: inProgram("assign sheets to lots", 422),
  listFloorEntries: inSome("see the work"),
  recordObservation: inProgram("work on the floor", 201),
  listIncidents: inSome("see the work"),
  getIncident: inProgram("see the work"),
  reportIncident: inProgram("report incidents", 201),
};
