/** Kinds of record that the demo is told by, as their tables are called: programs and people, what is in a program, the library. */
export const DEMO_TABLES = [
  "program",
  "person",
  "stack",
  "flow",
  "assessment",
  "scan_file",
  "scan",
  "lot",
  "wafer",
  "wafer_measurement",
  "film",
  "carrier",
  "carrier_unit",
  "bonding_material",
  "tape",
  "import_profile",
  "repeatability_study",
  "reference_wafer",
  "reference_reading",
] as const;
export type DemoTable = (typeof DEMO_TABLES)[number];
