import { Validator } from "@seriousme/openapi-schema-validator";
import { expect, test } from "vitest";
import { useDatabase } from "#tests/db/test-database.ts";

useDatabase();

const document = async () => (await import("#app/services/api/document.server.ts")).apiDocument();

test("the document is OpenAPI 3.1, and names every operation once", { timeout: 60_000 }, async () => {
  const { OPERATIONS } = await import("#app/services/api/registry.server.ts");
  const made = JSON.parse(JSON.stringify(await document())) as Record<string, unknown>;
  expect(await new Validator().validate(made)).toMatchObject({ valid: true });
  const paths = made["paths"] as Record<string, Record<string, { operationId: string }>>;
  const named = Object.values(paths).flatMap((methods) => Object.values(methods).map(({ operationId }) => operationId));
  expect(named.toSorted()).toEqual(OPERATIONS.map(({ id }) => id).toSorted());
  expect(new Set(named).size).toBe(named.length);
});

test("every number of the document says its unit, or counts", async () => {
  const unitless = /^(value|tolerance|coverage|radius|stability_ratio|done|total|poissons_ratio|points|limit)$/;
  const units = /_(m|Pa|K|rad|s|N_per_m|per_K|bytes)$/;
  const wrong: string[] = [];
  const walk = (schema: unknown, name: string): void => {
    if (typeof schema !== "object" || schema === null) return;
    if ("type" in schema && [schema.type].flat().includes("number") && !unitless.test(name) && !units.test(name))
      wrong.push(name);
    for (const [key, child] of Object.entries(schema))
      if (key === "properties") for (const [property, of] of Object.entries(child as object)) walk(of, property);
      else if (key !== "required" && key !== "enum") walk(child, name);
  };
  walk(JSON.parse(JSON.stringify(await document())), "");
  expect(wrong).toEqual([]);
});
