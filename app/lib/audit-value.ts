/** What a reader can do nothing with. */
const ID = /^[0-9a-f]{8}-(?:[0-9a-f]{4}-){3}[0-9a-f]{12}$/;

/**
 * A value of the audit trail in words: texts as they are, a record as its fields one after the other, without ids and what is empty.
 * @param json as the trail has it
 */
export function auditValue(json: string): string {
  return inWords(JSON.parse(json));
}

function inWords(value: unknown): string {
  if (Array.isArray(value)) return value.map(inWords).join(", ");
  if (typeof value !== "object" || value === null) return String(value ?? "nothing");
  return Object.entries(value)
    .filter(([, each]) => each !== null && each !== "" && !(typeof each === "string" && ID.test(each)))
    .map(([field, each]) => `${field} ${typeof each === "object" ? `(${inWords(each)})` : String(each)}`)
    .join(", ");
}
