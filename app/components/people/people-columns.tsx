import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { PersonRow, PersonState } from "#app/schemas/person-form.ts";

export const PERSON_STATE_WORDS: Record<PersonState, string> = {
  active: "Active",
  invited: "Invited",
  deactivated: "Deactivated",
};

/** What a person is, in one line: on the site, then in each program. */
const rolesOf = ({ siteRole, memberships }: PersonRow): string =>
  [...(siteRole ? [siteRole] : []), ...memberships.map(({ program, role }) => `${program}: ${role}`)].join(", ") ||
  "no role";

/** Columns of the list of people, by the names of their sorts. */
export const PEOPLE_COLUMNS: Column<PersonRow>[] = [
  {
    key: "name",
    head: "Name",
    sortable: true,
    cell: ({ id, name, email }) => (
      <>
        <Link to={`/people/${id}`} className="link wrap-anywhere">
          {name}
        </Link>
        <span className="block text-label wrap-anywhere text-quiet">{email}</span>
      </>
    ),
  },
  { key: "roles", head: "Roles", wide: true, cell: rolesOf },
  { key: "state", head: "State", cell: ({ state }) => PERSON_STATE_WORDS[state] },
  {
    key: "signed-in",
    head: "Last sign-in",
    sortable: true,
    wide: true,
    cell: ({ lastSignInAt }) => (lastSignInAt === null ? "never" : minuteOf(lastSignInAt)),
  },
];
