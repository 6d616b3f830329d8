import { CarrierPlaces } from "#app/components/carriers/CarrierPlaces.tsx";
import { KindForm } from "#app/components/carriers/KindForm.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { KIND_KEYS, KINDS, kindPath } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getKindRecord, requireKind } from "#app/services/library/kind-pages.server.ts";
import { saveLibraryForm } from "#app/services/library/library-form.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import { idFrom } from "#app/services/uuid.server.ts";
import type { Route } from "./+types/edit";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Carriers & bonds"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  requireOnSite(scope, "edit carriers, bonds and limits");
  return getKindRecord(scope, requireKind(params.kind), params.recordId);
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const slug = requireKind(params.kind);
  const id = idFrom(params.recordId, KINDS[slug].one);
  return saveLibraryForm(request, scopeOf(context), KIND_KEYS[slug], { id, list: kindPath(slug) });
}

export default function Edit({ loaderData, actionData }: Route.ComponentProps) {
  const { slug, record, stamp } = loaderData;
  return (
    <>
      <CarrierPlaces />
      <PageHead
        title={record.name}
        crumbs={[{ name: KINDS[slug].title, path: kindPath(slug) }]}
        remark={`Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
      />
      <KindForm
        {...loaderData}
        version={actionData?.version ?? stamp.version}
        lastResult={actionData?.lastResult}
        back={`${kindPath(slug)}/${record.id}`}
      />
    </>
  );
}
