import { beforeAll, describe, expect, test } from "vitest";
import { leave, scopeOfPerson } from "./people.ts";
import { asOwner, useDatabase } from "./test-database.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const database = useDatabase({ demo: true });

const PROGRAM_TABLES = [
  "stack",
  "stack_layer",
  "flow",
  "flow_step",
  "flow_step_film",
  "flow_revision",
  "assessment",
  "scan_file",
  "scan",
  "scan_reading",
  "lot",
  "wafer",
  "wafer_scan",
  "wafer_measurement",
  "job",
  "step_measurement",
  "sheet",
  "sheet_revision",
  "sheet_document",
  "sheet_file",
  "sheet_comment",
  "deviation",
  "sheet_print",
  "delegation",
  "lot_sheet",
  "floor_entry",
  "lot_hold",
  "step_stop",
  "incident",
  "incident_note",
  "incident_photo",
  "hand_over",
  "api_token",
  "mail_outbox",
  "webhook",
  "webhook_delivery",
];
const SITE_TABLES = [
  "film",
  "silicon",
  "carrier",
  "carrier_unit",
  "bonding_material",
  "tape",
  "equipment",
  "site_limit",
  "step_template",
  "flow_template",
  "import_profile",
  "repeatability_study",
  "reference_wafer",
  "reference_reading",
  "film_stress_value",
  "film_stress_in_use",
  "demo_record",
];

/** What a person keeps for themselves. */
const OWN_TABLES = ["recent_visit", "favourite", "saved_filter", "preference", "mail_choice", "api_answer"];

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;

beforeAll(async () => {
  await leave(database, "technician", "petrel");
  await leave(database, "technician", "fulmar");
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
});

/** Rows of a query that forgets every filter, run on somebody's behalf. */
async function forgetful<Row>(scope: ActorScope | null, sql: string): Promise<Row[]> {
  const { inScope } = await import("#app/server/scope.server.ts");
  return inScope(scope ?? { personId: null, requestId: "test" }, (em) => em.execute<Row[]>(sql));
}

describe("every table", () => {
  test("has row-level security switched on", async () => {
    const open = await asOwner<{ tablename: string }>(
      database,
      `select tablename from pg_tables where schemaname = 'public' and not rowsecurity and tablename <> 'mikro_orm_migrations'`,
    );
    expect(open).toEqual([]);
  });

  test("that names a program is behind the wall of programs", async () => {
    const named = await asOwner<{ table_name: string }>(
      database,
      `select table_name from information_schema.columns
        where table_schema = 'public' and column_name = 'program_id' and table_name not in ('membership', 'audit_event')`,
    );
    expect(named.map(({ table_name }) => table_name).sort()).toEqual([...PROGRAM_TABLES].sort());
  });

  test.each([
    ...PROGRAM_TABLES,
    ...SITE_TABLES,
    ...OWN_TABLES,
    "person",
    "credential",
    "session",
    "one_time_codes",
    "person_token",
    "membership",
    "program",
    "audit_event",
    "audit_seal",
  ])("%s shows nothing to nobody", async (table) => {
    expect(await forgetful(null, `select * from "${table}"`)).toEqual([]);
  });
});

describe("a query that forgets its program", () => {
  test("gives an engineer of three programs the stacks of all three", async () => {
    const rows = await forgetful<{ slug: string }>(
      engineer,
      "select p.slug from stack s join program p on p.id = s.program_id",
    );
    expect(rows.map(({ slug }) => slug).sort()).toEqual(["fulmar", "petrel", "tern"]);
  });

  test("gives a technician of Tern only Tern's", async () => {
    const rows = await forgetful<{ name: string }>(technician, "select name from stack");
    expect(rows.map(({ name }) => name)).toEqual(["Tern T-2, one redistribution layer"]);
    expect(await forgetful(technician, "select * from program where slug = 'petrel'")).toEqual([]);
  });

  test.each(PROGRAM_TABLES)("gives a guest no row of %s", async (table) => {
    expect(await forgetful(guest, `select * from "${table}"`)).toEqual([]);
  });

  test.each(SITE_TABLES)("gives a guest no row of %s", async (table) => {
    expect(await forgetful(guest, `select * from "${table}"`)).toEqual([]);
  });

  test("gives a guest of Tern no other program, person or membership", async () => {
    expect(await forgetful(guest, "select slug from program")).toEqual([{ slug: "tern" }]);
    expect(await forgetful<{ id: string }>(guest, "select id from person")).toEqual([{ id: guest.actor.id }]);
    const memberships = await forgetful<{ person_id: string }>(guest, "select person_id from membership");
    expect(memberships).toEqual([{ person_id: guest.actor.id }]);
  });

  test("shows nobody another person's password or session", async () => {
    await asOwner(
      database,
      `insert into credential (id, person_id, password_hash, changed_at) select gen_random_uuid(), id, 'x', now() from person`,
    );
    expect(await forgetful(engineer, "select person_id from credential")).toEqual([{ person_id: engineer.actor.id }]);
  });
});

