import { SheetPage } from "#app/components/sheet/SheetPage.tsx";
import { paperAskedFor } from "#app/lib/paper-size.ts";
import { sheetView } from "#app/lib/sheet-view.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getAssessment } from "#app/services/assessments/assessments.server.ts";
import type { Route } from "./+types/sheet";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `Handling-risk sheet ${loaderData.sheet.number}` : "Handling-risk sheet"} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const { result, ...head } = await getAssessment(scopeOf(context), params.assessmentId);
  return {
    sheet: sheetView(head, result, url.searchParams.get("leg")),
    paper: paperAskedFor(url.searchParams.get("paper")),
    printedAt: new Date().toISOString(),
  };
}

export default function Sheet({ loaderData }: Route.ComponentProps) {
  return <SheetPage {...loaderData} />;
}
