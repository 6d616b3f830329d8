import { defineEntity, p, type InferEntity } from "@mikro-orm/core";

/** The place of an audit event in the chain of its program, with a hash over it and all before it. The database alone adds them. */
export const AuditSeal = defineEntity({
  name: "AuditSeal",
  tableName: "audit_seal",
  uniques: [{ properties: ["chain", "number"] }],
  properties: {
    eventId: p.uuid().primary(),
    /** id of the program; nothing but zeros for what belongs to none */
    chain: p.uuid(),
    /** from 1 */
    number: p.integer(),
    hash: p.text(),
    sealedAt: p.datetime().index(),
  },
});
export type AuditSeal = InferEntity<typeof AuditSeal>;
