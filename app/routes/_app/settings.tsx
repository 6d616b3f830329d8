import { data, redirect } from "react-router";
import { SiteSettingsPage } from "#app/components/settings/SiteSettingsPage.tsx";
import { siteSettingSchema } from "#app/schemas/site-setting.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { saveSiteSettings, siteSettings } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/settings";

export const meta: Route.MetaFunction = () => [{ title: "Site settings · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  return { ...(await siteSettings(scopeOf(context))), saved: url.searchParams.has("saved") };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit site settings");
  const { submission } = await readForm(request, siteSettingSchema);
  if (submission.status !== "success")
    throw problem(400, "These settings could not be read. Open the page again and choose from it.");
  const saved = await saveSiteSettings(scope, submission.value);
  if (saved.outcome === "refused")
    return data({ reason: saved.reason, version: saved.version, chosen: submission.value.paper }, { status: 409 });
  throw redirect("/settings?saved");
}

export default function SiteSettings({ loaderData, actionData }: Route.ComponentProps) {
  return <SiteSettingsPage {...loaderData} refused={actionData} />;
}