describe("what a person keeps for themselves", () => {
  const COLUMNS: Record<string, [names: string, values: string]> = {
    recent_visit: ["kind, record_id, at", "'film', gen_random_uuid(), now()"],
    favourite: ["kind, record_id, at", "'film', gen_random_uuid(), now()"],
    saved_filter: ["list, name, query, at", "'/films', 'metals', 'kind=metal', now()"],
    preference: ["value, at", "'{}', now()"],
    api_answer: ["caller, key, request_hash, headers, body, at", "gen_random_uuid(), 'k', 'x', '{}', '', now()"],
    mail_choice: ["value, unsubscribe_token, at", "'{}', gen_random_uuid()::text, now()"],
  };
  const insert = (table: string, person: string) => {
    const [names, values] = COLUMNS[table] ?? ["", ""];
    return `insert into "${table}" (id, person_id, ${names}) values (gen_random_uuid(), '${person}', ${values})`;
  };

  test.each(OWN_TABLES)(
    "in %s is seen, changed and removed by nobody else, an administrator included",
    async (table) => {
      await forgetful(guest, insert(table, guest.actor.id));
      expect(await forgetful(guest, `select * from "${table}"`)).toHaveLength(1);
      const administrator = await scopeOfPerson(database, "administrator");
      for (const other of [engineer, administrator]) {
        expect(await forgetful(other, `select * from "${table}"`)).toEqual([]);
        await forgetful(other, `update "${table}" set at = at - interval '1 day'`);
        await forgetful(other, `delete from "${table}"`);
        await expect(forgetful(other, insert(table, guest.actor.id))).rejects.toThrow(/row-level security/);
      }
      const kept = await forgetful<{ fresh: boolean }>(
        guest,
        `select at > now() - interval '1 hour' as fresh from "${table}"`,
      );
      expect(kept).toEqual([{ fresh: true }]);
      await expect(forgetful(guest, `update "${table}" set person_id = '${engineer.actor.id}'`)).rejects.toThrow(
        /row-level security/,
      );
    },
  );
});

describe("a write", () => {
  test("into a foreign program is refused by the database", async () => {
    const [petrel] = await asOwner<{ id: string }>(database, "select id from program where slug = 'petrel'");
    const [silicon] = await asOwner<{ id: string }>(database, "select id from silicon limit 1");
    await expect(
      forgetful(
        technician,
        `insert into stack (id, program_id, name, note, silicon_id, silicon_thickness, created_at, updated_at)
         values (gen_random_uuid(), '${petrel?.id}', 'mine now', '', '${silicon?.id}', '{}', now(), now())`,
      ),
    ).rejects.toThrow(/row-level security/);
  });

  test("cannot reach a foreign row", async () => {
    await forgetful(technician, "update stack set note = 'touched'");
    const touched = await asOwner<{ slug: string }>(
      database,
      "select p.slug from stack s join program p on p.id = s.program_id where s.note = 'touched'",
    );
    expect(touched).toEqual([{ slug: "tern" }]);
  });

  test.each(["assessment", "scan_file", "audit_event", "film_stress_in_use", "incident_note", "incident_photo"])(
    "never changes or deletes a row of %s",
    async (table) => {
      await expect(forgetful(engineer, `update "${table}" set id = id`)).rejects.toThrow(/permission denied/);
      await expect(forgetful(engineer, `delete from "${table}"`)).rejects.toThrow(/permission denied/);
    },
  );

  test("of the owner does not change what was noted either", async () => {
    await expect(asOwner(database, "update audit_event set subject = 'x'")).rejects.toThrow(/never changed/);
  });
});

test("the server refuses to work as the owner of the tables", async () => {
  const { MikroORM } = await import("@mikro-orm/postgresql");
  const { databaseOptions } = await import("#app/db/options.ts");
  const { refusePowerfulRole } = await import("#app/db/refuse-powerful-role.ts");
  const powerful = await MikroORM.init(databaseOptions(database.ownerUrl));
  await expect(refusePowerfulRole(powerful)).rejects.toThrow(/plain role/);
});
