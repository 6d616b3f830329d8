import { Form, useNavigation } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { Notice } from "#app/components/ui/Notice.tsx";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import type { CalibrationResult, FittedValue, ResidualRow } from "#app/lib/calibration-view.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

type Fitted = Extract<CalibrationResult, { kind: "fitted" }>;

/** What the measured bows say: the fitted values with their uncertainty and what is left over, or why they say nothing. */
export function CalibrationOutcome({ result, mayUse }: { result: CalibrationResult; mayUse: boolean }) {
  if (result.kind === "refused")
    return (
      <Notice kind="caution" title={noBreak(result.reason)}>
        {result.wouldHelp ?? "Measure pairs after other steps, or state the values better first."}
      </Notice>
    );
  const { answer, scatter, doubt, values, correlation, residuals, workings } = result;
  return (
    <section className="frame mb-4 max-w-240" aria-labelledby="calibrated">
      <div className="p-4 tablet:p-6">
        <h2 id="calibrated" className="sr-only">
          Result
        </h2>
        <p role="status" className="max-w-[44em] text-figure font-medium text-pretty">
          {noBreak(answer)}
        </p>
        <p className={`mt-1 max-w-[60em] ${doubt ? "font-semibold" : "text-quiet"}`}>{noBreak(scatter)}</p>
        <p className="mt-1 max-w-[60em] text-quiet">
          {correlation !== null &&
            noBreak(`The two values hang together, with a correlation of ${correlation}: use both or neither. `)}
          {noBreak(
            "± is k = 2 and holds the uncertainty of the bows alone; what is wrong with other inputs of the flow goes into the values.",
          )}
        </p>
      </div>
      <Values values={values} />
      <Residuals rows={residuals} />
      <details className="border-t border-ink p-4 tablet:px-6">
        <summary className="link w-fit cursor-pointer">Working</summary>
        <div className="mt-2 space-y-6">
          {workings.map((working, index) => (
            <WorkingView key={index} working={working} />
          ))}
        </div>
      </details>
      <Use result={result} mayUse={mayUse} />
    </section>
  );
}

function Values({ values }: { values: FittedValue[] }) {
  const name = "Stated and fitted values";
  return (
    <div className="overflow-x-auto border-t border-ink" tabIndex={0} role="region" aria-label={name}>
      <table className="table">
        <caption className="sr-only">{name}</caption>
        <thead>
          <tr>
            <th scope="col">Value</th>
            <th scope="col" className="num max-tablet:hidden">
              Stated
            </th>
            <th scope="col" className="num">
              Fitted, ± k = 2
            </th>
          </tr>
        </thead>
        <tbody>
          {values.map(({ label, of, stated, fitted }) => (
            <tr key={label}>
              <th scope="row" className="font-normal">
                {label} <span className="block text-label text-quiet">{of}</span>
              </th>
              <td className="num max-tablet:hidden">{stated}</td>
              <td className="num font-semibold">{fitted}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** On a phone a step has a line of its own above its figures: beside them there is no room for both. */
const HEADS = ["Measured", "As stated", "Fitted", "Left over", "Uncertainty"] as const;

/** What was computed before the fit is left out on a phone. */
const figureClass = (head: string | undefined) => (head === "As stated" ? "num max-tablet:hidden" : "num");

function Residuals({ rows }: { rows: ResidualRow[] }) {
  const name = "Measured and computed bows";
  return (
    <div className="overflow-x-auto border-t border-ink" tabIndex={0} role="region" aria-label={name}>
      <table className="table">
        <caption className="sr-only">
          {name}, <OwnHead unit="µm" />
        </caption>
        <thead>
          <tr>
            <th scope="col" className="max-tablet:hidden">
              After step
            </th>
            {HEADS.map((head) => (
              <th key={head} scope="col" className={figureClass(head)}>
                {head}{" "}
                <span className="block font-normal text-quiet">
                  <OwnHead unit="µm" />
                </span>
              </th>
            ))}
          </tr>
        </thead>
        {rows.map(({ step, title, measured, stated, fitted, residual, uncertainty }, index) => (
          <tbody key={index}>
            <tr className="tablet:hidden">
              <th scope="rowgroup" colSpan={HEADS.length - 1} className="pb-0 font-normal">
                After step {step}, {title}
              </th>
            </tr>
            <tr className="max-tablet:[&>td]:border-t-0">
              <th scope="row" className="font-normal max-tablet:hidden">
                {step}, {title}
              </th>
              {[measured, stated, fitted, residual, uncertainty].map((figure, column) => (
                <td key={column} className={figureClass(HEADS[column])}>
                  <OwnFigure unit="µm">{figure}</OwnFigure>
                </td>
              ))}
            </tr>
          </tbody>
        ))}
      </table>
    </div>
  );
}

/** Puts what was seen into the library, with the bows that it was fitted to: what is typed below may have changed since. */
function Use({ result, mayUse }: { result: Fitted; mayUse: boolean }) {
  const waiting = useNavigation().state === "submitting";
  return (
    <div className="border-t border-ink p-4 tablet:p-6">
      {mayUse ? (
        <Form method="post">
          {result.sent.map(([name, value]) => (
            <input key={name} type="hidden" name={name} value={value} />
          ))}
          <button type="submit" name="intent" value="use" className="btn" disabled={waiting}>
            {waiting ? "Using them" : "Use these values"}
          </button>
          <p className="mt-2 max-w-[60em] text-quiet">
            They take the place of the stated ones, as measured here, with their tolerance. Assessments that used the
            old ones will say that they are out of date.
          </p>
        </Form>
      ) : (
        <p className="text-quiet">A process owner puts fitted values into the library.</p>
      )}
    </div>
  );
}
