/** How a file was understood, as data: what a person is shown, asked and can change. Rows count from 1, columns from 0. */

export const ENCODINGS = ["utf-8", "utf-16le", "utf-16be", "windows-1252"] as const;
export type Encoding = (typeof ENCODINGS)[number];

/** What stands between columns; a blank stands for any run of blanks and tabs. */
export const DELIMITERS = [";", "\t", ",", "|", " "] as const;

/** Mark that sets off the decimals in a file. */
export const DECIMAL_MARKS = ["point", "comma"] as const;
export type DecimalMark = (typeof DECIMAL_MARKS)[number];

/** What groups the digits of large numbers. */
export const THOUSANDS = ["none", "comma", "point", "blank", "apostrophe"] as const;
export type Thousands = (typeof THOUSANDS)[number];

export const LENGTH_UNITS = ["m", "cm", "mm", "µm", "nm", "Å", "inch", "mil"] as const;
export type LengthUnit = (typeof LENGTH_UNITS)[number];
export const STRESS_UNITS = ["Pa", "MPa", "GPa", "dyn/cm²", "1E9 dyn/cm²", "1E10 dyn/cm²", "1E11 Pa"] as const;
export const ANGLE_UNITS = ["°", "rad"] as const;
export const READ_UNITS = [...LENGTH_UNITS, ...STRESS_UNITS, ...ANGLE_UNITS] as const;
export type ReadUnit = (typeof READ_UNITS)[number];

export const FILE_KINDS = ["profiles", "summary", "thickness map", "reduced stress"] as const;
export type FileKind = (typeof FILE_KINDS)[number];

export const COLUMN_ROLES = [
  "index",
  "time",
  "date",
  "position",
  "radius",
  "height",
  "levelled height",
  "slope",
  "y",
  "angle",
  "thickness",
  "lot",
  "slot",
  "wafer",
  "bow",
  "warp",
  "sori",
  "thickness variation",
  "stress",
  "modulus",
  "film thickness",
  "substrate thickness",
  "radius before",
  "radius after",
  "not read",
] as const;
export type ColumnRole = (typeof COLUMN_ROLES)[number];

export interface ReadColumn {
  index: number;
  /** as it stands in the file, or nothing */
  heading: string;
  /** null while nobody can tell */
  role: ColumnRole | null;
  unit: ReadUnit | null;
  /** what the role and the unit were told by */
  why: string;
}

/** Columns that make one profile. */
export interface ColumnPair {
  position: number;
  height: number;
  /** the height's heading, or 'column 2' */
  name: string;
  /** whether the first column is a distance from the centre */
  along: "position" | "radius";
}

export type Asked =
  | "delimiter"
  | "decimal mark"
  | "columns"
  | "kind"
  | "unit"
  | "date order"
  | "how measured"
  | "what lies under the wafer";

/** Something that the file leaves open. Nothing is chosen until a person has. */
export interface Ambiguity {
  what: Asked;
  /** the column in question; null when it is the whole file */
  column: number | null;
  choices: string[];
  chosen: null;
  /** whether nothing can be read before it is answered */
  blocks: boolean;
  /** the number that may be read in two ways, where one is in question */
  shown?: string;
  /** what is open and by what evidence, a whole sentence without the file's name */
  sentence: string;
}

/** Order in which a date is written. */
export const DATE_ORDERS = ["ymd", "dmy", "mdy"] as const;
export type DateOrder = (typeof DATE_ORDERS)[number];

export interface ReadDate {
  row: number;
  text: string;
  /** ISO, or null while the order of day and month is open */
  day: string | null;
}

export interface Reading {
  kind: FileKind;
  encoding: Encoding;
  delimiter: string;
  /** the first line named the delimiter */
  delimiterNamed: boolean;
  /** null when no number has a mark, and while it is open */
  decimalMark: DecimalMark | null;
  thousands: Thousands;
  headerRow: number | null;
  unitsRow: number | null;
  /** first row of data */
  firstRow: number;
  columns: ReadColumn[];
  pairs: ColumnPair[];
  date: ReadDate | null;
  ambiguities: Ambiguity[];
}

/** Where something stands in a file. */
export interface Place {
  row: number;
  /** null when it is the whole row */
  column: number | null;
  /** the beginning of what stands there */
  text: string;
}

/** Faults of one cause: how many, and the first of them. */
export interface Fault {
  cause: string;
  count: number;
  places: Place[];
}
