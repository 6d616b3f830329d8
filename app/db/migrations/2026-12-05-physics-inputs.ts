import { Migration } from "@mikro-orm/migrations";

const COLUMNS = [
  ["bonding_material", "glass_transition", "jsonb"],
  ["bonding_material", "flow_point", "jsonb"],
  ["flow", "incoming_bow_along", "jsonb"],
  ["flow", "incoming_bow_across", "jsonb"],
  ["flow", "incoming_film_share", "jsonb"],
  ["film", "zero_stress_temperature", "jsonb"],
  ["carrier", "mean_expansion_from", "double precision"],
  ["carrier", "mean_expansion_to", "double precision"],
];

/** A range in words that leaves no doubt, '25 to 150 °C mean', with its two temperatures caught. */
const RANGE = "^(\\d{1,3}) to (\\d{1,4}) °C";

/** What a flow says of itself besides; a plan that is put back must say it too. */
const BLANK_HEAD = { incomingBowAlong: null, incomingBowAcross: null, incomingFilmShare: null };

/** Library and flows take what the physics can use and nobody could give yet. What is there already has given none of it. */
export class PhysicsInputs extends Migration {
  override up(): void {
    for (const [table, column, type] of COLUMNS)
      this.addSql(`alter table "${table}" add column "${column}" ${type} null`);
    for (const [column, caught] of [
      ["mean_expansion_from", 1],
      ["mean_expansion_to", 2],
    ])
      this.addSql(
        `update "carrier" set ${column} = (regexp_match(expansion_range, '${RANGE}'))[${caught}]::double precision + 273.15
           where expansion is not null and expansion_range ~ '${RANGE}'`,
      );
    this.addSql(`update "flow_revision" set plan = plan || '${JSON.stringify(BLANK_HEAD)}' where plan is not null`);
  }

  override down(): void {
    for (const key of Object.keys(BLANK_HEAD)) this.addSql(`update "flow_revision" set plan = plan - '${key}'`);
    for (const [table, column] of COLUMNS) this.addSql(`alter table "${table}" drop column "${column}"`);
  }
}
