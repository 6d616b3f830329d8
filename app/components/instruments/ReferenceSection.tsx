import { ChartFigure } from "#app/components/charts/ChartFigure.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { referencePlot } from "#app/components/drawings/reference-plot.ts";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { signedMicrometres, type ReferenceSentence } from "#app/lib/reference-summary.ts";
import type { ReferenceView } from "#app/schemas/instrument.ts";
import { ReferenceTable } from "./ReferenceTable.tsx";

/** A wafer of known bow: what its readings say, drawn over time, each of them, and the workings. */
export function ReferenceSection({ reference, mayCheck }: { reference: ReferenceView; mayCheck: boolean }) {
  const { wafer, readings, summary, workings } = reference;
  const known = formatWithUncertainty(wafer.bow, 2 * wafer.bowUncertainty, "length", { unit: "µm", sign: true });
  const agrees =
    summary.within === null
      ? ""
      : ` Shaded: where a reading agrees with the known bow, ±\u00A0${formatQuantity(summary.within, "length", { unit: "µm", significant: 2 })}.`;
  return (
    <section className="border-t border-line py-4" aria-label={wafer.name}>
      <h3 className="font-medium">
        {wafer.name}: known bow {known} (k = 2) over {Math.round(wafer.diameter * 1000)}&nbsp;mm
      </h3>
      {wafer.note && <p className="max-w-[60em] text-quiet">{wafer.note}</p>}
      <ul className="mt-1 mb-3 max-w-240">
        {summary.sentences.map((sentence) => (
          <Sentence key={sentence.text} {...sentence} />
        ))}
      </ul>
      <div className="grid gap-6 wide:grid-cols-2">
        <ChartFigure
          plot={referencePlot({ readings, summary, formatError: signedMicrometres })}
          label={`Readings of ${wafer.name}, read less known`}
          summary={`Read less known, in the order of the readings.${agrees}`}
          xName="Reading"
        />
        <ReferenceTable reference={reference} mayCheck={mayCheck} />
      </div>
      {workings.length > 0 && (
        <details className="mt-2">
          <summary className="link w-fit cursor-pointer text-label">Working</summary>
          <div className="mt-2 space-y-6">
            {workings.map((working) => (
              <WorkingView key={working.equation} working={working} level={4} />
            ))}
          </div>
        </details>
      )}
    </section>
  );
}

function Sentence({ level, text }: ReferenceSentence) {
  return (
    <li className="flex gap-3 border-t border-line py-2 first:border-0">
      <span className="mt-0.5 w-[22px] flex-none">{level !== "note" && <Swatch level={level} />}</span>
      <p>
        {level === "caution" && <b className="text-caution">Caution. </b>}
        {noBreak(text)}
      </p>
    </li>
  );
}
