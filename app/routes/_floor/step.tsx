import { randomUUID } from "node:crypto";
import { redirect } from "react-router";
import { FloorStepPage } from "#app/components/floor/FloorStepPage.tsx";
import { FLOOR_DEEDS, floorPath } from "#app/lib/floor/floor-path.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { floorLot } from "#app/services/floor/floor-lot.server.ts";
import { floorForm } from "./floor-forms.server.ts";
import type { Route } from "./+types/step";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  {
    title: `${loaderData ? `Step ${loaderData.step.number}, lot ${loaderData.lot.name}` : "Step"} · Floor · Planeward`,
  },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const lot = await floorLot(scopeOf(context), params.lotId, url.searchParams.get("part"));
  const { sheet } = lot;
  if (!sheet) throw redirect(`/floor/lots/${params.lotId}`);
  const step = sheet.steps.find(({ number }) => String(number) === params.number);
  if (!step) throw notFound("step of this sheet");
  const asked = url.searchParams.get("do");
  return { lot, sheet, step, deed: FLOOR_DEEDS.find((deed) => deed === asked) ?? null, newId: randomUUID() };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  return floorForm(scopeOf(context), params.lotId, request, (form) => {
    const leg = Number(form.get("leg") ?? 0);
    const next = form.get("next");
    const goesOn = form.get("kind") === "done" && typeof next === "string" && /^\d{1,3}$/.test(next);
    return floorPath(params.lotId, goesOn ? Number(next) : Number(params.number), leg);
  });
}

export default function Step({ loaderData, actionData }: Route.ComponentProps) {
  return <FloorStepPage {...loaderData} answer={actionData} />;
}
