import type { ApiField, ApiOperationView, ApiReference } from "#app/schemas/api-reference.ts";
import { apiDocument } from "./document.server.ts";
import { OPERATIONS } from "./registry.server.ts";

/** A JSON schema as the document has it; what is not read here is left out. */
interface Schema {
  type?: string | string[];
  properties?: Record<string, Schema>;
  required?: string[];
  items?: Schema;
  enum?: unknown[];
  anyOf?: Schema[];
  oneOf?: Schema[];
  allOf?: Schema[];
  format?: string;
  description?: string;
}

interface DocumentOperation {
  parameters?: { name: string; in: string; required?: boolean; schema: Schema }[];
  requestBody?: { content: Record<string, { schema: Schema }> };
  responses: Record<string, { content?: Record<string, { schema: Schema }> }>;
}

/** Fields deeper than this are told by the document alone. */
const DEEPEST = 4;

/** The reference that people read, from the same document that programs read. */
export function apiReference(): ApiReference {
  const { paths = {} } = JSON.parse(JSON.stringify(apiDocument())) as {
    paths?: Record<string, Record<string, DocumentOperation>>;
  };
  const groups = new Map<string, ApiOperationView[]>();
  for (const { id, method, path, group, summary, scope, status = 200 } of OPERATIONS) {
    const described = paths[path]?.[method.toLowerCase()];
    if (!described) continue;
    const [bodyType = null] = Object.keys(described.requestBody?.content ?? {});
    const body = bodyType === null ? undefined : described.requestBody?.content[bodyType]?.schema;
    const answer = described.responses[String(status)]?.content?.["application/json"]?.schema;
    const view: ApiOperationView = {
      id,
      method,
      path: `/api/v1${path}`,
      summary,
      scope,
      query: (described.parameters ?? [])
        .filter((parameter) => parameter.in !== "path")
        .map(({ name, required = false, schema }) => ({
          name,
          type: typeOf(schema),
          required,
          about: schema.description ?? "",
        })),
      body: body ? fieldsOf(body) : [],
      bodyType,
      answer: answer ? fieldsOf(answer) : [],
      status,
      statuses: Object.keys(described.responses).map(Number),
    };
    groups.set(group, [...(groups.get(group) ?? []), view]);
  }
  return { groups: [...groups].map(([name, operations]) => ({ name, operations })) };
}

/** The parts of a schema that is put together of several. */
const partsOf = ({ anyOf, oneOf, allOf }: Schema) => anyOf ?? oneOf ?? allOf ?? [];
const inner = (schema: Schema): Schema =>
  schema.properties || schema.items
    ? schema
    : (partsOf(schema).find((part) => part.properties ?? part.items) ?? schema);

function fieldsOf(schema: Schema, before = "", depth = 0): ApiField[] {
  const { properties = {}, required = [] } = inner(schema);
  return Object.entries(properties).flatMap(([key, of]) => {
    const name = `${before}${key}`;
    const field = { name, type: typeOf(of), required: required.includes(key), about: of.description ?? "" };
    if (depth === DEEPEST) return [field];
    const { items } = inner(of);
    return [field, ...fieldsOf(items ?? of, items ? `${name}[].` : `${name}.`, depth + 1)];
  });
}

function typeOf(schema: Schema): string {
  if (schema.enum) return schema.enum.map(String).join(", ");
  const parts = partsOf(schema);
  if (parts.length > 0) return parts.map(typeOf).join(" or ");
  const type = [schema.type ?? "anything"].flat().join(" or ");
  return schema.format ? `${type}, ${schema.format}` : type;
}
