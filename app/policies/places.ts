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
  { name: "Method", path: "/method", open: () => true },
];

/** The places that the actor may open. */
export function placesFor(actor: Actor): Place[] {
  return ALL.filter(({ open }) => open(actor)).map(({ name, path }) => ({ name, path }));
}
