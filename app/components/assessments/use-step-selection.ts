import { useNavigate } from "react-router";

/** Looks at another step without leaving the place on the page. The address says which, so the view can be linked. */
export function useStepSelection(): (step: number) => void {
  const navigate = useNavigate();
  return (step) => void navigate(`?step=${step}`, { preventScrollReset: true, replace: true });
}
