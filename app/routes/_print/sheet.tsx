import { SheetPage } from "#app/components/sheet/SheetPage.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { draftSheet } from "#app/services/sheets/draft-sheet.server.ts";
import { paperFor } from "#app/services/site-settings.server.ts";
import type { Route } from "./+types/sheet";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  {
    title: `${loaderData ? `Handling-risk sheet ${loaderData.document.titleBlock.number}` : "Handling-risk sheet"} · Planeward`,
  },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return {
    ...(await draftSheet(scopeOf(context), params.assessmentId, url.searchParams.get("leg"))),
    paper: await paperFor(scopeOf(context), url),
    printedAt: new Date().toISOString(),
  };
}

export default function Sheet({ loaderData }: Route.ComponentProps) {
  return <SheetPage {...loaderData} />;
}
