import { data } from "react-router";
import { WindowPage } from "#app/components/assessments/WindowPage.tsx";
import { byServer, readSent } from "#app/lib/read-sent.ts";
import type { SentWindow } from "#app/schemas/process-window.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { windowOf } from "#app/services/assessments/window.server.ts";
import type { Route } from "./+types/window";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Process window${loaderData ? `, ${loaderData.page.head.flow.name}` : ""} · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const page = await windowOf(scopeOf(context), params.assessmentId, url.searchParams);
  const faults = [page.x, page.y].some(({ faults: { from, to } }) => from ?? to);
  return data({ page, question: null }, { status: faults || page.fault ? 400 : 200 });
}

/** Within the application the browser draws it itself, unless the address has the server do it. */
export async function clientLoader({ params, request, serverLoader }: Route.ClientLoaderArgs): Promise<SentWindow> {
  const url = new URL(request.url);
  const fromServer = async () => ({ page: (await serverLoader()).page, question: null });
  if (byServer(url)) return fromServer();
  return readSent<SentWindow>(`/assessments/${params.assessmentId}/trial/window${url.search}`).catch(fromServer);
}

export default function ProcessWindow({ loaderData }: Route.ComponentProps) {
  return <WindowPage {...loaderData} />;
}
