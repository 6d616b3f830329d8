import { useId } from "react";
import { Form } from "react-router";
import { bowWithUncertainty } from "#app/lib/prediction-words.ts";
import type { StepMeasurementRow, StepMeasurements } from "#app/schemas/step-measurement.ts";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** Every bow that is recorded beside an assessment, by step. */
export function MeasuredTable({ page: { rows, maySetAside } }: { page: StepMeasurements }) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Measured bows">
      <table className="table border-t border-ink">
        <caption className="sr-only">Measured bows</caption>
        <thead>
          <tr>
            <th scope="col">After step</th>
            <th scope="col">Lot, wafer</th>
            <th scope="col" className="num">
              Predicted
              <span className="block">
                <OwnHead unit="µm, k = 2" />
              </span>
            </th>
            <th scope="col" className="num">
              Measured
              <span className="block">
                <OwnHead unit="µm, k = 2" />
              </span>
            </th>
            <th scope="col">Measured on</th>
            <th scope="col">Recorded</th>
            <th scope="col">State</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.id} row={row} maySetAside={maySetAside} />
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Row({ row, maySetAside }: { row: StepMeasurementRow; maySetAside: boolean }) {
  return (
    <tr>
      <td>
        {row.step}, {row.title}
      </td>
      <td>{[row.lot, row.wafer].filter(Boolean).join(", ")}</td>
      <td className="num">
        <OwnFigure unit="µm">{bowWithUncertainty(row.predicted, row.predictedUncertainty)}</OwnFigure>
      </td>
      <td className="num">
        <OwnFigure unit="µm">{bowWithUncertainty(row.bow, row.standardUncertainty)}</OwnFigure>
        {!row.stated && <span className="block text-label text-quiet">± not stated</span>}
      </td>
      <td>
        {row.measuredAt.slice(0, 10)}
        {row.instrument && <span className="block text-label text-quiet">{row.instrument}</span>}
      </td>
      <td>
        {row.createdAt.slice(0, 10)}, {row.createdBy}
      </td>
      <td>
        {row.setAside ? <b className="text-caution">set aside</b> : "counts"}
        {row.setAside && (
          <span className="block text-label text-quiet">
            {row.setAside.reason} ({row.setAside.at.slice(0, 10)}, {row.setAside.by})
          </span>
        )}
        {maySetAside && <Change row={row} />}
      </td>
    </tr>
  );
}

function Change({ row: { id, wafer, step, setAside } }: { row: StepMeasurementRow }) {
  const field = useId();
  const name = `${wafer}, step ${step}`;
  if (setAside)
    return (
      <Form method="post" preventScrollReset className="screen-only">
        <input type="hidden" name="row" value={id} />
        <button type="submit" name="intent" value="put back" className="btn" aria-label={`Put back: ${name}`}>
          Put back
        </button>
      </Form>
    );
  return (
    <details className="screen-only">
      <summary className="link w-fit cursor-pointer whitespace-nowrap">Set aside</summary>
      <Form method="post" preventScrollReset className="mt-2 w-56 max-w-full">
        <input type="hidden" name="row" value={id} />
        <div className="field">
          <label htmlFor={field}>Why it does not count</label>
          <input id={field} name="reason" required maxLength={300} autoComplete="off" />
        </div>
        <button
          type="submit"
          name="intent"
          value="set aside"
          className="btn btn-remove mt-2"
          aria-label={`Set aside: ${name}`}
        >
          Set aside
        </button>
      </Form>
    </details>
  );
}
