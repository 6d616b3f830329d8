import { data, redirect } from "react-router";
import { savedFilterFormSchema } from "#app/schemas/kept.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { keepFilter, removeFilter } from "#app/services/kept/saved-filters.server.ts";
import { localPath } from "#app/lib/local-path.ts";
import type { Route } from "./+types/saved-filters";

/** There is nothing to see here: kept searches stand above their lists. */
export function loader() {
  throw redirect("/");
}

/**
 * Keeps a search of a list or removes one. Where the form says where to go back to, it comes from a page without scripts, whose
 * refusal is a page too.
 */
export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const form = await postedForm(request);
  const back = form.get("back");
  const fault = form.get("intent") === "remove" ? await remove(scope, form) : await keep(scope, form);
  if (typeof back !== "string") return data({ fault }, { status: fault === null ? 200 : 400 });
  if (fault !== null) throw problem(400, fault);
  throw redirect(localPath(back));
}

type Scope = ReturnType<typeof scopeOf>;

async function remove(scope: Scope, form: FormData): Promise<null> {
  await removeFilter(scope, String(form.get("id") ?? ""));
  return null;
}

async function keep(scope: Scope, form: FormData): Promise<string | null> {
  const submission = parseForm(form, savedFilterFormSchema);
  if (submission.status === "success") return keepFilter(scope, submission.value);
  return submission.error?.["name"]?.[0] ?? "This search cannot be kept. Search the list, then keep it.";
}
