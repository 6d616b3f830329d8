import { ScanInHistory } from "#app/components/films/ScanInHistory.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { ScanView } from "#app/components/scans/ScanView.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { acceptedAs } from "#app/services/films/accept-scan.server.ts";
import { getScan } from "#app/services/scans.server.ts";
import type { Route } from "./+types/scan";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.scan.label ?? "Scan"} · Scans · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const scan = await getScan(scope, params.scanId);
  return { scan, accepted: await acceptedAs(scope, scan.id) };
}

export default function Scan({ loaderData }: Route.ComponentProps) {
  const { scan, accepted } = loaderData;
  return (
    <>
      <PageHead
        title={scan.label}
        crumbs={[{ name: "Scans", path: "/scans" }]}
        remark={`${scan.program.name}, ${scan.createdAt.slice(0, 10)} ${scan.createdAt.slice(11, 16)} UTC, ${scan.createdBy}, engine ${scan.engineVersion}`}
      />
      <ScanView scan={scan} />
      <ScanInHistory scanId={scan.id} accepted={accepted} curled={scan.result.curled !== null} />
    </>
  );
}
