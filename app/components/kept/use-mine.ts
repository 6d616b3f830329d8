import { useRouteLoaderData } from "react-router";
import type { Mine } from "#app/schemas/kept.ts";

/** What the signed-in person keeps for themselves; null outside of the frame of the application. */
export function useMine(): Mine | null {
  const frame = useRouteLoaderData<{ mine: Mine }>("routes/_app/layout");
  return frame?.mine ?? null;
}
