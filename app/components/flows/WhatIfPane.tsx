import { useState } from "react";
import { Form } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { StepChange, ToldAnswer } from "#app/lib/what-if-answer.ts";
import { placeOf } from "#app/lib/what-if.ts";
import { whatIfWords } from "#app/lib/what-if-words.ts";
import { useWhatIf } from "./use-what-if.ts";
import { WhatIfEditor } from "./WhatIfEditor.tsx";

/** What becomes of a flow's answer when single quantities are changed, computed here by the server's own engine. */
export default function WhatIfPane({ flowId, mayEdit }: { flowId: string; mayEdit: boolean }) {
  const whatIf = useWhatIf(flowId);
  // A put-back clears the field that is being typed in too.
  const [round, setRound] = useState(0);
  const { loaded, failed, changes, typed, answer, stale } = whatIf;
  if (failed !== null) return <p className="mt-3 font-semibold text-stop">{failed}</p>;
  if (!loaded) return <p className="mt-3 text-quiet">Reading the flow</p>;
  const { snapshot, present } = loaded;
  if (snapshot.input.steps.length === 0) return <p className="mt-3 text-quiet">The flow has no steps yet.</p>;
  return (
    <div className="mt-3 space-y-4">
      <WhatIfEditor key={round} snapshot={snapshot} onChange={whatIf.type} onTurn={whatIf.hold} />
      {changes.length > 0 && (
        <ul aria-label="Changes tried">
          {changes.map((change) => (
            <li key={placeOf(change)} className="flex flex-wrap items-center gap-x-3 border-t border-line py-1">
              <span>{whatIfWords(change, snapshot)}</span>
              {change !== typed && (
                <button type="button" className="link cursor-pointer" onClick={() => whatIf.drop(change)}>
                  Take out<span className="sr-only"> {whatIfWords(change, snapshot)}</span>
                </button>
              )}
            </li>
          ))}
        </ul>
      )}
      <div
        className="grid border-t border-ink tablet:grid-cols-2"
        aria-live="polite"
        aria-busy={changes.length > 0 && stale}
      >
        <AnswerSide head="As the flow is" answer={present} />
        {answer ? (
          <div className={`border-line max-tablet:border-t tablet:border-l tablet:pl-4 ${stale ? "opacity-60" : ""}`}>
            <AnswerSide head={stale ? "With the changes, computing" : "With the changes"} answer={answer} />
          </div>
        ) : (
          <p className="border-line py-3 text-quiet max-tablet:border-t tablet:border-l tablet:pl-4">
            {changes.length > 0
              ? "Computing"
              : "Type another value above: the answer to it stands here, and nothing is saved."}
          </p>
        )}
      </div>
      {answer?.computed && answer.changed && <ChangedSteps steps={answer.changed} />}
      {changes.length > 0 && (
        <div className="flex flex-wrap gap-2 border-t border-ink pt-3">
          {mayEdit && (
            <Form method="post" preventScrollReset>
              <input type="hidden" name="version" value={snapshot.version} />
              <input type="hidden" name="changes" value={JSON.stringify(changes)} />
              <button type="submit" name="intent" value="what-if" className="btn">
                Apply to the flow
              </button>
            </Form>
          )}
          <button
            type="button"
            className="btn"
            onClick={() => {
              whatIf.putBack();
              setRound(round + 1);
            }}
          >
            Put back
          </button>
        </div>
      )}
    </div>
  );
}

function AnswerSide({ head, answer }: { head: string; answer: ToldAnswer }) {
  return (
    <section className="py-3 tablet:pr-4">
      <h3 className="text-label text-quiet">{head}</h3>
      {answer.computed ? (
        <>
          <FindingTag outcome={answer.outcome}>{answer.step !== null && `first at step ${answer.step}`}</FindingTag>
          {answer.sentences.map((sentence) => (
            <p key={sentence} className="mt-1 text-lead">
              {noBreak(sentence)}
            </p>
          ))}
        </>
      ) : (
        <p className="mt-1 text-lead font-semibold text-stop">Cannot be computed. {answer.reason}</p>
      )}
    </section>
  );
}

function ChangedSteps({ steps }: { steps: StepChange[] }) {
  if (steps.length === 0) return <p className="text-quiet">No step comes out otherwise.</p>;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Steps that come out otherwise">
      <table className="table border-t border-ink">
        <caption className="sr-only">Steps that come out otherwise</caption>
        <thead>
          <tr>
            <th scope="col" className="num">
              Step
            </th>
            <th scope="col">What is done</th>
            <th scope="col">As the flow is</th>
            <th scope="col">With the changes</th>
          </tr>
        </thead>
        <tbody>
          {steps.map(({ number, title, was, becomes }) => (
            <tr key={number}>
              <td className="num">{number}</td>
              <th scope="row" className="font-normal">
                {noBreak(title)}
              </th>
              <td>
                <FindingTag outcome={was.outcome}>{noBreak(was.lies)}</FindingTag>
              </td>
              <td>
                <FindingTag outcome={becomes.outcome}>{noBreak(becomes.lies)}</FindingTag>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
