import { randomUUID } from "node:crypto";
import { Link, redirect } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { LotOnSheet } from "#app/components/lots/LotOnSheet.tsx";
import { LotView } from "#app/components/lots/LotView.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { lotDesk } from "#app/services/floor/lot-desk.server.ts";
import { getLot, isLot, noteLot } from "#app/services/wafers/lots.server.ts";
import { undoTable } from "#app/services/wafers/undo-import.server.ts";
import type { Route } from "./+types/lot";
import { lotForm } from "./lot-forms.server.ts";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.lot.name ?? "Lot"} · Lots · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const lot = await getLot(scope, params.lotId);
  return {
    lot,
    desk: await lotDesk(scope, params.lotId),
    holdId: randomUUID(),
    query: (url.searchParams.get("q") ?? "").trim().slice(0, 100),
  };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const scope = scopeOf(context);
  const form = await postedForm(request);
  switch (form.get("intent")) {
    case "undo": {
      const undone = await undoTable(scope, String(form.get("table") ?? ""));
      if (undone.outcome === "used") throw problem(409, undone.sentence);
      // A lot of which nothing is left has gone with its last table.
      throw redirect((await isLot(scope, params.lotId)) ? `/lots/${params.lotId}` : "/lots");
    }
    case "note":
      await noteLot(scope, params.lotId, String(form.get("note") ?? ""));
      throw redirect(`/lots/${params.lotId}`);
    default: {
      const answer = await lotForm(scope, params.lotId, form);
      if (answer) return answer;
      throw problem(400, "This form could not be read. Open the page again and send it once more.");
    }
  }
}

export default function Lot({ loaderData, actionData }: Route.ComponentProps) {
  const { lot, desk, holdId, query } = loaderData;
  return (
    <>
      <PageHead
        title={`Lot ${lot.name}`}
        crumbs={[
          { name: "Scans", path: "/scans" },
          { name: "Lots", path: "/lots" },
        ]}
        remark={`${lot.program.name}, ${lot.wafers.length === 1 ? "1 wafer" : `${lot.wafers.length} wafers`}, first seen ${lot.createdAt.slice(0, 10)}`}
        actions={
          <Link to={`/incidents?q=${encodeURIComponent(lot.name)}`} className="btn">
            Incidents of this lot
          </Link>
        }
      />
      <LotOnSheet id={lot.id} desk={desk} answer={actionData} holdId={holdId} />
      <LotView lot={lot} query={query} answer={actionData} />
    </>
  );
}
