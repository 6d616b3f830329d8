import { useEffect } from "react";
import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { RunBar } from "#app/components/ui/RunBar.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { legQuery, trialHome, trialPath } from "#app/lib/leg-query.ts";
import { BY_SERVER, readSent } from "#app/lib/read-sent.ts";
import type { RemediesView, UnclearedView } from "#app/lib/remedies-view.ts";
import type { SentTrial, TrialHead, TrialQuestion } from "#app/schemas/trial.ts";
import { RemedyCards } from "./RemedyCards.tsx";
import { TrialBarred } from "./TrialBarred.tsx";
import { TrialLeg } from "./TrialLeg.tsx";
import { useFlowRun } from "./use-flow-run.ts";

export interface RemediesPageData {
  head: TrialHead;
  /** what the server has found: null when today's engine cannot compute the inputs, undefined when it was not asked */
  view?: RemediesView | null;
  /** what there is to look for changes in, where the browser does */
  question?: TrialQuestion;
}

/** The smallest changes that clear an assessment, each to be tried on a copy; and what no change of one quantity clears. */
export function RemediesPage({ head, view, question }: RemediesPageData) {
  return (
    <>
      <PageHead
        title="What clears it"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: head.flow.name, path: `/flows/${head.flow.id}` },
          { name: `Assessment ${head.revision}`, path: trialHome(head) },
        ]}
      />
      <TrialBarred head={head} />
      <TrialLeg head={head} />
      {view === null ? (
        <Nothing head={head} />
      ) : (
        <Searched key={trialHome(head)} head={head} view={view} question={question} />
      )}
    </>
  );
}

/** The search in the browser, or what the server has found and the same search once more. */
function Searched({ head, view, question }: RemediesPageData & { view: RemediesView | undefined }) {
  const scripted = useInBrowser();
  const { state, run, stop } = useFlowRun<RemediesView>("remedies", view && { kind: "done", found: view });
  const ask = () => readSent<SentTrial>(trialPath(head.id, head.leg?.number)).then((sent) => sent.question);
  useEffect(() => {
    if (question) run(question);
  }, [question, run]);
  const { found } = state;
  return (
    <>
      {scripted && head.mayAssess ? (
        <div className="mb-4">
          <RunBar
            state={state}
            label="Findings looked into"
            noun="findings"
            done="Every finding has been looked into."
            onStart={() => run(ask())}
            onStop={stop}
            otherwise={
              <Link
                to={`/assessments/${head.id}/remedies?${BY_SERVER}${legQuery("&", head.leg?.number)}`}
                className="link"
              >
                Let the server look
              </Link>
            }
          />
        </div>
      ) : null}
      {found ? <Found head={head} view={found} whole={state.kind === "done"} /> : null}
    </>
  );
}

function Nothing({ head }: { head: TrialHead }) {
  return (
    <EmptyState
      title="This cannot be computed any more"
      actions={
        <Link to={trialHome(head)} className="btn">
          Back to the assessment
        </Link>
      }
    >
      The inputs of this assessment are refused by the engine of today. Run it again to see why.
    </EmptyState>
  );
}

interface FoundProps {
  head: TrialHead;
  view: RemediesView;
  /** false while more may be found */
  whole: boolean;
}

function Found({ head, view: { cards, uncleared }, whole }: FoundProps) {
  if (cards.length === 0 && uncleared.length === 0 && whole)
    return (
      <EmptyState
        title="Nothing to clear"
        actions={
          <Link to={trialHome(head)} className="btn">
            Back to the assessment
          </Link>
        }
      >
        Every step is clear as planned.
      </EmptyState>
    );
  return (
    <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
      {cards.length > 0 ? (
        <section className="p-4 tablet:px-6" aria-labelledby="single">
          <h2 id="single" className="text-lead font-medium">
            One change at a time
          </h2>
          <p className="mt-1 mb-2 max-w-160 text-quiet">
            The least that each quantity has to move, worked out with all rules on the whole flow, at nominal values. A
            change that bars another step is left out.
          </p>
          <RemedyCards cards={cards} head={head} across />
        </section>
      ) : null}
      {uncleared.length > 0 ? (
        <section
          className={`p-4 tablet:px-6 ${cards.length > 0 ? "border-t border-ink" : ""}`}
          aria-labelledby="uncleared"
        >
          <h2 id="uncleared" className="text-lead font-medium">
            Not cleared by one change
          </h2>
          <ul className="mt-1 divide-y divide-line">
            {uncleared.map((each) => (
              <li key={`${each.rule} ${each.step}`} className="py-3">
                <Uncleared each={each} head={head} />
              </li>
            ))}
          </ul>
        </section>
      ) : null}
    </article>
  );
}

function Uncleared({ each, head }: { each: UnclearedView; head: TrialHead }) {
  const { rule, step, title, outcome, reason, says, tried, pair } = each;
  return (
    <>
      <FindingTag outcome={outcome}>
        <Link to={trialHome(head, step)} className="link">
          step {step}
        </Link>
        , rule {rule}, {title.toLowerCase()}
      </FindingTag>
      <p className="mt-1">{noBreak(reason)}</p>
      {says ? <p className="mt-1">{noBreak(says)}</p> : null}
      <p className="mt-1 text-quiet">
        {tried === 0
          ? "It rests on what is known, not on a quantity of the flow: no change was tried."
          : `${tried} ${tried === 1 ? "change was" : "changes were"} tried, none clears it by itself without barring another step.`}
      </p>
      {pair ? (
        <div className="mt-2 border-l border-line pl-3">
          <p className="text-quiet">The two together that come closest:</p>
          <RemedyCards cards={[pair]} head={head} across />
        </div>
      ) : null}
    </>
  );
}
