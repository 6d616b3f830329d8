import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ApiScope } from "#app/schemas/api-token.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/**
 * With what a program of somebody's own asks the API in their name. It is shown once; only its SHA-256 is kept. Nothing of it changes
 * but when it was last used, and that it was revoked.
 */
export const ApiToken = defineEntity({
  name: "ApiToken",
  tableName: "api_token",
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).index(),
    program: () => p.manyToOne(Program).index(),
    name: p.text(),
    tokenHash: p.text().unique().hidden(),
    /** its first characters, by which it is told from another */
    beginning: p.text(),
    scopes: p.json<ApiScope[]>(),
    createdAt: p.datetime(),
    expiresAt: p.datetime(),
    lastUsedAt: p.datetime().nullable(),
    revokedAt: p.datetime().nullable(),
    revokedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
  },
});
export type ApiToken = InferEntity<typeof ApiToken>;
