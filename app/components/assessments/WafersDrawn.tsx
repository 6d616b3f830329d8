import { useId } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { RunBar } from "#app/components/ui/RunBar.tsx";
import { count } from "#app/components/ui/RunProgress.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { trialPath } from "#app/lib/leg-query.ts";
import { readSent } from "#app/lib/read-sent.ts";
import type { WafersRow, WafersView } from "#app/lib/wafers-view.ts";
import type { SentTrial } from "#app/schemas/trial.ts";
import { StepLink } from "./StepLink.tsx";
import { useFlowRun } from "./use-flow-run.ts";

/**
 * How the warp is spread over wafers at every step, by drawing wafers within the tolerances given, beside the first-order band. For
 * whoever may have the inputs, and only where scripts run: a worker draws.
 */
export function WafersDrawn({ assessmentId, leg }: { assessmentId: string; leg: number | null }) {
  const scripted = useInBrowser();
  const id = useId();
  const { state, run, stop } = useFlowRun<WafersView>("wafers");
  if (!scripted) return null;
  const draw = () => run(readSent<SentTrial>(trialPath(assessmentId, leg)).then(({ question }) => question));
  return (
    <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby={id}>
      <h2 id={id} className="font-semibold">
        Spread over wafers
      </h2>
      <p className="mt-1 mb-2 max-w-160 text-quiet">
        Wafers drawn within the tolerances of all inputs and carried through every step: the same film is the same film
        throughout.
      </p>
      <RunBar
        state={state}
        label="Wafers drawn"
        noun="wafers; their spread is worked out at the end"
        done={state.kind === "done" ? doneWords(state.found) : undefined}
        begin="Draw 20,000 wafers per step"
        onStart={draw}
        onStop={stop}
      />
      {state.found && state.found.rows.length > 0 ? <Rows view={state.found} /> : null}
    </section>
  );
}

function doneWords({ draws, inputs, ends }: WafersView): string {
  if (inputs === 0) return "No input has a tolerance, so all wafers are alike.";
  const known = ends === null ? "" : ` The ends of the bands are known to ${ends} (standard error) or better.`;
  return `${count(draws)} wafers drawn, ${count(inputs)} inputs with a tolerance.${known}`;
}

function Rows({ view: { rows, without } }: { view: WafersView }) {
  const caption = "Warp of nine wafers in ten, from 5 % to 95 %, and wafers beyond the limits of the tool";
  return (
    <>
      <div className="mt-3 overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
        <table className="table border-t border-ink">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr>
              <th scope="col">Step</th>
              <th scope="col" className="max-tablet:hidden">
                As planned
              </th>
              <th scope="col">5&nbsp;% to 95&nbsp;%, drawn</th>
              <th scope="col" className="max-tablet:hidden">
                By first order
              </th>
              <th scope="col" className="max-tablet:hidden">
                Beyond its tool’s limits, edges up or down
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <Row key={row.key} row={row} />
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-2 max-w-160 text-label text-quiet">
        {without.length > 0 ? `Held flat: ${without.length === 1 ? "step" : "steps"} ${without.join(", ")}. ` : ""}± is
        the standard error that 20,000 wafers leave. A share is that of the moment at which most wafers are beyond: as
        the wafer is loaded, as it leaves, or free at peak. Curvature is taken as a sum of parabolas, one for each
        input, which moves the ends of a band by up to 2&nbsp;% of its width; buckling is that of the full shape.
      </p>
    </>
  );
}

function Row({ row: { step, title, when, planned, drawn, firstOrder, beyond } }: { row: WafersRow }) {
  return (
    <tr className="align-top">
      <th scope="row" className="font-normal">
        <StepLink step={step} className="link">
          {step}
        </StepLink>{" "}
        {noBreak(title)}
        <span className="block text-label text-quiet">{noBreak(when)}</span>
      </th>
      <td className="max-tablet:hidden">{noBreak(planned)}</td>
      <td>
        {noBreak(drawn)}
        <span className="block text-label text-quiet tablet:hidden">first order: {noBreak(firstOrder)}</span>
        <span className="block tablet:hidden">
          <Limits beyond={beyond} />
        </span>
      </td>
      <td className="text-quiet max-tablet:hidden">{noBreak(firstOrder)}</td>
      <td className="max-tablet:hidden">
        <Limits beyond={beyond} />
      </td>
    </tr>
  );
}

/** Shares beyond the limits of a step's tool; on a phone they stand under the band. */
function Limits({ beyond }: Pick<WafersRow, "beyond">) {
  return beyond.map(({ limit, share, some }) => (
    <span key={limit} className={`block ${some ? "" : "text-quiet"}`}>
      <span className="tablet:hidden">beyond </span>
      {noBreak(limit)}: {some ? <strong className="font-semibold">{noBreak(share)}</strong> : share}
    </span>
  ));
}
