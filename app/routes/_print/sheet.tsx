import { SheetPage } from "#app/components/sheet/SheetPage.tsx";
import { paperAskedFor } from "#app/lib/paper-size.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { draftSheet } from "#app/services/sheets/draft-sheet.server.ts";
import type { Route } from "./+types/sheet";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  {
    title: `${loaderData ? `Handling-risk sheet ${loaderData.document.titleBlock.number}` : "Handling-risk sheet"} · Planeward`,
  },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return {
    ...(await draftSheet(scopeOf(context), params.assessmentId, url.searchParams.get("leg"))),
    paper: paperAskedFor(url.searchParams.get("paper")),
    printedAt: new Date().toISOString(),
  };
}

export default function Sheet({ loaderData }: Route.ComponentProps) {
  return <SheetPage {...loaderData} />;
}
