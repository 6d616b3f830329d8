import { Link } from "react-router";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import { stepsInWords } from "#app/lib/step-numbers.ts";
import type { LotDesk, LotPlace, PinnedSheet } from "#app/schemas/floor-view.ts";
import { AssignSheet } from "./AssignSheet.tsx";
import { LotBlocks } from "./LotBlocks.tsx";
import type { LotAnswer } from "./lot-answer.ts";

interface Props {
  id: string;
  desk: LotDesk;
  answer: LotAnswer;
  /** made anew with each page: it names the hold that is made by it */
  holdId: string;
}

/** The sheet that a lot is on, where it is in its flow, and what holds it. */
export function LotOnSheet({ id, desk, answer, holdId }: Props) {
  const { pin, parts, before } = desk;
  return (
    <div className="mb-6">
      {pin && <OldRevision pin={pin} />}
      <HungSection title="Sheet">
        {pin ? (
          <>
            <p>
              <Link to={`/sheets/revisions/${pin.revision}`} className="link font-semibold">
                {pin.number} {pin.letter}
              </Link>
              , {pin.title}
            </p>
            <p className="text-quiet">
              Since {minuteOf(pin.since)}, by {pin.by}
              {pin.fromStep > 1 && `, from step ${pin.fromStep}`}
              {pin.reason !== "" && `: “${pin.reason}”`}
            </p>
            <Before before={before} />
          </>
        ) : (
          <p>The lot is on no sheet yet: the floor cannot work on it.</p>
        )}
        <AssignSheet desk={desk} answer={answer} />
      </HungSection>
      {parts.length > 0 && (
        <HungSection title="On the floor">
          <ul>
            {parts.map((part) => (
              <Place key={part.leg} part={part} only={parts.length === 1} />
            ))}
          </ul>
          <p className="mt-2">
            <a href={`/floor/lots/${id}`} className="link">
              Open it as the floor sees it
            </a>
          </p>
        </HungSection>
      )}
      <HungSection title="Holds and stops">
        <LotBlocks desk={desk} answer={answer} holdId={holdId} />
      </HungSection>
    </div>
  );
}

/** A revision that has ended stays the lot's until somebody moves it: that has to be said first. */
function OldRevision({ pin: { number, letter, state, successor } }: { pin: PinnedSheet }) {
  if (state === "released") return null;
  return (
    <Notice
      kind="error"
      title={
        successor
          ? `${number} ${letter} is superseded by ${successor.letter}: move the lot`
          : `${number} ${letter} is ${state}, and no other is in force`
      }
    >
      {successor
        ? "The floor starts nothing by it until an engineer or process owner has moved the lot, with a reason."
        : "The floor starts nothing by it. Put the lot on another sheet, or have a new revision released."}
    </Notice>
  );
}

function Before({ before }: { before: PinnedSheet[] }) {
  if (before.length === 0) return null;
  return (
    <details className="mt-1">
      <summary className="link w-fit cursor-pointer">
        {before.length === 1 ? "The one before" : `The ${before.length} before`}
      </summary>
      <ul className="mt-1">
        {before.map(({ revision, number, letter, since, by, reason }) => (
          <li key={since}>
            <Link to={`/sheets/revisions/${revision}`} className="link">
              {number} {letter}
            </Link>
            <span className="text-quiet">
              , since {minuteOf(since)}, by {by}
              {reason !== "" && `: “${reason}”`}
            </span>
          </li>
        ))}
      </ul>
    </details>
  );
}

function Place({ part: { name, here, done, total, missing }, only }: { part: LotPlace; only: boolean }) {
  return (
    <li className="border-t border-line py-1.5 first:border-t-0 first:pt-0">
      {!only && <span className="mr-2 font-semibold">{name}</span>}
      {here === null ? (
        <span>Its last step is done.</span>
      ) : (
        <span>
          Step {here.number} of {total}, {here.title}: {here.underWay ? "under way" : "next"}.
        </span>
      )}
      <span className="text-quiet">
        {" "}
        {done} of {total} steps entered as done.
        {missing.length > 0 && ` No word of ${stepsInWords(missing)}.`}
      </span>
    </li>
  );
}
