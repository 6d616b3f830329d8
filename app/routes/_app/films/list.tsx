import { Link } from "react-router";
import { FILM_LIST } from "#app/components/films/film-list.tsx";
import { LibraryList } from "#app/components/library/LibraryList.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { TickBar } from "#app/components/ui/ticks/TickBar.tsx";
import { tickColumn } from "#app/components/ui/ticks/tick-column.tsx";
import { useTicked } from "#app/components/ui/ticks/use-ticked.ts";
import { MOST_TICKED } from "#app/lib/ticked-ids.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { withinPages } from "#app/server/list-page.server.ts";
import { listLibraryAt } from "#app/services/library/library.server.ts";
import type { Route } from "./+types/list";

export const meta: Route.MetaFunction = () => [{ title: "Films · Planeward" }];

export async function loader({ context, url }: Route.LoaderArgs) {
  const list = await listLibraryAt(scopeOf(context), "film", url.searchParams);
  withinPages(url, list.page);
  const imported = url.searchParams.get("imported");
  return { ...list, imported: imported !== null && /^\d{1,4}$/.test(imported) ? Number(imported) : null };
}

export default function Films({ loaderData }: Route.ComponentProps) {
  const ticks = useTicked("films-ticked");
  const bar = (
    <TickBar
      ticks={ticks}
      what={["film", "films"]}
      onPage={loaderData.page.rows.map(({ id }) => id)}
      actions={[{ label: "Download ticked as CSV", to: "/films/films.csv", file: true, most: MOST_TICKED }]}
    />
  );
  return (
    <>
      {loaderData.imported !== null && (
        <Notice
          kind="done"
          title={`${loaderData.imported === 1 ? "1 film is" : `${loaderData.imported} films are`} imported.`}
        />
      )}
      <LibraryList
        view={FILM_LIST}
        {...loaderData}
        more={<TableOfFilms mayEdit={loaderData.mayEdit} />}
        ticks={{ column: tickColumn(ticks), bar }}
      />
    </>
  );
}

/** The library as a table, out and, for whoever may, in. */
function TableOfFilms({ mayEdit }: { mayEdit: boolean }) {
  return (
    <>
      <a href="/films/films.csv" className="btn" download>
        Download as CSV
      </a>
      {mayEdit && (
        <Link to="/films/import" className="btn">
          Import films
        </Link>
      )}
    </>
  );
}
