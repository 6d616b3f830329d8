import { FilmComparison } from "#app/components/films/FilmComparison.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { filmsInWords } from "#app/lib/film-csv/changes.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { allOfLibrary } from "#app/services/library/library.server.ts";
import type { Route } from "./+types/compare";

export const meta: Route.MetaFunction = () => [{ title: "Compare films · Planeward" }];

/** Two films of the library side by side, named by the address; one that does not exist is as one not chosen. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const films = await allOfLibrary(scopeOf(context), "film");
  const [one, other] = url.searchParams.getAll("of").map((id) => films.find((film) => film.id === id));
  return {
    choices: films.map(({ id, name }) => ({ value: id, label: name })),
    chosen: [one, other].map((film) => (film ? { id: film.id, name: film.name } : null)),
    rows: one && other ? filmsInWords(one, other) : null,
  };
}

export default function CompareFilms({ loaderData }: Route.ComponentProps) {
  return (
    <>
      <PageHead title="Compare films" crumbs={[{ name: "Films", path: "/films" }]} />
      <FilmComparison {...loaderData} />
    </>
  );
}
