import { useNavigate, useSearchParams } from "react-router";
import { legQuery } from "#app/lib/leg-query.ts";

/**
 * Looks at another step, of the leg that is looked at, without leaving the place on the page. The address says which, so the view can
 * be linked.
 */
export function useStepSelection(): { select: (step: number) => void; leg: string | null } {
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const leg = /^\d{1,2}$/.exec(search.get("leg") ?? "")?.[0] ?? null;
  return {
    leg,
    select: (step) => void navigate(`?step=${step}${legQuery("&", leg)}`, { preventScrollReset: true, replace: true }),
  };
}
