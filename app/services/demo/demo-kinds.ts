import type { DemoTable } from "#app/lib/demo-tables.ts";

/** A kind of record that goes with the demo; SQL of its columns is of `x`. */
export interface DemoKind {
  table:
    | DemoTable
    | "api_token"
    | "delegation"
    | "film_stress_value"
    | "hand_over"
    | "incident"
    | "lot_hold"
    | "sheet_revision"
    | "step_measurement"
    | "step_stop"
    | "floor_entry"
    | "wafer_measurement"
    | "wafer_scan"
    | "webhook";
  one: string;
  many: string;
  /** which rows go: of `programs` of the demo, or of what of its library is not among the `kept` */
  goes: string;
  name: string;
  by: string;
  at: string;
  /** whether somebody has changed what came with the demo */
  changed: string;
}

const PROGRAMS = "select id from demo_record where kind = 'program'";
const IN_PROGRAM = `x.program_id in (${PROGRAMS})`;
const goingOf = (kind: DemoTable) =>
  `select id from demo_record where kind = '${kind}' and id not in (select * from kept)`;
const EDITED = "coalesce(x.updated_by_id, x.created_by_id)";

const made = { goes: IN_PROGRAM, by: "x.created_by_id", at: "x.created_at", changed: "false" };
const edited = { by: EDITED, at: "x.updated_at", changed: "x.version > 1" };
const ofLibrary = (table: DemoTable, one: string, many = `${one}s`): DemoKind => ({
  table,
  one,
  many,
  goes: `x.id in (${goingOf(table)})`,
  name: "x.name",
  ...edited,
});
const ofProgram = (table: DemoKind["table"], one: string, name: string, more: Partial<DemoKind> = {}): DemoKind => ({
  table,
  one,
  many: `${one}s`,
  name,
  ...made,
  ...more,
});

const PROGRAM_NAME = "(select p.name from program p where p.id = x.program_id)";

/** Every kind that the preview counts, in the order of the job. */
export const DEMO_KINDS: readonly DemoKind[] = [
  ofProgram("program", "program", "x.name", { goes: `x.id in (${PROGRAMS})`, by: "null::uuid" }),
  ofProgram("stack", "stack", `x.name || ', ' || ${PROGRAM_NAME}`, edited),
  ofProgram("flow", "flow", `x.name || ', ' || ${PROGRAM_NAME}`, edited),
  ofProgram("assessment", "assessment", "x.flow_name || ', number ' || x.number"),
  ofProgram("sheet_revision", "revision of a sheet", "x.title", {
    many: "revisions of sheets",
    by: "x.asked_by_id",
    at: "x.asked_at",
  }),
  ofProgram("api_token", "API token", "x.name", { by: "x.person_id" }),
  ofProgram("webhook", "webhook", "x.name"),
  ofProgram("delegation", "delegation", "x.reason", { by: "x.owner_id" }),
  ofProgram("step_measurement", "bow measured after a step", "x.wafer || ', ' || x.step_title", {
    many: "bows measured after a step",
  }),
  ofProgram("floor_entry", "entry of the floor", "x.kind || coalesce(', step ' || x.step, '')", {
    many: "entries of the floor",
    at: "x.received_at",
  }),
  ofProgram("lot_hold", "hold of a lot", "x.reason", {
    many: "holds of lots",
    by: "x.opened_by_id",
    at: "x.opened_at",
  }),
  ofProgram("step_stop", "stop of a step", "x.title", {
    many: "stops of steps",
    by: "x.opened_by_id",
    at: "x.opened_at",
  }),
  ofProgram("hand_over", "hand-over", "x.place", { by: "x.given_by_id", at: "x.given_at" }),
  ofProgram("incident", "incident", "x.kind || ', ' || x.step_title"),
  ofProgram("scan", "scan", "x.label"),
  ofProgram("scan_file", "raw file", "x.name"),
  ofProgram("wafer_scan", "placed scan", "(select w.name from wafer w where w.id = x.wafer_id)"),
  ofProgram("wafer_measurement", "wafer measurement", "(select w.name from wafer w where w.id = x.wafer_id)"),
  ofProgram("lot", "lot", "x.name"),
  ofProgram("wafer", "wafer", "x.name"),
  ofLibrary("film", "film"),
  {
    table: "film_stress_value",
    one: "accepted stress",
    many: "accepted stresses",
    goes: `x.film_id in (${goingOf("film")})`,
    name: "(select f.name from film f where f.id = x.film_id)",
    by: "x.accepted_by_id",
    at: "x.accepted_at",
    changed: "false",
  },
  ofLibrary("carrier", "carrier"),
  {
    ...ofLibrary("carrier_unit", "carrier piece"),
    goes: `x.carrier_id in (${goingOf("carrier")})`,
    name: "x.mark",
  },
  ofLibrary("bonding_material", "bonding material"),
  ofLibrary("tape", "tape"),
  ofLibrary("import_profile", "instrument"),
  {
    ...ofProgram("repeatability_study", "repeatability study", "x.wafer"),
    many: "repeatability studies",
    goes: `x.profile_id in (${goingOf("import_profile")})`,
  },
  {
    ...ofProgram("reference_wafer", "wafer of known bow", "x.name"),
    many: "wafers of known bow",
    goes: `x.id in (${goingOf("reference_wafer")}) and not exists (
      select 1 from reference_reading r where r.wafer_id = x.id and (r.profile_id is null or r.profile_id not in (${goingOf("import_profile")})))`,
  },
  {
    ...ofProgram("reference_reading", "reading of a known bow", "x.instrument || ', ' || x.measured_on"),
    many: "readings of known bows",
    goes: `x.profile_id in (${goingOf("import_profile")})`,
  },
];
