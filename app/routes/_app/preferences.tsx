import { data } from "react-router";
import { PreferencesPage } from "#app/components/preferences/PreferencesPage.tsx";
import { preferencesFormSchema } from "#app/schemas/preference.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { preferencesFor, savePreferences } from "#app/services/kept/mine.server.ts";
import type { Route } from "./+types/preferences";

export const meta: Route.MetaFunction = () => [{ title: "Preferences · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { preferences: await preferencesFor(scopeOf(context)) };
}

export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, preferencesFormSchema);
  if (submission.status !== "success")
    throw problem(400, "These preferences could not be read. Open the page again and choose from it.");
  const { theme, density, singleKeys } = submission.value;
  await savePreferences(scopeOf(context), { theme, density, singleKeys: singleKeys === "on" });
  return data({ saved: true });
}

export default function PreferencesRoute({ loaderData, actionData }: Route.ComponentProps) {
  return <PreferencesPage preferences={loaderData.preferences} saved={actionData?.saved ?? false} />;
}
