import { Link } from "react-router";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { PropertyTable } from "#app/components/ui/PropertyTable.tsx";
import { scopeOf } from "#app/server/contexts.server.ts";
import { getLibraryRecord } from "#app/services/library/library.server.ts";
import { whereFilmIsUsed } from "#app/services/library/film-use.server.ts";
import type { Route } from "./+types/detail";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.record.name ?? "Film"} · Planeward` },
];

export async function loader({ context, params }: Route.LoaderArgs) {
  const scope = scopeOf(context);
  const found = await getLibraryRecord(scope, "film", params.filmId);
  return { ...found, usedIn: await whereFilmIsUsed(scope, found.record.id) };
}

export default function FilmDetail({ loaderData }: Route.ComponentProps) {
  const { record, stamp, mayEdit, usedIn } = loaderData;
  return (
    <>
      <PageHead
        title={record.name}
        crumbs={[{ name: "Films", path: "/films" }]}
        remark={`${record.kind}. Last changed ${stamp.updatedAt.slice(0, 10)}, ${stamp.updatedBy}`}
        actions={
          mayEdit && (
            <Link to="edit" className="btn btn-primary">
              Change
            </Link>
          )
        }
      />
      <div className="frame grid wide:grid-cols-[2fr_1fr]">
        <div className="p-4 tablet:p-6">
          <PropertyTable
            caption="Properties"
            properties={[
              {
                label: "Stress at 25 °C, tension positive",
                measured: record.stress,
                dimension: "stress",
                unit: "MPa",
                sign: true,
              },
              { label: "Young’s modulus", measured: record.youngsModulus, dimension: "stress", unit: "GPa" },
              { label: "Poisson’s ratio", measured: record.poissonsRatio, dimension: "number", unit: "" },
              { label: "Thermal expansion", measured: record.expansion, dimension: "expansion", unit: "ppm/K" },
              {
                label: "Yield stress at 25 °C",
                measured: record.yieldStress,
                dimension: "stress",
                unit: "MPa",
                missing: "none: it stays elastic",
              },
              { label: "Temperature limit", measured: record.temperatureLimit, dimension: "temperature", unit: "°C" },
            ]}
          />
          <p className="mt-4 text-quiet">State of the stress: {record.stressState || "not given"}.</p>
          {record.note && <p className="mt-2">{record.note}</p>}
        </div>
        <section className="border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l" aria-labelledby="used-in">
          <h2 id="used-in" className="font-semibold">
            Used in
          </h2>
          {usedIn.length === 0 ? (
            <p className="mt-1 text-quiet">No stack or flow of your programs uses it.</p>
          ) : (
            <ul className="mt-2">
              {usedIn.map(({ kind, id, name }) => (
                <li key={id} className="border-t border-line py-2 first:border-0">
                  <Link to={`/${kind}s/${id}`} className="link">
                    {name}
                  </Link>{" "}
                  <span className="text-quiet">{kind}</span>
                </li>
              ))}
            </ul>
          )}
        </section>
      </div>
    </>
  );
}
