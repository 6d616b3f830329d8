import { Migration } from "@mikro-orm/migrations";

/** The tables of the first version. */
export class InitialSchema extends Migration {
  override up(): void {
    this.addSql(
      `create table "audit_event" ("id" uuid not null, "at" timestamptz not null, "actor_id" uuid null, "program_id" uuid null, "action" text not null, "subject" text not null, "subject_id" uuid null, "field" text null, "from" jsonb null, "to" jsonb null, "request_id" text not null, constraint "audit_event_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "audit_event_subject_subject_id_index" on "audit_event" ("subject", "subject_id")`);
    this.addSql(`create index "audit_event_program_id_at_index" on "audit_event" ("program_id", "at")`);
    this.addSql(
      `create table "person" ("id" uuid not null, "email" text not null, "name" text not null, "site_role" text null, "active" boolean not null, "created_at" timestamptz not null, constraint "person_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "person" add constraint "person_email_unique" unique ("email")`);
    this.addSql(
      `create table "film" ("id" uuid not null, "name" text not null, "kind" text not null, "note" text not null, "stress" jsonb not null, "stress_state" text not null, "youngs_modulus" jsonb not null, "poissons_ratio" jsonb not null, "expansion" jsonb not null, "yield_stress" jsonb null, "temperature_limit" jsonb null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "film_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "film" add constraint "film_name_unique" unique ("name")`);
    this.addSql(
      `create table "equipment" ("id" uuid not null, "name" text not null, "note" text not null, "holding" text not null, "at_peak" text not null, "warp_limit_edges_up" jsonb null, "warp_limit_edges_down" jsonb null, "least_unsupported_thickness" jsonb null, "largest_diameter" jsonb not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "equipment_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "equipment" add constraint "equipment_name_unique" unique ("name")`);
    this.addSql(
      `create table "credential" ("id" uuid not null, "person_id" uuid not null, "password_hash" text not null, "changed_at" timestamptz not null, constraint "credential_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "credential" add constraint "credential_person_id_unique" unique ("person_id")`);
    this.addSql(
      `create table "carrier" ("id" uuid not null, "name" text not null, "material" text not null, "note" text not null, "diameter" double precision not null, "thickness" jsonb not null, "youngs_modulus" jsonb not null, "poissons_ratio" jsonb not null, "expansion" jsonb null, "expansion_range" text not null, "density" jsonb not null, "thickness_variation" jsonb not null, "temperature_limit" jsonb not null, "passes_ultraviolet" boolean not null, "passes_infrared" boolean not null, "perforated" boolean not null, "reuse_limit" int not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "carrier_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "carrier" add constraint "carrier_name_unique" unique ("name")`);
    this.addSql(
      `create table "bonding_material" ("id" uuid not null, "name" text not null, "note" text not null, "effective_modulus" jsonb not null, "data_sheet_modulus" jsonb null, "poissons_ratio" jsonb not null, "expansion_below" jsonb not null, "expansion_above" jsonb not null, "softening" jsonb null, "flows" boolean not null, "bond_temperature" jsonb not null, "temperature_limit" jsonb not null, "least_thickness" double precision not null, "most_thickness" double precision not null, "thickness_variation_share" jsonb not null, "release" text not null, "release_temperature" jsonb not null, "thermal_cycles" int null, "vacuum" text not null, "solvent" text not null, "acid" text not null, "base" text not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "bonding_material_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "bonding_material" add constraint "bonding_material_name_unique" unique ("name")`);
    this.addSql(
      `create table "program" ("id" uuid not null, "name" text not null, "slug" text not null, "diameter" double precision not null, "purpose" text not null, "created_at" timestamptz not null, constraint "program_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "program" add constraint "program_name_unique" unique ("name")`);
    this.addSql(`alter table "program" add constraint "program_slug_unique" unique ("slug")`);
    this.addSql(
      `create table "membership" ("id" uuid not null, "person_id" uuid not null, "program_id" uuid not null, "role" text not null, "created_at" timestamptz not null, constraint "membership_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "membership_program_id_index" on "membership" ("program_id")`);
    this.addSql(
      `alter table "membership" add constraint "membership_person_id_program_id_unique" unique ("person_id", "program_id")`,
    );
    this.addSql(
      `create table "scan_file" ("id" uuid not null, "program_id" uuid not null, "name" text not null, "hash" text not null, "size" int not null, "bytes" bytea not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "scan_file_pkey" primary key ("id"))`,
    );
    this.addSql(
      `alter table "scan_file" add constraint "scan_file_program_id_hash_unique" unique ("program_id", "hash")`,
    );
    this.addSql(
      `create table "scan" ("id" uuid not null, "program_id" uuid not null, "label" text not null, "film_id" uuid null, "before_id" uuid not null, "after_id" uuid not null, "parameters" jsonb not null, "result" jsonb not null, "engine_version" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "scan_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "scan_program_id_index" on "scan" ("program_id")`);
    this.addSql(
      `create table "session" ("id" uuid not null, "person_id" uuid not null, "token_hash" text not null, "previous_token_hash" text null, "rotated_at" timestamptz not null, "created_at" timestamptz not null, "last_seen_at" timestamptz not null, "expires_at" timestamptz not null, "user_agent" text not null, constraint "session_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "session_person_id_index" on "session" ("person_id")`);
    this.addSql(`alter table "session" add constraint "session_token_hash_unique" unique ("token_hash")`);
    this.addSql(`create index "session_previous_token_hash_index" on "session" ("previous_token_hash")`);
    this.addSql(
      `create table "silicon" ("id" uuid not null, "name" text not null, "orientation" text not null, "diameter" double precision not null, "thickness" jsonb not null, "note" text not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "silicon_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "silicon" add constraint "silicon_name_unique" unique ("name")`);
    this.addSql(
      `create table "flow" ("id" uuid not null, "program_id" uuid not null, "name" text not null, "note" text not null, "silicon_id" uuid not null, "incoming_thickness" jsonb not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "flow_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "flow" add constraint "flow_program_id_name_unique" unique ("program_id", "name")`);
    this.addSql(
      `create table "flow_step" ("id" uuid not null, "program_id" uuid not null, "flow_id" uuid not null, "position" int not null, "kind" text not null, "title" text not null, "peak_temperature" double precision not null, "hold_time" double precision null, "equipment_id" uuid null, "exposures" jsonb not null, "planned" text not null, "silicon_after" jsonb null, "trim_width" jsonb null, "trim_depth" jsonb null, "carrier_id" uuid null, "bonding_material_id" uuid null, "bond_thickness" jsonb null, "ground_face_force" jsonb null, constraint "flow_step_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "flow_step_flow_id_position_index" on "flow_step" ("flow_id", "position")`);
    this.addSql(
      `create table "flow_step_film" ("id" uuid not null, "program_id" uuid not null, "step_id" uuid not null, "position" int not null, "change" text not null, "side" text not null, "film_id" uuid not null, "thickness" jsonb null, "stress" jsonb null, "coverage" double precision not null, constraint "flow_step_film_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "flow_step_film_film_id_index" on "flow_step_film" ("film_id")`);
    this.addSql(`create index "flow_step_film_step_id_position_index" on "flow_step_film" ("step_id", "position")`);
    this.addSql(
      `create table "assessment" ("id" uuid not null, "program_id" uuid not null, "flow_id" uuid not null, "number" int not null, "flow_name" text not null, "engine_version" text not null, "input_hash" text not null, "input" jsonb not null, "result" jsonb not null, "outcome" text not null, "created_at" timestamptz not null, "created_by_id" uuid not null, constraint "assessment_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "assessment_program_id_index" on "assessment" ("program_id")`);
    this.addSql(
      `alter table "assessment" add constraint "assessment_flow_id_number_unique" unique ("flow_id", "number")`,
    );
    this.addSql(
      `create table "site_limit" ("id" uuid not null, "key" text not null, "value" double precision not null, "source" text not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "site_limit_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "site_limit" add constraint "site_limit_key_unique" unique ("key")`);
    this.addSql(
      `create table "stack" ("id" uuid not null, "program_id" uuid not null, "name" text not null, "note" text not null, "silicon_id" uuid not null, "silicon_thickness" jsonb not null, "version" int not null default 1, "created_at" timestamptz not null, "created_by_id" uuid null, "updated_at" timestamptz not null, "updated_by_id" uuid null, constraint "stack_pkey" primary key ("id"))`,
    );
    this.addSql(`alter table "stack" add constraint "stack_program_id_name_unique" unique ("program_id", "name")`);
    this.addSql(
      `create table "stack_layer" ("id" uuid not null, "program_id" uuid not null, "stack_id" uuid not null, "side" text not null, "position" int not null, "film_id" uuid not null, "thickness" jsonb not null, "stress" jsonb null, "coverage" double precision not null, constraint "stack_layer_pkey" primary key ("id"))`,
    );
    this.addSql(`create index "stack_layer_film_id_index" on "stack_layer" ("film_id")`);
    this.addSql(
      `create index "stack_layer_stack_id_side_position_index" on "stack_layer" ("stack_id", "side", "position")`,
    );
    this.addSql(
      `alter table "film" add constraint "film_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "film" add constraint "film_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "equipment" add constraint "equipment_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "equipment" add constraint "equipment_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "credential" add constraint "credential_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "carrier" add constraint "carrier_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "carrier" add constraint "carrier_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "bonding_material" add constraint "bonding_material_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "bonding_material" add constraint "bonding_material_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "membership" add constraint "membership_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "membership" add constraint "membership_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan_file" add constraint "scan_file_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan_file" add constraint "scan_file_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan" add constraint "scan_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan" add constraint "scan_film_id_foreign" foreign key ("film_id") references "film" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "scan" add constraint "scan_before_id_foreign" foreign key ("before_id") references "scan_file" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan" add constraint "scan_after_id_foreign" foreign key ("after_id") references "scan_file" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "scan" add constraint "scan_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "session" add constraint "session_person_id_foreign" foreign key ("person_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "silicon" add constraint "silicon_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "silicon" add constraint "silicon_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow" add constraint "flow_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "flow" add constraint "flow_silicon_id_foreign" foreign key ("silicon_id") references "silicon" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "flow" add constraint "flow_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow" add constraint "flow_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_flow_id_foreign" foreign key ("flow_id") references "flow" ("id") on update cascade on delete cascade`,
    );
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_equipment_id_foreign" foreign key ("equipment_id") references "equipment" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_carrier_id_foreign" foreign key ("carrier_id") references "carrier" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow_step" add constraint "flow_step_bonding_material_id_foreign" foreign key ("bonding_material_id") references "bonding_material" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "flow_step_film" add constraint "flow_step_film_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "flow_step_film" add constraint "flow_step_film_step_id_foreign" foreign key ("step_id") references "flow_step" ("id") on update cascade on delete cascade`,
    );
    this.addSql(
      `alter table "flow_step_film" add constraint "flow_step_film_film_id_foreign" foreign key ("film_id") references "film" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "assessment" add constraint "assessment_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "assessment" add constraint "assessment_flow_id_foreign" foreign key ("flow_id") references "flow" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "assessment" add constraint "assessment_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "site_limit" add constraint "site_limit_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "site_limit" add constraint "site_limit_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "stack" add constraint "stack_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "stack" add constraint "stack_silicon_id_foreign" foreign key ("silicon_id") references "silicon" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "stack" add constraint "stack_created_by_id_foreign" foreign key ("created_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "stack" add constraint "stack_updated_by_id_foreign" foreign key ("updated_by_id") references "person" ("id") on update cascade on delete set null`,
    );
    this.addSql(
      `alter table "stack_layer" add constraint "stack_layer_program_id_foreign" foreign key ("program_id") references "program" ("id") on update cascade`,
    );
    this.addSql(
      `alter table "stack_layer" add constraint "stack_layer_stack_id_foreign" foreign key ("stack_id") references "stack" ("id") on update cascade on delete cascade`,
    );
    this.addSql(
      `alter table "stack_layer" add constraint "stack_layer_film_id_foreign" foreign key ("film_id") references "film" ("id") on update cascade`,
    );
  }

  override down(): void {
    this.addSql(`drop table "stack_layer" cascade`);
    this.addSql(`drop table "stack" cascade`);
    this.addSql(`drop table "site_limit" cascade`);
    this.addSql(`drop table "assessment" cascade`);
    this.addSql(`drop table "flow_step_film" cascade`);
    this.addSql(`drop table "flow_step" cascade`);
    this.addSql(`drop table "flow" cascade`);
    this.addSql(`drop table "silicon" cascade`);
    this.addSql(`drop table "session" cascade`);
    this.addSql(`drop table "scan" cascade`);
    this.addSql(`drop table "scan_file" cascade`);
    this.addSql(`drop table "membership" cascade`);
    this.addSql(`drop table "program" cascade`);
    this.addSql(`drop table "bonding_material" cascade`);
    this.addSql(`drop table "carrier" cascade`);
    this.addSql(`drop table "credential" cascade`);
    this.addSql(`drop table "equipment" cascade`);
    this.addSql(`drop table "film" cascade`);
    this.addSql(`drop table "person" cascade`);
    this.addSql(`drop table "audit_event" cascade`);
  }
}
