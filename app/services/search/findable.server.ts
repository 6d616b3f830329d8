import { recordNumberSql } from "#app/lib/record-number.ts";
import { mayOnSite, programsWhere } from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";

/** A kind of record that can be found by its name. */
export interface Findable {
  title: string;
  /**
   * SQL of its rows: `id`, `name`, `about` (what tells two of a name apart), `also` (text that is searched beside the name) and
   * `path`; with `program_id` where it is behind the wall of programs.
   */
  rows: string;
  walled: boolean;
  /** who may open its pages at all */
  open: (actor: Actor) => boolean;
  /** its list, which searches by the same text */
  list?: string;
}

const seesWork = (actor: Actor) => programsWhere(actor, "see the work").length > 0;
const seesLibrary = (actor: Actor) => mayOnSite(actor, "see the library");

/** A day as lists show it. */
const day = (column: string) => `to_char(${column} at time zone 'UTC', 'YYYY-MM-DD')`;

/** Something of a program that has a name of its own. */
const ofProgram = (title: string, table: "stack" | "flow"): Findable => ({
  title,
  rows: `select x.id, x.name, p.name as about, '' as also, '/${table}s/' || x.id as path, x.program_id
           from "${table}" x join program p on p.id = x.program_id`,
  walled: true,
  open: seesWork,
  list: `/${table}s`,
});

/** Something of the site's library. @param about SQL of what is said beside its name */
const ofSite = (title: string, table: string, path: string, about: string): Findable => ({
  title,
  rows: `select id, name, ${about} as about, '' as also, '${path}/' || id as path from "${table}"`,
  walled: false,
  open: seesLibrary,
  list: path,
});

/** Every kind of record that a search finds, in the order in which they stand when nothing fits better. */
export const FINDABLE = {
  flow: ofProgram("Flows", "flow"),
  stack: ofProgram("Stacks", "stack"),
  assessment: {
    title: "Assessments",
    rows: `select x.id, ${recordNumberSql("assessment", "x.document_number")} as name,
                  concat_ws(', ', x.flow_name, 'lot ' || (x.lot->>'name'), x.outcome, ${day("x.created_at")}) as about,
                  coalesce(x.lot->>'name', '') as also, '/assessments/' || x.id as path, x.program_id
             from assessment x join program p on p.id = x.program_id`,
    walled: true,
    open: seesWork,
  },
  sheet: {
    title: "Sheets",
    rows: `select x.id, ${recordNumberSql("sheet", "s.number")} as name,
                  concat_ws(', ', x.title, x.state, ${day("coalesce(x.ended_at, x.decided_at)")}) as about,
                  x.title as also, '/sheets/revisions/' || x.id as path, x.program_id
             from (select distinct on (sheet_id) * from sheet_revision where number is not null
                    order by sheet_id, number desc) x
             join sheet s on s.id = x.sheet_id join program p on p.id = x.program_id`,
    walled: true,
    open: seesWork,
    list: "/sheets",
  },
  incident: {
    title: "Incidents",
    rows: `select x.id, ${recordNumberSql("incident", "x.number")} as name,
                  concat_ws(', ', x.kind, 'lot ' || l.name, 'step ' || x.step || ', ' || x.step_title,
                            ${day("x.occurred_at")}) as about,
                  concat_ws(' ', x.words, x.step_title, l.name) as also, '/incidents/' || x.id as path, x.program_id
             from incident x join program p on p.id = x.program_id join lot l on l.id = x.lot_id`,
    walled: true,
    open: seesWork,
    list: "/incidents",
  },
  film: ofSite("Films", "film", "/films", "kind"),
  scan: {
    title: "Scans",
    rows: `select x.id, x.label as name, concat_ws(', ', f.name, p.name, ${day("x.created_at")}) as about,
                  concat_ws(' ', f.name, w.name) as also, '/scans/' || x.id as path, x.program_id
             from scan x join program p on p.id = x.program_id join person w on w.id = x.created_by_id
             left join film f on f.id = x.film_id`,
    walled: true,
    open: seesWork,
    list: "/scans",
  },
  lot: {
    title: "Lots",
    rows: `select x.id, x.name, concat_ws(', ', p.name, ${day("x.created_at")}) as about,
                  concat_ws(' ', w.name, (select string_agg(name, ' ') from wafer where lot_id = x.id)) as also,
                  '/lots/' || x.id as path, x.program_id
             from lot x join program p on p.id = x.program_id join person w on w.id = x.created_by_id`,
    walled: true,
    open: seesWork,
    list: "/lots",
  },
  wafer: {
    title: "Wafers",
    rows: `select x.id, x.name, concat_ws(', ', 'lot ' || l.name, 'slot ' || x.slot, p.name) as about,
                  coalesce(l.name, '') as also, '/wafers/' || x.id as path, x.program_id
             from wafer x join program p on p.id = x.program_id left join lot l on l.id = x.lot_id`,
    walled: true,
    open: seesWork,
  },
  step: {
    title: "Steps of flows",
    rows: `select x.id, x.title as name, f.name as about, '' as also,
                  '/flows/' || x.flow_id || '/steps/' || x.id as path, x.program_id
             from flow_step x join flow f on f.id = x.flow_id`,
    walled: true,
    open: seesWork,
  },
  carrier: ofSite("Carriers", "carrier", "/carriers/carriers", "material"),
  bondingMaterial: ofSite("Bonding materials", "bonding_material", "/carriers/bonding-materials", "release"),
  tape: ofSite("Tapes", "tape", "/carriers/tapes", "kind"),
  silicon: ofSite(
    "Silicon",
    "silicon",
    "/carriers/silicon",
    `round((diameter * 1000)::numeric)::int || ' mm, (' || orientation || ')'`,
  ),
  tool: ofSite("Tools", "equipment", "/carriers/tools", "holding"),
  instrument: ofSite("Instruments", "import_profile", "/instruments", `''`),
  importProfile: {
    title: "Import profiles",
    rows: `select id, name, 'how its files are read' as about, '' as also, '/import-profiles#profile-' || id as path
             from import_profile`,
    walled: false,
    open: (actor) => mayOnSite(actor, "keep import profiles"),
    list: "/import-profiles",
  },
} as const satisfies Record<string, Findable>;

export type FindableKind = keyof typeof FINDABLE;

/** The kinds that the actor may open, in their order. */
export function findableBy(actor: Actor): [FindableKind, Findable][] {
  return Object.entries<Findable>(FINDABLE).filter(([, { open }]) => open(actor)) as [FindableKind, Findable][];
}
