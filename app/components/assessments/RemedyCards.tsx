import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { changePhrase, lowerFirst } from "#app/lib/change-phrase.ts";
import type { PlaceView, RemedyCard } from "#app/lib/remedies-view.ts";
import { stepsInWords } from "#app/lib/step-numbers.ts";
import { triedPath } from "#app/lib/tried-path.ts";
import type { TrialHead } from "#app/schemas/trial.ts";
import { TryOnCopy } from "./TryOnCopy.tsx";
import { WorkingLink } from "./WorkingLink.tsx";

interface Props {
  cards: readonly RemedyCard[];
  head: Pick<TrialHead, "id" | "barred"> & { leg: { number: number } | null };
  /** whether there is the width of a page for it */
  across?: boolean;
}

/** Changes with what each clears, what the verdict is then, and what it makes worse. Across a page the buttons stand in a line. */
export function RemedyCards({ cards, head, across = false }: Props) {
  return (
    <ul className="divide-y divide-line">
      {cards.map((card) => (
        <li
          key={card.posted}
          className={`py-3 first:pt-1 ${across ? "tablet:flex tablet:items-center tablet:justify-between tablet:gap-6" : ""}`}
        >
          <div>
            <RemedyText card={card} />
            <p className="screen-only">
              <WorkingLink
                path={triedPath(head, card.posted, card.clears[0] ?? card.eases[0])}
                of={card.changes.map(changePhrase).join("; ")}
              />
            </p>
          </div>
          {head.barred === null ? (
            <div className={across ? "max-tablet:mt-2 tablet:shrink-0" : "mt-2"}>
              <TryOnCopy head={head} posted={card.posted} name={card.changes.map(changePhrase).join("; ")} />
            </div>
          ) : null}
        </li>
      ))}
    </ul>
  );
}

function RemedyText({ card: { changes, clears, eases, verdict, worsens } }: { card: RemedyCard }) {
  return (
    <>
      {changes.map((change) => (
        <p key={changePhrase(change)}>
          <span className="text-quiet">
            {noBreak(`Step ${change.step}`)}, {noBreak(lowerFirst(change.what))}:
          </span>{" "}
          {change.from === null ? null : (
            <>
              <s className="text-quiet">
                <span className="sr-only">instead of </span>
                {noBreak(change.from)}
              </s>{" "}
            </>
          )}
          <strong className="font-semibold">{noBreak(change.to)}</strong>
        </p>
      ))}
      <p className="mt-1">
        {clears.length > 0 ? `Clears findings at ${places(clears)}. ` : ""}
        {eases.length > 0 ? `A caution is left at ${places(eases)}. ` : ""}
        {worsens.length > 0 ? `Brings a caution at ${stepsInWords(stepsOf(worsens))}. ` : ""}
      </p>
      <p className="mt-1 flex flex-wrap items-baseline gap-x-2">
        <span className="text-quiet">The flow with it:</span> <FindingTag outcome={verdict} />
      </p>
    </>
  );
}

const stepsOf = (list: readonly PlaceView[]) => [...new Set(list.map(({ step }) => step))].sort((a, b) => a - b);
const places = (list: readonly PlaceView[]) => stepsInWords(stepsOf(list));
