import { data, Link, redirect } from "react-router";
import { CarrierPlaces } from "#app/components/carriers/CarrierPlaces.tsx";
import { LimitsForm } from "#app/components/carriers/LimitsForm.tsx";
import { LimitsTable } from "#app/components/carriers/LimitsTable.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import { isChanged, searchLimits } from "#app/lib/limit-rows.ts";
import { limitsSchema } from "#app/schemas/site-limit.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { limitsOfRule, listLimits, saveLimits } from "#app/services/limits.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/limits";

export const meta: Route.MetaFunction = () => [{ title: "Limits · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const limits = await listLimits(scopeOf(context));
  const editing = limits.mayEdit ? Number(url.searchParams.get("rule")) : 0;
  return { ...limits, editing, query: (url.searchParams.get("q") ?? "").trim().slice(0, 100) };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit carriers, bonds and limits");
  const rule = Number(url.searchParams.get("rule"));
  const keys = limitsOfRule(rule);
  if (keys.length === 0) throw notFound("rule");
  const { submission } = await readForm(request, limitsSchema(keys));
  if (submission.status !== "success") return data({ lastResult: submission.reply(), opened: {} }, { status: 400 });
  const saved = await saveLimits(scope, submission.value);
  if (saved.outcome === "refused")
    return data({ lastResult: submission.reply({ fieldErrors: saved.errors }), opened: saved.opened }, { status: 409 });
  throw redirect(`/carriers/limits#rule-${rule}`);
}

export default function Limits({ loaderData, actionData }: Route.ComponentProps) {
  const { groups, mayEdit, editing, query } = loaderData;
  const all = groups.flatMap(({ limits }) => limits);
  const shown = searchLimits(groups, query);
  const found = shown.reduce((sum, { limits }) => sum + limits.length, 0);
  const changed = all.filter(isChanged).length;
  return (
    <>
      <CarrierPlaces />
      <PageHead
        title="Limits"
        remark={
          query
            ? `${found} of ${all.length} limits`
            : `${all.length} limits, ${changed === 0 ? "all" : all.length - changed} as delivered`
        }
      />
      <p className="mb-4 max-w-[60em] text-quiet">
        What the handling rules judge by. At a limit a step passes with caution; beyond it the step fails. Each is this
        site’s to set: common practice is a habit of the trade, not a published figure.
      </p>
      <ListHead what="limits" />
      {shown.length === 0 && (
        <EmptyState
          title="No limit fits"
          actions={
            <Link to="/carriers/limits" className="btn">
              All limits
            </Link>
          }
        >
          Search by a word of a limit, of its source or of its rule, or by ‘rule 6’.
        </EmptyState>
      )}
      {shown.length > 0 && (
        <div className="frame">
          {shown.map((group) => (
            <div key={group.rule} className="border-t border-ink first:border-0">
              {group.rule === editing ? (
                <LimitsForm group={group} lastResult={actionData?.lastResult} opened={actionData?.opened ?? {}} />
              ) : (
                <LimitsTable group={group} mayEdit={mayEdit} />
              )}
            </div>
          ))}
        </div>
      )}
    </>
  );
}
