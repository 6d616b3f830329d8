import { data } from "react-router";
import { SheetStatusPage } from "#app/components/sheet/released/SheetStatusPage.tsx";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { sheetStatus } from "#app/services/sheets/sheet-status.server.ts";
import type { Route } from "./+types/sheet-status";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.status ? `${loaderData.status.sheet} ${loaderData.status.letter}` : "Sheet"} · Planeward` },
  { name: "robots", content: "noindex" },
];

/** What the code on a paper leads to: whether the paper is still current, and nothing of what it says. */
export async function loader({ params, context }: Route.LoaderArgs) {
  const status = await sheetStatus(params.token, context.get(requestIdContext));
  const now = new Date().toISOString();
  return data({ status, now }, { status: status ? 200 : 404, headers: { "Cache-Control": "no-store" } });
}

export default function SheetStatusRoute({ loaderData }: Route.ComponentProps) {
  return <SheetStatusPage {...loaderData} />;
}
