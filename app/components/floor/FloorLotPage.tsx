import type { ReactNode } from "react";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import { floorPath } from "#app/lib/floor/floor-path.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { FloorLot, FloorSheet } from "#app/schemas/floor-view.ts";
import { EntryFields } from "./EntryFields.tsx";
import { FloorBlocks } from "./FloorBlocks.tsx";
import { FloorCautions } from "./FloorCautions.tsx";
import { FloorClocks } from "./FloorClocks.tsx";
import { FloorEntries } from "./FloorEntries.tsx";
import { FloorForm } from "./FloorForm.tsx";
import { FloorOnDevice } from "./FloorOnDevice.tsx";
import { FloorRefusal } from "./FloorRefusal.tsx";
import { FloorSheetHead } from "./FloorSheetHead.tsx";

interface Props {
  lot: FloorLot;
  newId: string;
  refused: string | null;
}

/** A lot on the floor: what blocks it, its sheet to be acknowledged, where it is, and its steps. */
export function FloorLotPage(props: Props) {
  return (
    <FloorOnDevice lot={props.lot} step={null} isForm={false}>
      {(lot, notices) => <LotScreen {...props} lot={lot} notices={notices} />}
    </FloorOnDevice>
  );
}

function LotScreen({ lot, newId, refused, notices }: Props & { notices: ReactNode }) {
  const { sheet, holds, name } = lot;
  return (
    <>
      <FloorSheetHead lot={lot} sheet={sheet} />
      <main id="main" className="mx-auto max-w-240 px-4 py-5 tablet:px-6">
        {notices}
        <FloorRefusal sentence={refused} />
        <FloorBlocks blocks={sheet ? sheet.blocks.filter(({ kind }) => kind !== "assessment") : holds} lot={lot.id} />
        <h1 className="text-answer font-medium wrap-anywhere">Lot {name}</h1>
        {lot.note !== "" && <p className="mt-1 text-lead whitespace-pre-line">{lot.note}</p>}
        {sheet ? (
          <OnSheet lot={lot} sheet={sheet} newId={newId} />
        ) : (
          <p className="mt-3 text-lead">
            This lot is on no sheet. Do not work on it: call an engineer or the process owner, who puts it on one.
          </p>
        )}
      </main>
    </>
  );
}

function OnSheet({ lot, sheet, newId }: { lot: FloorLot; sheet: FloorSheet; newId: string }) {
  const { legs, leg, support, progress, acknowledgedAt, clocks, deviations, emergency, steps, pin } = sheet;
  const here = steps.find(({ number }) => number === progress.here);
  return (
    <>
      {legs.length > 1 && (
        <nav aria-label="Parts of the lot" className="mt-3 flex flex-wrap gap-2">
          {legs.map((each) => (
            <a
              key={each.leg}
              href={floorPath(lot.id, null, each.leg)}
              aria-current={each.leg === leg ? "page" : undefined}
              className="btn min-h-14 text-lead aria-[current=page]:border-2 aria-[current=page]:font-semibold"
            >
              {each.name}
            </a>
          ))}
        </nav>
      )}
      <p className="mt-1 text-lead text-quiet">{pin.title}</p>
      {acknowledgedAt === null ? (
        <Acknowledge sheet={sheet} newId={newId} here={floorPath(lot.id, null, leg)} />
      ) : here ? (
        <a
          href={floorPath(lot.id, here.number, leg)}
          className="btn btn-primary mt-4 min-h-31 w-full flex-col items-start px-5 text-figure tablet:min-h-27"
        >
          {progress.underWay === null ? "Go to" : "Back to"} step {here.number}, {here.title}
          <span className="text-lead font-normal">
            {progress.underWay === null ? "It is next" : "It is under way"}. You acknowledged this sheet at{" "}
            {minuteOf(acknowledgedAt)}.
          </span>
        </a>
      ) : (
        <p className="mt-4 text-figure font-semibold">The last step of this lot is done.</p>
      )}
      {progress.missing.length > 0 && (
        <p className="mt-3 border-l-4 border-caution pl-3 text-lead">
          Nobody entered {progress.missing.length === 1 ? "step" : "steps"} {progress.missing.join(", ")} as done. Ask
          the shift lead before you go on.
        </p>
      )}
      {deviations.map((text) => (
        <p key={text} className="mt-3 border-l-4 border-caution pl-3 text-lead">
          {text}
        </p>
      ))}
      <FloorClocks clocks={clocks} now={lot.checkedAt} />
      <div className="mt-5 max-tablet:hidden">
        <SupportBar
          variant="floor"
          required={support.required}
          planned={support.planned}
          outcomes={support.outcomes}
          numbers={support.numbers}
          label={support.label}
          current={support.numbers.indexOf(progress.here ?? -1)}
        />
      </div>
      <section className="mt-5" aria-labelledby="steps">
        <h2 id="steps" className="text-lead font-semibold">
          Steps
        </h2>
        <ol className="mt-1 border-t border-ink">
          {steps.map(({ number, title, planned }) => (
            <li key={number} className="border-b border-line">
              <a
                href={floorPath(lot.id, number, leg)}
                aria-current={number === progress.here ? "step" : undefined}
                className="flex min-h-14 items-center gap-3 py-1 text-lead no-underline aria-[current=step]:bg-wash aria-[current=step]:font-semibold"
              >
                <span className="w-8 flex-none text-right tabular-nums">{number}</span>
                <Swatch level={SUPPORT_SIGNS[planned].level} />
                <span className="min-w-0 flex-1">
                  {title}
                  <span className="block text-body font-normal text-quiet">{SUPPORT_SIGNS[planned].word}</span>
                </span>
                <span className="flex-none text-body text-quiet">{stateOf(number, sheet)}</span>
              </a>
            </li>
          ))}
        </ol>
      </section>
      <section className="mt-5 border-2 border-stop p-4">
        <h2 className="text-figure font-semibold">{emergency.heading}</h2>
        <p className="text-lead">{emergency.text}</p>
        {emergency.call !== null && <p className="text-lead font-semibold">{emergency.call}</p>}
      </section>
      <div className="mt-5 text-lead">
        <FloorCautions cautions={sheet.cautions} />
      </div>
      <FloorEntries entries={sheet.entries} />
    </>
  );
}

function stateOf(step: number, { progress, pin, blocks }: FloorSheet): string {
  if (blocks.some((block) => block.step === step)) return "stopped";
  if (progress.underWay === step) return "under way";
  if (progress.done.includes(step)) return "done";
  if (progress.here === step) return "next";
  return step < pin.fromStep ? "elsewhere" : "";
}

/** Once for each revision and person: that they have read it, and know what must not happen. */
function Acknowledge({ sheet, newId, here }: { sheet: FloorSheet; newId: string; here: string }) {
  if (sheet.pin.state !== "released") return null;
  return (
    <FloorForm
      action={here}
      next={here}
      words={`Sheet ${sheet.pin.number} ${sheet.pin.letter} acknowledged`}
      className="mt-4"
    >
      <p className="text-lead">
        Read the steps and the cautions below first. Nothing starts before you have acknowledged this revision; your
        name and the time are kept.
      </p>
      <EntryFields sheet={sheet} id={newId} kind="acknowledged" step={null} />
      <button
        type="submit"
        className="btn btn-primary mt-3 min-h-31 w-full flex-col items-start px-5 text-figure tablet:min-h-27"
      >
        I have read {sheet.pin.number} {sheet.pin.letter}
        <span className="text-lead font-normal">Acknowledge it, once for this revision</span>
      </button>
    </FloorForm>
  );
}
