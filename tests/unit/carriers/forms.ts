import { parseWithZod } from "@conform-to/zod/v4";
import type { z } from "zod";

/** A form as a browser sends it: nested texts by their field names, boxes only when ticked. */
export type Sent = Record<string, string>;

/** What the server makes of a sent form: its value, or the message at every field. */
export function send<Schema extends z.ZodType>(
  schema: Schema,
  sent: Sent,
): { value: z.output<Schema> | undefined; errors: Record<string, string[] | null> } {
  const formData = new FormData();
  for (const [name, text] of Object.entries(sent)) formData.append(name, text);
  const submission = parseWithZod(formData, { schema });
  return submission.status === "success"
    ? { value: submission.value, errors: {} }
    : { value: undefined, errors: submission.error ?? {} };
}

/** The fields of a measured property. */
export function property(
  name: string,
  value: string,
  rest: { tolerance?: string; note?: string; on?: string } = {},
): Sent {
  const fields = { value, source: "supplier", ...rest };
  return Object.fromEntries(Object.entries(fields).map(([field, text]) => [`${name}.${field}`, text]));
}
