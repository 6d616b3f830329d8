import { redirect } from "react-router";
import { kindPath } from "#app/lib/library-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { requireOnSite } from "#app/services/permission.server.ts";
import type { Route } from "./+types/index";

/** The place opens on its first kind. */
export function loader({ context }: Route.LoaderArgs) {
  requireOnSite(scopeOf(context), "see the library");
  throw redirect(kindPath("carriers"));
}

export default function Carriers() {
  return null;
}
