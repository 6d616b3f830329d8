import { redirect } from "react-router";
import { FAVOURITES_ONLY } from "#app/components/kept/favourites-only.ts";
import { tickedIds } from "#app/lib/ticked-ids.ts";
import { withParams } from "#app/lib/list-params.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { postedForm } from "#app/server/form.server.ts";
import { markFavourites } from "#app/services/kept/favourites.server.ts";
import type { Route } from "./+types/mark";

const MARKED = `/flows${withParams(new URLSearchParams(), { favourites: FAVOURITES_ONLY.options[0]?.value ?? "" })}`;

/** What is to be marked is sent by the list of flows; there is nothing to look at. */
export function loader(): never {
  throw redirect("/flows");
}

/** Marks the flows that are ticked, and shows those that are marked. */
export async function action({ request, context }: Route.ActionArgs) {
  const ids = tickedIds(await postedForm(request));
  if (ids.length === 0) throw redirect("/flows");
  await markFavourites(scopeOf(context), "flow", ids);
  throw redirect(MARKED);
}
