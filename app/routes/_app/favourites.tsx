import { data, redirect } from "react-router";
import { FavouritesPage } from "#app/components/kept/FavouritesPage.tsx";
import { localPath } from "#app/lib/local-path.ts";
import { favouriteFormSchema } from "#app/schemas/kept.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { readForm } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { listFavourites, setFavourite } from "#app/services/kept/favourites.server.ts";
import type { Route } from "./+types/favourites";

export const meta: Route.MetaFunction = () => [{ title: "Favourites · Planeward" }];

export async function loader({ context }: Route.LoaderArgs) {
  return { favourites: await listFavourites(scopeOf(context)) };
}

/** A star that was pressed: with scripts the page stays as it is, without it is opened again. */
export async function action({ request, context }: Route.ActionArgs) {
  const { submission } = await readForm(request, favouriteFormSchema);
  if (submission.status !== "success")
    throw problem(400, "This form could not be read. Open the page again and send it once more.");
  const { kind, id, marked, back } = submission.value;
  await setFavourite(scopeOf(context), kind, id.toLowerCase(), marked === "yes");
  if (back !== undefined) throw redirect(localPath(back));
  return data(null);
}

export default function Favourites({ loaderData }: Route.ComponentProps) {
  return <FavouritesPage favourites={loaderData.favourites} />;
}
