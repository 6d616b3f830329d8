import type { ShouldRevalidateFunctionArgs } from "react-router";
import { CarrierPieces } from "#app/components/carriers/CarrierPieces.tsx";
import { KindDetail } from "#app/components/carriers/KindDetail.tsx";
import { kindPath } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { saveCarrierUnitForm } from "#app/services/library/carrier-unit-form.server.ts";
import { getKindPage, requireKind } from "#app/services/library/kind-pages.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/detail";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Carriers & bonds"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const page = await getKindPage(scopeOf(context), requireKind(params.kind), params.recordId, url.searchParams);
  if (page.units) withinPages(url, page.units.page);
  return page;
}

/** Only carriers have pieces, and nothing else of a record is changed here. */
export async function action({ request, context, params, url }: Route.ActionArgs) {
  const slug = requireKind(params.kind);
  if (slug !== "carriers") throw notFound("piece");
  const carrierId = idFrom(params.recordId, "carrier");
  const back = `${kindPath(slug)}/${carrierId}${url.search}#pieces`;
  return saveCarrierUnitForm(request, scopeOf(context), { carrierId, back });
}

/** After a conflict the pieces are to be seen as they are now. */
export function shouldRevalidate({ actionStatus, defaultShouldRevalidate }: ShouldRevalidateFunctionArgs): boolean {
  return actionStatus === 409 || defaultShouldRevalidate;
}

export default function Detail({ loaderData, actionData }: Route.ComponentProps) {
  return (
    <>
      <KindDetail {...loaderData} />
      {loaderData.units && loaderData.slug === "carriers" && (
        <CarrierPieces
          units={loaderData.units}
          limit={loaderData.record.reuseLimit}
          mayEdit={loaderData.mayEdit}
          answer={actionData ?? null}
        />
      )}
    </>
  );
}
