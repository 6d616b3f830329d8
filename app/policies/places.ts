import { mayOnSite, programsWhere } from "./permissions.ts";
import type { Actor } from "./roles.ts";

/** A place of the application, in the order of the job. */
export interface Place {
  name: string;
  path: string;
}

const ALL: (Place & { open: (actor: Actor) => boolean })[] = [
  { name: "Today", path: "/", open: () => true },
  { name: "Films", path: "/films", open: (actor) => mayOnSite(actor, "see the library") },
  { name: "Stacks", path: "/stacks", open: (actor) => programsWhere(actor, "see the work").length > 0 },
  { name: "Flows", path: "/flows", open: (actor) => programsWhere(actor, "see the work").length > 0 },
  { name: "Carriers & bonds", path: "/carriers", open: (actor) => mayOnSite(actor, "see the library") },
  { name: "Scans", path: "/scans", open: (actor) => programsWhere(actor, "see the work").length > 0 },
  { name: "Sheets", path: "/sheets", open: (actor) => programsWhere(actor, "see released sheets").length > 0 },
  { name: "Floor", path: "/floor", open: (actor) => programsWhere(actor, "work on the floor").length > 0 },
  { name: "Method", path: "/method", open: () => true },
  { name: "People", path: "/people", open: (actor) => mayOnSite(actor, "manage people") },
  { name: "Settings", path: "/settings", open: (actor) => mayOnSite(actor, "edit site settings") },
];

/** What lies within a place and is worth finding by its name; `also` has other words for it. */
interface Page extends Place {
  also?: string;
}

const seesWork = (actor: Actor) => programsWhere(actor, "see the work").length > 0;
const seesLibrary = (actor: Actor) => mayOnSite(actor, "see the library");

const WITHIN: (Page & { open: (actor: Actor) => boolean })[] = [
  { name: "Favourites", path: "/favourites", also: "marked, starred", open: seesLibrary },
  { name: "Preferences", path: "/preferences", also: "theme, dark, density, settings", open: () => true },
  { name: "Account", path: "/account", also: "password, sessions, sign out elsewhere", open: () => true },
  {
    name: "One-time codes",
    path: "/account/codes",
    also: "second factor, two-step sign-in, authenticator app, recovery codes",
    open: () => true,
  },
  { name: "E-mail", path: "/preferences/mail", also: "mail, digest, unsubscribe, notifications", open: () => true },
  {
    name: "API tokens",
    path: "/tokens",
    also: "access for scripts and instruments, keys",
    open: (actor) => mayOnSite(actor, "see the audit trail") || programsWhere(actor, "see released sheets").length > 0,
  },
  {
    name: "Webhooks",
    path: "/webhooks",
    also: "events, notifications, integration, receivers",
    open: (actor) => programsWhere(actor, "keep webhooks").length > 0,
  },
  { name: "API", path: "/api", also: "reference, OpenAPI, scripts, integration", open: () => true },
  {
    name: "Audit trail",
    path: "/audit",
    also: "who changed what, log, history, seals",
    open: (actor) => mayOnSite(actor, "see the audit trail"),
  },
  { name: "Delegates", path: "/delegates", also: "who stands in for a process owner, absence, leave", open: seesWork },
  {
    name: "Hand-overs",
    path: "/floor/hand-overs",
    also: "shift, take over a place",
    open: (actor) => programsWhere(actor, "work on the floor").length > 0,
  },
  {
    name: "Outbox",
    path: "/mail/outbox",
    also: "mail that waits, was sent or is parked",
    open: (actor) => programsWhere(actor, "see the outbox").length > 0,
  },
  { name: "Compare films", path: "/films/compare", open: seesLibrary },
  {
    name: "Import films",
    path: "/films/import",
    also: "table, CSV",
    open: (actor) => mayOnSite(actor, "edit films"),
  },
  { name: "Compare stacks", path: "/stacks/compare", also: "overlay", open: seesWork },
  { name: "Compare flows", path: "/flows/compare", also: "variants, splits, overlay", open: seesWork },
  { name: "Sweep a stack", path: "/stacks/sweep", also: "map, contours, curve over an input", open: seesWork },
  { name: "Carriers", path: "/carriers/carriers", open: seesLibrary },
  { name: "Bonding materials", path: "/carriers/bonding-materials", also: "adhesives", open: seesLibrary },
  { name: "Tapes", path: "/carriers/tapes", open: seesLibrary },
  { name: "Silicon", path: "/carriers/silicon", open: seesLibrary },
  { name: "Tools", path: "/carriers/tools", also: "equipment", open: seesLibrary },
  { name: "Limits", path: "/carriers/limits", also: "thresholds of the handling rules", open: seesLibrary },
  { name: "Flow templates", path: "/flows/library/flows", open: seesLibrary },
  { name: "Step library", path: "/flows/library/steps", open: seesLibrary },
  { name: "What would change?", path: "/assessments/change-request", also: "change request", open: seesWork },
  { name: "Draft sheets", path: "/sheets/drafts", also: "print a draft", open: seesWork },
  { name: "Lots", path: "/lots", also: "wafers", open: seesWork },
  { name: "New lots", path: "/lots/new", also: "create, import a table of lots", open: mayUpload },
  { name: "Import scans", path: "/scans/import", also: "upload files", open: mayUpload },
  { name: "Upload one pair of scans", path: "/scans/new", open: mayUpload },
  { name: "Files that wait", path: "/scans/waiting", also: "scans without a partner", open: seesWork },
  { name: "Instruments", path: "/instruments", also: "profilometers", open: seesLibrary },
  { name: "Import profiles", path: "/import-profiles", open: (actor) => mayOnSite(actor, "keep import profiles") },
  { name: "Predicted against measured", path: "/predictions", open: seesWork },
  { name: "Incidents", path: "/incidents", also: "breakage, cracks, chips, drops, review board", open: seesWork },
  { name: "Rates of breakage", path: "/incidents/rates", also: "breakage map, statistics, intervals", open: seesWork },
  {
    name: "Report an incident",
    path: "/incidents/new",
    also: "crack, chip, drop, broken wafer",
    open: (actor) => programsWhere(actor, "report incidents").length > 0,
  },
  {
    name: "The demo",
    path: "/demo",
    also: "example data, load, remove",
    open: (actor) => mayOnSite(actor, "load and remove the demo"),
  },
  { name: "Work under way", path: "/jobs", also: "jobs", open: seesWork },
];

function mayUpload(actor: Actor): boolean {
  return programsWhere(actor, "upload scans").length > 0;
}

/** Every page that the actor may open without saying of what: the places, and what lies within them. */
export function pagesFor(actor: Actor): Page[] {
  const within = WITHIN.filter(({ open }) => open(actor));
  return [...placesFor(actor), ...within.map(({ name, path, also }) => ({ name, path, also }))];
}

/** The places that the actor may open. */
export function placesFor(actor: Actor): Place[] {
  return ALL.filter(({ open }) => open(actor)).map(({ name, path }) => ({ name, path }));
}
