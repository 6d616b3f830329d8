import { randomUUID } from "node:crypto";
import { FloorLotPage } from "#app/components/floor/FloorLotPage.tsx";
import { floorPath } from "#app/lib/floor/floor-path.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { floorLot } from "#app/services/floor/floor-lot.server.ts";
import { floorForm } from "./floor-forms.server.ts";
import type { Route } from "./+types/lot";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData ? `Lot ${loaderData.lot.name}` : "Lot"} · Floor · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const lot = await floorLot(scopeOf(context), params.lotId, url.searchParams.get("part"));
  return { lot, newId: randomUUID() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return floorForm(scopeOf(context), params.lotId, request, (form) =>
    floorPath(params.lotId, null, Number(form.get("leg") ?? 0)),
  );
}

export default function Lot({ loaderData, actionData }: Route.ComponentProps) {
  return <FloorLotPage {...loaderData} refused={actionData?.sentence ?? null} />;
}
