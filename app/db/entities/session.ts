import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/**
 * A signed-in browser. The cookie carries an opaque token; only its SHA-256 is kept. The token is replaced while in use;
 * the one before it stays good for a moment, for requests that were already on their way.
 */
export const Session = defineEntity({
  name: "Session",
  tableName: "session",
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).index(),
    tokenHash: p.text().unique().hidden(),
    previousTokenHash: p.text().nullable().index(),
    rotatedAt: p.datetime(),
    createdAt: p.datetime(),
    lastSeenAt: p.datetime(),
    expiresAt: p.datetime(),
    /** when the person last proved who they are */
    provenAt: p.datetime(),
    userAgent: p.text(),
  },
});
export type Session = InferEntity<typeof Session>;
