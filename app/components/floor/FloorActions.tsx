import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { entryWords } from "#app/lib/floor/entry-words.ts";
import { floorPath, type FloorDeed } from "#app/lib/floor/floor-path.ts";
import { EntryFields } from "./EntryFields.tsx";
import { FloorForm } from "./FloorForm.tsx";
import type { FloorStepProps } from "./FloorStepPage.tsx";

const ACTION =
  "flex min-h-31 w-full cursor-pointer flex-col justify-center px-5 py-3 text-left text-figure font-medium no-underline tablet:min-h-27";

/** What can be done at a step, each at least 20 mm high. Stopping stands apart, so that a slip does not hit it. */
export function FloorActions(props: FloorStepProps & { blocked: boolean }) {
  const { lot, sheet, step, deed } = props;
  const last = sheet.entries.find(({ step: at, content }) => at === step.number && content.kind === "measured");
  const to = (deed: FloorDeed) => floorPath(lot.id, step.number, sheet.leg, deed);
  return (
    <div
      role="group"
      aria-label="What can be done here"
      className="flex-none flex-col border-ink max-tablet:contents tablet:flex tablet:w-75 tablet:overflow-y-auto tablet:border-l"
    >
      {/* On a phone it stays at the foot of what is read. */}
      {deed === null && (
        <div className="border-ink bg-surface max-tablet:sticky max-tablet:bottom-0 max-tablet:border-t">
          <MainAction {...props} />
        </div>
      )}
      {/* In pairs on a tablet, so that stopping stays in sight at the foot. */}
      <div className="tablet:grid tablet:grid-cols-2 tablet:[&>*:nth-child(odd):not(:last-child)]:border-r">
        <a href={to("measure")} className={`${ACTION} border-b border-line tablet:px-4`}>
          Record a reading
          <span className="text-lead font-normal text-quiet">
            {last ? `Last here: ${entryWords(last.content)}` : "Bow or warp"}
          </span>
        </a>
        <a href={to("observe")} className={`${ACTION} border-b border-line tablet:px-4`}>
          Write an observation
        </a>
        <a
          href={to("incident")}
          className={`${ACTION} border-b border-line tablet:px-4 ${lot.mayHold ? "" : "tablet:col-span-2"}`}
        >
          Report an incident
          <span className={`text-lead font-normal text-quiet ${lot.mayHold ? "tablet:hidden" : ""}`}>
            Crack, chip, slip or drop
          </span>
        </a>
        {lot.mayHold && (
          <a href={to("hold")} className={`${ACTION} border-b border-line tablet:px-4`}>
            Hold this lot
            <span className="text-lead font-normal text-quiet">This lot alone</span>
          </a>
        )}
      </div>
      <div className="min-h-6 flex-1" />
      <a
        href={to("stop")}
        className={`${ACTION} flex-row! items-center gap-4 border-t-2 border-stop bg-raised text-stop`}
      >
        <Swatch level="stop" width={40} height={40} scale={1.04} />
        <span className="flex-1">
          Stop this step
          <span className="block text-lead font-normal">For every lot, tells the owner</span>
        </span>
      </a>
    </div>
  );
}

/** Starts the step, or says that it is done; where neither can be, why, and the way there. */
function MainAction({ lot, sheet, step, newId, blocked }: FloorStepProps & { blocked: boolean }) {
  const { progress, acknowledgedAt, leg, steps } = sheet;
  const next = steps[steps.findIndex(({ number }) => number === step.number) + 1];
  const here = floorPath(lot.id, step.number, leg);
  if (progress.underWay === step.number)
    return (
      <FloorForm
        action={here}
        next={next ? floorPath(lot.id, next.number, leg) : here}
        words={`Step ${step.number} done`}
      >
        <EntryFields sheet={sheet} id={newId} kind="done" step={step.number} />
        {next && <input type="hidden" name="next" value={next.number} />}
        <button type="submit" className={`${ACTION} btn-primary tablet:min-h-37`}>
          Step done
          <span className="text-lead font-normal">
            {next ? `Goes to step ${next.number}, ${next.title}` : "It is the last one"}
          </span>
        </button>
      </FloorForm>
    );
  if (progress.underWay !== null)
    return (
      <a href={floorPath(lot.id, progress.underWay, leg)} className={`${ACTION} btn-primary tablet:min-h-37`}>
        Step {progress.underWay} is under way
        <span className="text-lead font-normal">Go there, and enter that it is done</span>
      </a>
    );
  if (blocked)
    return (
      <p className={`${ACTION} border-b border-line text-stop tablet:min-h-37`}>
        Do not start
        <span className="text-lead font-normal">What blocks it stands beside, and whom to call</span>
      </p>
    );
  if (acknowledgedAt === null)
    return (
      <a href={floorPath(lot.id, null, leg)} className={`${ACTION} btn-primary tablet:min-h-37`}>
        Read the sheet first
        <span className="text-lead font-normal">You have not acknowledged this revision</span>
      </a>
    );
  const done = progress.done.includes(step.number);
  return (
    <FloorForm action={here} next={here} words={`Step ${step.number} started`}>
      <EntryFields sheet={sheet} id={newId} kind="started" step={step.number} />
      <button type="submit" className={`${ACTION} tablet:min-h-37 ${done ? "border-b border-line" : "btn-primary"}`}>
        {done ? "Start again" : "Start this step"}
        <span className="text-lead font-normal">
          {done
            ? "It is done. Only for rework"
            : progress.here === step.number
              ? "Your name and the time are kept"
              : `The lot is at step ${progress.here ?? "the end"}: mind the order`}
        </span>
      </button>
    </FloorForm>
  );
}
