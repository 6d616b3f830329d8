import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { PrintButton } from "#app/components/sheet/PrintButton.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { FilmChoices } from "#app/components/wafers/FilmChoices.tsx";
import { WaferView } from "#app/components/wafers/WaferView.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getWaferPage } from "#app/services/film-analysis/wafer-page.server.ts";
import type { Route } from "./+types/wafer";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.wafer.name ?? "Wafer"} · Wafers · Planeward` },
];

export async function loader({ context, params, url }: Route.LoaderArgs) {
  return { wafer: await getWaferPage(scopeOf(context), params.waferId, url.searchParams.get("film")) };
}

export default function Wafer({ loaderData: { wafer } }: Route.ComponentProps) {
  const { id, name, slot, lot, program, film, films } = wafer;
  const place = [slot !== null && `slot ${slot}`, program.name].filter(Boolean).join(", ");
  return (
    <>
      <PageHead
        title={name}
        crumbs={[
          { name: "Scans", path: "/scans" },
          ...(lot
            ? [
                { name: "Lots", path: "/lots" },
                { name: `Lot ${lot.name}`, path: `/lots/${lot.id}` },
              ]
            : []),
        ]}
        remark={place}
        actions={
          film && (
            <>
              <a href={`/wafers/${id}/figures.csv?film=${encodeURIComponent(film.key)}`} className="btn" download>
                Figures as CSV
              </a>
              <a href={`/wafers/${id}/profiles.csv?film=${encodeURIComponent(film.key)}`} className="btn" download>
                Profiles as CSV
              </a>
              <PrintButton />
            </>
          )
        }
      />
      {film ? (
        <>
          <FilmChoices films={films} chosen={film.key} />
          <WaferView wafer={wafer} film={film} />
        </>
      ) : (
        <EmptyState
          title="No film was measured on this wafer yet"
          actions={
            <Link to="/scans/import" className="btn btn-primary">
              Import scans
            </Link>
          }
        >
          A scan before a film and one after it on the same line make a measurement. Three lines, 60 degrees apart, make
          a map of the wafer with its bow, warp and sori.{" "}
          {lot && "What was measured of the lot stands on the lot’s page."}
        </EmptyState>
      )}
    </>
  );
}
