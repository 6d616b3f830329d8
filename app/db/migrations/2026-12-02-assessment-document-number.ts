import { Migration } from "@mikro-orm/migrations";

/** Assessments get a number that is given once in their program; those that are there get theirs in the order of their dates. */
export class AssessmentDocumentNumber extends Migration {
  override up(): void {
    this.addSql(`alter table "assessment" add column "document_number" int null`);
    // The one change of stored assessments that the database does not refuse: nothing that was assessed is touched.
    this.addSql(`alter table "assessment" disable trigger never_changes`);
    this.addSql(`
      update "assessment" set document_number = numbered.number
        from (select id, row_number() over (partition by program_id order by created_at, id) as number from "assessment") numbered
        where numbered.id = "assessment".id`);
    this.addSql(`alter table "assessment" enable trigger never_changes`);
    this.addSql(`alter table "assessment" alter column "document_number" set not null`);
    this.addSql(
      `alter table "assessment" add constraint "assessment_program_id_document_number_unique" unique ("program_id", "document_number")`,
    );
  }

  override down(): void {
    this.addSql(`alter table "assessment" drop constraint "assessment_program_id_document_number_unique"`);
    this.addSql(`alter table "assessment" drop column "document_number"`);
  }
}
