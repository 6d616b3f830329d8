import { redirect } from "react-router";
import { PreferencesPage } from "#app/components/preferences/PreferencesPage.tsx";
import { preferencesFormSchema } from "#app/schemas/preference.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { preferencesFor, savePreferences } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/preferences";

export const meta: Route.MetaFunction = () => [{ title: "Preferences · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return { preferences: await preferencesFor(scopeOf(context)), saved: url.searchParams.has("saved") };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, preferencesFormSchema);
  if (submission.status !== "success")
    throw problem(400, "These preferences could not be read. Open the page again and choose from it.");
  const scope = scopeOf(context);
  const given = Object.entries(submission.value).filter(([, value]) => value !== undefined);
  await savePreferences(scope, { ...(await preferencesFor(scope)), ...Object.fromEntries(given) });
  // The page that says so is drawn by them already.
  throw redirect("/preferences?saved");
}

export default function PreferencesRoute({ loaderData }: Route.ComponentProps) {
  return <PreferencesPage {...loaderData} />;
}
