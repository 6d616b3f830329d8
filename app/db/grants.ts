/**
 * What the plain role may do, table by table; run after every migration, so that a new table without a line here is a table
 * that the application cannot touch. Audit, assessments, raw files, their readings, revisions of a flow and the stresses that films
 * had in use can only be added, and so is what came with the demo, which only the removal of the demo deletes; what was measured of a film or after a step can be set aside, not taken out. Of a sheet everything is kept; what of a
 * revision or a deviation may still move is the database's own rule.
 */
const ADD_ONLY = [
  "assessment",
  "scan_file",
  "audit_event",
  "flow_revision",
  "scan_reading",
  "film_stress_in_use",
  "demo_record",
  "sheet_document",
  "sheet_file",
  "sheet_comment",
  "sheet_print",
  "lot_sheet",
  "floor_entry",
  "incident_note",
  "incident_photo",
];
const NEVER_TAKEN_OUT = [
  "film_stress_value",
  "step_measurement",
  "mail_outbox",
  "sheet",
  "sheet_revision",
  "deviation",
  "delegation",
  "lot_hold",
  "step_stop",
  "incident",
  "hand_over",
  "api_token",
];
/** Written by functions of the database alone. */
const READ_ONLY = ["audit_seal"];
/** One row that the migration puts in. */
const READ_AND_CHANGE = ["site_setting"];
const READ_AND_WRITE = [
  "person",
  "credential",
  "one_time_codes",
  "session",
  "program",
  "membership",
  "film",
  "silicon",
  "carrier",
  "carrier_unit",
  "bonding_material",
  "tape",
  "equipment",
  "site_limit",
  "stack",
  "stack_layer",
  "flow",
  "flow_step",
  "flow_step_film",
  "step_template",
  "flow_template",
  "import_profile",
  "repeatability_study",
  "reference_wafer",
  "reference_reading",
  "scan",
  "lot",
  "wafer",
  "wafer_scan",
  "wafer_measurement",
  "job",
  "recent_visit",
  "favourite",
  "saved_filter",
  "preference",
  "api_answer",
  "api_rate",
  "mail_choice",
  "person_token",
  "rate_limit",
  "webhook",
  "webhook_delivery",
];

/** SQL that gives the role its rights and nothing more. */
export function grantStatements(role: string): string[] {
  const quoted = `"${role.replaceAll('"', '""')}"`;
  return [
    `grant usage on schema public to ${quoted}`,
    `revoke all on all tables in schema public from ${quoted}`,
    ...READ_ONLY.map((table) => `grant select on "${table}" to ${quoted}`),
    ...ADD_ONLY.map((table) => `grant select, insert on "${table}" to ${quoted}`),
    ...NEVER_TAKEN_OUT.map((table) => `grant select, insert, update on "${table}" to ${quoted}`),
    ...READ_AND_CHANGE.map((table) => `grant select, update on "${table}" to ${quoted}`),
    ...READ_AND_WRITE.map((table) => `grant select, insert, update, delete on "${table}" to ${quoted}`),
  ];
}
