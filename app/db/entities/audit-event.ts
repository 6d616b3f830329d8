import { defineEntity, p, type InferEntity } from "@mikro-orm/core";

/**
 * One field that changed, with from, to, who and when. Rows are only ever added. Actor, program and subject are kept as plain
 * ids and names, so the trail outlives what it speaks of.
 */
export const AuditEvent = defineEntity({
  name: "AuditEvent",
  tableName: "audit_event",
  indexes: [{ properties: ["subject", "subjectId"] }, { properties: ["programId", "at"] }, { properties: ["at"] }],
  properties: {
    id: p.uuid().primary(),
    at: p.datetime(),
    actorId: p.uuid().nullable(),
    programId: p.uuid().nullable(),
    action: p.text().$type<"created" | "changed" | "removed" | "signed in" | "signed out" | "refused">(),
    /** what kind of record, in words */
    subject: p.text(),
    subjectId: p.uuid().nullable(),
    field: p.text().nullable(),
    from: p.json().nullable(),
    to: p.json().nullable(),
    requestId: p.text(),
  },
});
export type AuditEvent = InferEntity<typeof AuditEvent>;
