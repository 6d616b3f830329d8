import type { Submission } from "@conform-to/react";
import type { z } from "zod";
import type { Saved } from "#app/services/record.server.ts";
import { parseForm } from "./parse-form.server.ts";
import { problem } from "./problem.server.ts";

/** A field's name as our forms have them: at most one list, of at most a hundred lines. */
const FIELD = /^\w+(?:\[\d{1,2}\])?(?:\.\w+){0,2}$/;

/**
 * The fields of a posted form.
 * @throws 400 for a request that is no form
 */
export async function postedForm(request: Request): Promise<FormData> {
  return ownFields(
    await request.formData().catch(() => {
      throw problem(400, "What was sent is not a form. Open the page again and send its form.");
    }),
  );
}

/**
 * Fields as they were posted. NUL, which the database does not know, is taken out of texts; what no form of ours could have sent is
 * passed over, so that a made-up list of a million lines is not shown back.
 */
export function ownFields(posted: FormData): FormData {
  const formData = new FormData();
  for (const [name, value] of posted)
    if (FIELD.test(name)) formData.append(name, typeof value === "string" ? value.replaceAll("\0", "") : value);
  return formData;
}

/** A posted form as its schema understands it. */
export async function readForm<Schema extends z.ZodType>(request: Request, schema: Schema) {
  const formData = await postedForm(request);
  return { formData, submission: parseForm(formData, schema) };
}

/** The hidden version of a record's form; null for a new record. */
export function versionOf(formData: FormData): number | null {
  const text = formData.get("version");
  return typeof text === "string" && /^\d+$/.test(text) ? Number(text) : null;
}

/** What the form is told when a save did not go through; null when it did. */
export function saveProblem(saved: Saved, what: string) {
  if (saved.outcome === "saved") return null;
  if (saved.outcome === "name taken") return { fieldErrors: { name: [`There is already a ${what} of that name.`] } };
  const { by, at } = saved.conflict;
  return {
    formErrors: [
      `${by} saved this ${what} at ${at.slice(0, 16).replace("T", " ")} UTC, after you had opened it. Save again to put yours in its place, or reload to take theirs.`,
    ],
  };
}

/** The answer to a form that was not saved: everything typed goes back, with what is wrong. */
export function refusal<Value>(submission: Submission<Value>, saved: Saved | null, what: string) {
  const version = saved?.outcome === "conflict" ? saved.conflict.version : null;
  const problem = saved && saveProblem(saved, what);
  return { lastResult: submission.reply(problem ?? {}), version };
}

/** Status of an answer to a form that was not saved: a fault in it, or only a line of a list added, moved or taken out. */
export function statusOf({ status }: Pick<Submission<unknown>, "status">): 200 | 400 {
  return status === "error" ? 400 : 200;
}
