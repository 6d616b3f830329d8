import { describe, expect, test } from "vitest";
import { placesFor } from "#app/policies/places.ts";
import {
  mayInProgram,
  mayOnSite,
  PROGRAM_PERMISSIONS,
  programsWhere,
  SITE_PERMISSIONS,
} from "#app/policies/permissions.ts";
import { roleInWords } from "#app/policies/role-words.ts";
import type { Actor, ProgramRole, SiteRole } from "#app/policies/roles.ts";

/** Columns of the role table: a program role, a site role beside being a guest of the program, or nothing at all. */
const COLUMNS = ["guest", "technician", "shift lead", "engineer", "process owner", "administrator"] as const;
type Column = (typeof COLUMNS)[number];

/** Who may do what: rows as in the product's role table, one letter a column, y for yes. */
const PROGRAM_TABLE: Record<keyof typeof PROGRAM_PERMISSIONS, string> = {
  //                      g t s e p a
  "see released sheets": "y y y y y y",
  "see the work": "       - y y y y -",
  "upload scans": "       - y y y y -",
  "accept stresses": "    - - - y y -",
  "edit stacks and flows": "- - - y y -",
  "run assessments": "    - - - y y -",
  "see the outbox": "     - - - - y y",
  "keep webhooks": "      y y y y y y",
  "look after webhooks": "- - - - y y",
  "name a delegate": "    - - - - y -",
  "ask for a review": "   - - - y y -",
  "comment in a review": "- y y y y -",
  "record deviations": "  - - - y y -",
  "release, return and withdraw sheets": "- - - - y -",
  "assign sheets to lots": "- - - y y -",
  "work on the floor": "  - y y y y -",
  "hold lots and clear what the shift can": "- - y - y -",
  "clear every hold and stop": "- - - - y -",
  "report incidents": "   - y y y y -",
  "follow up incidents": "- - - y y -",
};
const SITE_TABLE: Record<keyof typeof SITE_PERMISSIONS, string> = {
  "see the library": "    - y y y y y",
  "edit films": "         - - - y y -",
  "edit the step library": "- - - y y -",
  "keep import profiles": "   - y y y y -",
  "check instruments": "   - y y y y -",
  "edit carriers, bonds and limits": "- - - - y y",
  "edit site settings": "  - - - - - y",
  "manage people": "       - - - - - y",
  "load and remove the demo": "- - - - y -",
  "see the audit trail": "- - - - - y",
};

const OWN = "11111111-1111-4111-8111-111111111111";
const FOREIGN = "22222222-2222-4222-8222-222222222222";

function actor(column: Column): Actor {
  const siteRole = column === "shift lead" || column === "administrator" ? (column as SiteRole) : null;
  const role: ProgramRole = siteRole ? "guest" : (column as ProgramRole);
  return {
    id: "33333333-3333-4333-8333-333333333333",
    name: column,
    email: `${column}@kestrel-ridge.example`,
    siteRole,
    memberships: [{ programId: OWN, programName: "Tern", programSlug: "tern", role }],
  };
}

const cells = (row: string) => row.trim().split(/\s+/);

describe.each(COLUMNS.map((column, index) => ({ column, index })))("$column", ({ column, index }) => {
  test.each(Object.entries(PROGRAM_TABLE))("%s in the own program", (permission, row) => {
    const may = mayInProgram(actor(column), permission as keyof typeof PROGRAM_PERMISSIONS, OWN);
    expect(may).toBe(cells(row)[index] === "y");
  });

  test.each(Object.keys(PROGRAM_TABLE))("%s in a foreign program: never", (permission) => {
    expect(mayInProgram(actor(column), permission as keyof typeof PROGRAM_PERMISSIONS, FOREIGN)).toBe(false);
  });

  test.each(Object.entries(SITE_TABLE))("%s on the site", (permission, row) => {
    const may = mayOnSite(actor(column), permission as keyof typeof SITE_PERMISSIONS);
    expect(may).toBe(cells(row)[index] === "y");
  });

  test("is called what they are", () => {
    expect(roleInWords(actor(column))).toBe(column);
  });
});

test("the tables name every permission", () => {
  expect(Object.keys(PROGRAM_TABLE)).toEqual(Object.keys(PROGRAM_PERMISSIONS));
  expect(Object.keys(SITE_TABLE)).toEqual(Object.keys(SITE_PERMISSIONS));
});

test("somebody without a program may nothing but look at Today and the method", () => {
  const nobody = { ...actor("guest"), memberships: [] };
  expect(placesFor(nobody).map(({ name }) => name)).toEqual(["Today", "Method"]);
  expect(roleInWords(nobody)).toBe("no program yet");
});

test("a guest is offered neither films nor stacks", () => {
  expect(placesFor(actor("guest")).map(({ name }) => name)).toEqual(["Today", "Sheets", "Method"]);
});

test("an engineer is offered the places in the order of the job", () => {
  expect(placesFor(actor("engineer")).map(({ name }) => name)).toEqual([
    "Today",
    "Films",
    "Stacks",
    "Flows",
    "Carriers & bonds",
    "Scans",
    "Sheets",
    "Floor",
    "Method",
  ]);
});

test("an administrator finds the site's settings among the places", () => {
  expect(placesFor(actor("administrator")).at(-1)).toEqual({ name: "Settings", path: "/settings" });
});

test("programs come in the order of their names, only where the person may", () => {
  const both: Actor = {
    ...actor("engineer"),
    memberships: [
      { programId: FOREIGN, programName: "Tern", programSlug: "tern", role: "engineer" },
      { programId: OWN, programName: "Fulmar", programSlug: "fulmar", role: "guest" },
    ],
  };
  expect(programsWhere(both, "see released sheets").map(({ programName }) => programName)).toEqual(["Fulmar", "Tern"]);
  expect(programsWhere(both, "see the work").map(({ programName }) => programName)).toEqual(["Tern"]);
});
