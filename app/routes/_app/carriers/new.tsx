import { CarrierPlaces } from "#app/components/carriers/CarrierPlaces.tsx";
import { KindForm } from "#app/components/carriers/KindForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { KIND_KEYS, KINDS, kindPath } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { requireKind } from "#app/services/library/kind-pages.server.ts";
import { saveLibraryForm } from "#app/services/library/library-form.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/new";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `New ${KINDS[loaderData.slug].one}` : "Carriers & bonds"} · Planeward` },
];

export function loader({ context, params }: Route.LoaderArgs) {
  requireOnSite(scopeOf(context), "edit carriers, bonds and limits");
  return { slug: requireKind(params.kind) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const slug = requireKind(params.kind);
  return saveLibraryForm(request, scopeOf(context), KIND_KEYS[slug], { id: null, list: kindPath(slug) });
}

export default function New({ loaderData: { slug }, actionData }: Route.ComponentProps) {
  const { title, one } = KINDS[slug];
  return (
    <>
      <CarrierPlaces />
      <PageHead title={`New ${one}`} crumbs={[{ name: title, path: kindPath(slug) }]} />
      <KindForm slug={slug} record={null} version={null} lastResult={actionData?.lastResult} back={kindPath(slug)} />
    </>
  );
}
