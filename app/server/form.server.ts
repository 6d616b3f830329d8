import type { Submission } from "@conform-to/react";
import { parseWithZod } from "@conform-to/zod/v4";
import type { z } from "zod";
import type { Saved } from "#app/services/record.server.ts";
import { problem } from "./problem.server.ts";

/**
 * A posted form as its schema understands it.
 * @throws 400 for what none of our forms sends: another media type, a broken list button, a character that cannot be kept
 */
export async function readForm<Schema extends z.ZodType>(request: Request, schema: Schema) {
  const unreadable = () => problem(400, "This form could not be read. Open the page again and send it once more.");
  const formData = await request.formData().catch(() => {
    throw unreadable();
  });
  if ([...formData.values()].some((value) => typeof value === "string" && value.includes("\0"))) throw unreadable();
  try {
    return { formData, submission: parseWithZod(formData, { schema }) };
  } catch {
    throw unreadable();
  }
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
