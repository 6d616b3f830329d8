import type { EntityManager, FilterQuery } from "@mikro-orm/postgresql";
import { Membership } from "#app/db/entities/membership.ts";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { Person } from "#app/db/entities/person.ts";
import { Program } from "#app/db/entities/program.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import type { PersonRow, PersonState, ProgramRoleChoice } from "#app/schemas/person-form.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { everyWord } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { proofAsked } from "./recent-proof.server.ts";

export const PEOPLE_SORTS = ["name", "signed-in"] as const;

const WITH_STATE: Record<PersonState, FilterQuery<Person>> = {
  active: { active: true },
  invited: { active: false, invitedAt: { $ne: null } },
  deactivated: { active: false, invitedAt: null },
};

/** Everybody of the site, for administrators. */
export async function listPeople(scope: ActorScope, params: ListParams): Promise<ListPage<PersonRow>> {
  requireOnSite(scope, "manage people");
  const { query, filters, descending, page, sort } = params;
  const state = filters["state"];
  const order = descending ? ("desc nulls last" as const) : ("asc nulls last" as const);
  return inScope(scope, async (em) => {
    const [people, total] = await em.findAndCount(
      Person,
      {
        $and: [
          state && Object.hasOwn(WITH_STATE, state) ? WITH_STATE[state as PersonState] : {},
          query ? everyWord(query, (pattern) => ({ $or: [{ name: pattern }, { email: pattern }] })) : {},
        ],
      },
      {
        orderBy: [sort === "signed-in" ? { lastSignInAt: order } : { name: order }, { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (page - 1) * PAGE_SIZE,
      },
    );
    return { rows: await rowsOf(em, people), total, params };
  });
}

async function rowsOf(em: EntityManager, people: readonly Person[]): Promise<PersonRow[]> {
  const memberships = await em.find(
    Membership,
    { person: { $in: people.map(({ id }) => id) } },
    { populate: ["program"], orderBy: { program: { name: "asc" } } },
  );
  return people.map((person) => ({
    id: person.id,
    name: person.name,
    email: person.email,
    state: stateOf(person),
    siteRole: person.siteRole ?? null,
    memberships: memberships
      .filter((each) => each.person.id === person.id)
      .map(({ program, role }) => ({ program: program.name, role })),
    lastSignInAt: person.lastSignInAt?.toISOString() ?? null,
  }));
}

/** How far an account is. */
export function stateOf({ active, invitedAt }: Pick<Person, "active" | "invitedAt">): PersonState {
  if (active) return "active";
  return invitedAt ? "invited" : "deactivated";
}

/** Every program with no role in it, for an invitation, and whether the password is asked for with it. */
export async function inviteForm(scope: ActorScope) {
  requireOnSite(scope, "manage people");
  const programs = await inScope(scope, (em) => roleChoices(em, null));
  return { programs, proofAsked: proofAsked(scope) };
}

/** A person with what they hold in each program. @throws 404 */
export async function personPage(scope: ActorScope, id: string | undefined) {
  requireOnSite(scope, "manage people");
  return inScope(scope, async (em) => {
    const person = await em.findOne(Person, { id: idFrom(id, "person") });
    if (!person) throw notFound("person");
    const [row] = await rowsOf(em, [person]);
    if (!row) throw notFound("person");
    const programs = await roleChoices(em, person.id);
    const codes = await em.findOne(OneTimeCodes, { person: person.id, confirmedAt: { $ne: null } });
    return {
      person: row,
      programs,
      codesSince: codes?.confirmedAt?.toISOString() ?? null,
      isSelf: person.id === scope.actor.id,
      proofAsked: proofAsked(scope),
    };
  });
}

async function roleChoices(em: EntityManager, person: string | null): Promise<ProgramRoleChoice[]> {
  const programs = await em.findAll(Program, { orderBy: { name: "asc" }, limit: 100 });
  const held = person === null ? [] : await em.find(Membership, { person });
  return programs.map(({ id, name }) => ({
    id,
    name,
    role: held.find(({ program }) => program.id === id)?.role ?? null,
  }));
}
