import { useEffect } from "react";
import { Link, useFetcher } from "react-router";
import type { RemediesView } from "#app/lib/remedies-view.ts";
import type { TrialHead } from "#app/schemas/trial.ts";
import { RemedyCards } from "./RemedyCards.tsx";

/** More are on their own page. */
const SHOWN = 3;

/** The smallest changes that clear an assessment, looked for once the page is there. Without scripts the link alone leads to them. */
export function SmallestChanges({ assessmentId }: { assessmentId: string }) {
  const { load, data, state } = useFetcher<{ head: TrialHead; view: RemediesView | null }>({
    key: `remedies ${assessmentId}`,
  });
  const path = `/assessments/${assessmentId}/remedies`;
  useEffect(() => {
    void load(path);
  }, [load, path]);
  const cards = data?.view?.cards ?? [];
  return (
    <div className="mb-3 border-b border-line pb-3" aria-busy={state !== "idle"}>
      {data ? (
        cards.length > 0 ? (
          <RemedyCards cards={cards.slice(0, SHOWN)} head={data.head} />
        ) : (
          <p className="text-quiet">No change of a single quantity clears any of it.</p>
        )
      ) : (
        <p className="screen-only text-quiet" role="status">
          {state === "loading" ? "Trying one change after another…" : ""}
        </p>
      )}
      <Link to={path} className="link screen-only">
        {cards.length > SHOWN ? `All ${cards.length} changes that clear something` : "Smallest changes that clear it"}
      </Link>
      <Link to={`/assessments/${assessmentId}/window`} className="link screen-only mt-1 block w-fit">
        Process window over two inputs
      </Link>
    </div>
  );
}
