import { data, redirect } from "react-router";
import { ScanInHistory } from "#app/components/films/ScanInHistory.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ScanView } from "#app/components/scans/ScanView.tsx";
import { UndoScan } from "#app/components/scans/UndoScan.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { acceptedAs } from "#app/services/films/accept-scan.server.ts";
import { getScan } from "#app/services/scans.server.ts";
import { undoScan } from "#app/services/wafers/undo-import.server.ts";
import type { Route } from "./+types/scan";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.scan.label ?? "Scan"} · Scans · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const scan = await getScan(scope, params.scanId);
  return { scan, accepted: await acceptedAs(scope, scan.id) };
}

export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await postedForm(request);
  if (form.get("intent") !== "undo")
    throw problem(400, "This form could not be read. Open the page again and send it once more.");
  const placed = form.get("placed") === "wait again" ? "wait again" : "leave";
  const undone = await undoScan(scopeOf(context), params.scanId, placed);
  if (undone.outcome === "used") return data({ fault: undone.sentence }, { status: 409 });
  throw redirect(placed === "wait again" ? "/scans/waiting" : "/scans");
}

export default function Scan({ loaderData, actionData }: Route.ComponentProps) {
  const { scan, accepted } = loaderData;
  return (
    <>
      <PageHead
        title={scan.label}
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={`${scan.program.name}, ${scan.createdAt.slice(0, 10)} ${scan.createdAt.slice(11, 16)} UTC, ${scan.createdBy}, engine ${scan.engineVersion}`}
      />
      {actionData?.fault && <Notice kind="error" title={actionData.fault} />}
      <ScanView scan={scan} />
      <ScanInHistory scanId={scan.id} accepted={accepted} curled={scan.result.curled !== null} />
      <UndoScan scan={scan} />
    </>
  );
}
