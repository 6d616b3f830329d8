import { useCallback, useEffect, useState, type ReactNode } from "react";
import { Link, useFetcher } from "react-router";
import { RunBar } from "#app/components/ui/RunBar.tsx";
import { legQuery, trialPath } from "#app/lib/leg-query.ts";
import { BY_SERVER, readSent } from "#app/lib/read-sent.ts";
import type { RemediesView, RemedyCard } from "#app/lib/remedies-view.ts";
import type { SentTrial, TrialHead } from "#app/schemas/trial.ts";
import { RemedyCards } from "./RemedyCards.tsx";
import type { RemediesPageData } from "./RemediesPage.tsx";
import { useFlowRun } from "./use-flow-run.ts";

/** More are on their own page. */
const SHOWN = 3;

/**
 * The smallest changes that clear an assessment, looked for once the page is there: in the browser by whoever may have the inputs, by
 * the server for everybody else. Without scripts the link alone leads to them.
 */
export function SmallestChanges({ mayAssess, ...of }: Of & { mayAssess: boolean }) {
  return mayAssess ? <LookedForHere {...of} /> : <LookedForThere {...of} />;
}

interface Of {
  assessmentId: string;
  /** number of the leg that is looked at, of a flow that parts by slot */
  leg: number | null;
}

function LookedForHere({ assessmentId, leg }: Of) {
  const { state, run, stop } = useFlowRun<RemediesView>("remedies");
  const [barred, setBarred] = useState<TrialHead["barred"]>("role");
  const look = useCallback(() => {
    const ask = async () => {
      const { head, question } = await readSent<SentTrial>(trialPath(assessmentId, leg));
      setBarred(head.barred);
      return question;
    };
    run(ask());
  }, [assessmentId, leg, run]);
  useEffect(look, [look]);
  const bar = (
    <RunBar
      state={state}
      label="Findings looked into"
      noun="findings"
      onStart={look}
      onStop={stop}
      otherwise={
        <Link to={`/assessments/${assessmentId}/remedies?${BY_SERVER}${legQuery("&", leg)}`} className="link">
          Let the server look
        </Link>
      }
    />
  );
  return (
    <Shown
      assessmentId={assessmentId}
      leg={leg}
      query={legQuery("?", leg)}
      cards={state.found?.cards ?? []}
      barred={barred}
      none={state.kind === "done"}
      above={bar}
    />
  );
}

function LookedForThere({ assessmentId, leg }: Of) {
  const { load, data, state } = useFetcher<RemediesPageData>({ key: `remedies ${assessmentId} ${leg}` });
  const path = `/assessments/${assessmentId}/remedies?${BY_SERVER}${legQuery("&", leg)}`;
  useEffect(() => {
    void load(path);
  }, [load, path]);
  const waiting = (
    <p className="screen-only text-quiet" role="status">
      {state === "loading" && !data ? "Trying one change after another" : ""}
    </p>
  );
  return (
    <Shown
      assessmentId={assessmentId}
      leg={leg}
      query={`?${BY_SERVER}${legQuery("&", leg)}`}
      cards={data?.view?.cards ?? []}
      barred={data?.head.barred ?? "role"}
      none={data !== undefined}
      above={waiting}
    />
  );
}

interface ShownProps extends Of {
  /** how the pages are asked for that the links lead to */
  query: string;
  cards: readonly RemedyCard[];
  barred: TrialHead["barred"];
  /** whether the search is over, so that no card means that there is none */
  none: boolean;
  above: ReactNode;
}

function Shown({ assessmentId, leg, query, cards, barred, none, above }: ShownProps) {
  return (
    <div className="mb-3 space-y-2 border-b border-line pb-3">
      {above}
      {cards.length > 0 ? (
        <RemedyCards
          cards={cards.slice(0, SHOWN)}
          head={{ id: assessmentId, leg: leg === null ? null : { number: leg }, barred }}
        />
      ) : none ? (
        <p className="text-quiet">No change of a single quantity clears any of it.</p>
      ) : null}
      <Link to={`/assessments/${assessmentId}/remedies${query}`} className="link screen-only block w-fit">
        {cards.length > SHOWN ? `All ${cards.length} changes that clear something` : "Smallest changes that clear it"}
      </Link>
      <Link to={`/assessments/${assessmentId}/window${query}`} className="link screen-only block w-fit">
        Process window over two inputs
      </Link>
    </div>
  );
}
