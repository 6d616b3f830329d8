import { parseWithZod } from "@conform-to/zod/v4";
import type { z } from "zod";

/** Name under which a form says that it only adds, moves or removes a row. */
const INTENT = "__intent__";

/** A form as its schema understands it. An intent that no form of ours sends is passed over instead of ending in a fault. */
export function parseForm<Schema extends z.ZodType>(formData: FormData, schema: Schema) {
  const intent = formData.get(INTENT);
  if (intent !== null && !isIntent(intent)) formData.delete(INTENT);
  return parseWithZod(formData, { schema });
}

function isIntent(text: FormDataEntryValue): boolean {
  try {
    const intent: unknown = JSON.parse(String(text));
    return typeof intent === "object" && intent !== null && "type" in intent && "payload" in intent;
  } catch {
    return false;
  }
}
