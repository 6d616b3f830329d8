import { Migration } from "@mikro-orm/migrations";

/** Flows get a history that can be undone, the site a library of steps and of whole flows. */
export class FlowRevisionsAndTemplates extends Migration {
  override up(): void {
    this.addSql(
      `create table "flow_revision" ("id" uuid not null, "program_id" uuid not null, "flow_id" uuid not null, "number" int not null, "kind" text not null, "words" text not null, "flow_version" int not null, "plan" jsonb null, "created_at" timestamptz not null, "created_by_id" uuid null, constraint "flow_revision_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "flow_revision" add constraint "flow_revision_flow_id_number_unique" unique ("flow_id", "number")`,
    );
    for (const [column, table, more] of [
      ["program_id", "program", ""],
      ["flow_id", "flow", " on delete cascade"],
      ["created_by_id", "person", " on delete set null"],
    ])
      this.addSql(
        `alter table "flow_revision" add constraint "flow_revision_${column}_foreign" foreign key ("${column}") references "${table}" ("id") on update cascade${more}`,
      );
    this.addSql(`alter table "flow_revision" enable row level security`);
    this.addSql(
      `create policy program_wall on "flow_revision" using (program_id in (select app_staff_programs()))
         with check (program_id in (select app_staff_programs()))`,
    );

    const record = `"version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null`;
    this.addSql(
      `create table "step_template" ("id" uuid not null, "name" text not null, "kind" text not null, "step" jsonb not null, ${record}, constraint "step_template_pkey" primary key ("id"))`,
    );
    this.addSql(
      `create table "flow_template" ("id" uuid not null, "name" text not null, "note" text not null, "diameter" double precision not null, "incoming_thickness" jsonb not null, "steps" jsonb not null, ${record}, constraint "flow_template_pkey" primary key ("id"))`,
    );
    for (const table of ["step_template", "flow_template"]) {
      this.addSql(`alter table "${table}" add constraint "${table}_name_unique" unique ("name")`);
      for (const column of ["created_by_id", "updated_by_id"])
        this.addSql(
          `alter table "${table}" add constraint "${table}_${column}_foreign" foreign key ("${column}") references "person" ("id") on update cascade on delete set null`,
        );
      this.addSql(`alter table "${table}" enable row level security`);
      this.addSql(
        `create policy staff_only on "${table}" using ((select app_is_staff())) with check ((select app_is_staff()))`,
      );
    }
  }

  override down(): void {
    for (const table of ["flow_revision", "step_template", "flow_template"])
      this.addSql(`drop table "${table}" cascade`);
  }
}
