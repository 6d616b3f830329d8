import { parseWithZod } from "@conform-to/zod/v4";
import type { z } from "zod";
import { problem } from "./problem.server.ts";

/** Name under which a form says that it only adds, moves or removes a row. */
const INTENT = "__intent__";

/**
 * A form as its schema understands it. An intent that is none is passed over.
 * @throws 400 for an intent that does not fit the form, such as removing a row of what is no list
 */
export function parseForm<Schema extends z.ZodType>(formData: FormData, schema: Schema) {
  const intent = formData.get(INTENT);
  if (intent !== null && !isIntent(intent)) formData.delete(INTENT);
  try {
    return parseWithZod(formData, { schema });
  } catch {
    throw problem(400, "This form could not be read. Open the page again and send it once more.");
  }
}

function isIntent(text: FormDataEntryValue): boolean {
  try {
    const intent: unknown = JSON.parse(String(text));
    return typeof intent === "object" && intent !== null && "type" in intent && "payload" in intent;
  } catch {
    return false;
  }
}
