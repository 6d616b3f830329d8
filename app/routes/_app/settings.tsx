import { data, redirect } from "react-router";
import { SiteSettingsPage } from "#app/components/settings/SiteSettingsPage.tsx";
import { codesRequiredSchema } from "#app/schemas/codes-required.ts";
import { printRetentionSchema } from "#app/schemas/print-retention.ts";
import { siteSettingSchema } from "#app/schemas/site-setting.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { parseForm } from "#app/server/parse-form.server.ts";
import { postedProof } from "#app/server/posted-proof.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { codesRequiredFor, saveCodesRequired } from "#app/services/codes/required-codes.server.ts";
import { proofAsked, proveAgain } from "#app/services/people/recent-proof.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { saveSiteSettings, siteSettings } from "#app/services/site-settings.server.ts";
import { printRetention, savePrintRetention } from "#app/services/sheets/print-retention.server.ts";
import type { Route } from "./+types/settings";

const UNREAD = "These settings could not be read. Open the page again and choose from it.";

export const meta: Route.MetaFunction = () => [{ title: "Site settings · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  return {
    ...(await siteSettings(scope)),
    retention: await printRetention(scope),
    codesFor: await codesRequiredFor(scope),
    proofAsked: proofAsked(scope),
    saved: url.searchParams.has("saved"),
  };
}

export async function action({ request, context }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit site settings");
  const formData = await postedForm(request);
  if (formData.get("intent") === "prints") {
    const kept = parseForm(formData, printRetentionSchema);
    if (kept.status !== "success") throw problem(400, UNREAD);
    await savePrintRetention(scope, kept.value.kept);
    throw redirect("/settings?saved");
  }
  if (formData.get("intent") === "codes") {
    const asked = codesRequiredSchema.safeParse({ roles: formData.getAll("roles") });
    if (!asked.success) throw problem(400, UNREAD);
    const proven = await proveAgain(scope, postedProof(formData));
    if (proven.fault !== null)
      return data({ codes: { ticked: asked.data.roles, fault: proven.fault }, refused: undefined }, { status: 400 });
    await saveCodesRequired(proven.scope, asked.data.roles);
    throw redirect("/settings?saved");
  }
  const submission = parseForm(formData, siteSettingSchema);
  if (submission.status !== "success") throw problem(400, UNREAD);
  const saved = await saveSiteSettings(scope, submission.value);
  if (saved.outcome === "refused")
    return data(
      {
        refused: { reason: saved.reason, version: saved.version, chosen: submission.value.paper },
        codes: undefined,
      },
      { status: 409 },
    );
  throw redirect("/settings?saved");
}

export default function SiteSettings({ loaderData, actionData }: Route.ComponentProps) {
  return <SiteSettingsPage {...loaderData} refused={actionData?.refused} codes={actionData?.codes} />;
}
