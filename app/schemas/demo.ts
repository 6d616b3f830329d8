import type { ProgramRole } from "#app/policies/roles.ts";

/** A kind of record and how many of it go with the demo. */
export interface DemoCount {
  kind: string;
  total: number;
}

/** Something that people have made or changed within the demo, for the preview to name. */
export interface DemoNamed {
  kind: string;
  name: string;
  by: string | null;
  /** ISO 8601 */
  at: string;
}

/** The newest of them, and how many there are in all. */
export interface DemoNames {
  rows: DemoNamed[];
  total: number;
}

/** The demo as it stands in the database, seen by somebody who may take it out. */
export interface DemoHere {
  state: "here";
  programs: string[];
  goes: DemoCount[];
  added: DemoNames;
  changed: DemoNames;
  /** records of its library that something outside it uses: they stay */
  kept: { kind: string; name: string }[];
  /** accepted stresses of films that stay: they stay as figures, without their scan */
  keptStresses: number;
  jobs: number;
  /** who can sign in and would be left without a program, with the role that they are to keep */
  stranded: { id: string; name: string; role: ProgramRole }[];
  /** of everything above: a removal goes by what was seen */
  seen: string;
}

/** What `/demo` shows. Whoever does not own the process of every program of the demo sees nothing of them. */
export type DemoView = { state: "absent" } | { state: "not yours" } | DemoHere;

/** Why a removal was not made, or that it was. */
export type DemoRemoved =
  { outcome: "removed" } | { outcome: "gone" } | { outcome: "refused"; sentence: string; field?: "confirm" | "name" };

/** What is typed to say that a removal is meant. */
export const CONFIRM_WORD = "remove";
