import { formatQuantity } from "#app/engine/units/format.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import { signedMicrometres } from "#app/lib/reference-summary.ts";
import type { ReferenceView } from "#app/schemas/instrument.ts";
import { SetAside } from "./SetAside.tsx";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** The readings of a wafer of known bow, oldest first, each against it. */
export function ReferenceTable({ reference, mayCheck }: { reference: ReferenceView; mayCheck: boolean }) {
  const { wafer, readings, summary } = reference;
  const um = (metres: number) => withoutUnit(formatQuantity(metres, "length", { unit: "µm", decimals: 2 }));
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`Readings of ${wafer.name}`}>
      <table className="table">
        <caption className="sr-only">Readings of {wafer.name}</caption>
        <thead>
          <tr>
            <th scope="col">Reading</th>
            <th scope="col" className="num">
              Bow
              <span className="block font-normal text-quiet">
                <OwnHead unit="µm" />
              </span>
            </th>
            <th scope="col" className="num">
              Less known
              <span className="block font-normal text-quiet">
                <OwnHead unit="µm" />
              </span>
            </th>
            <th scope="col">Agrees</th>
          </tr>
        </thead>
        <tbody>
          {readings.map(({ id, measuredOn, bow, note, setAside, createdBy }, n) => {
            const { error = 0, passes = null } = summary.errors[n] ?? {};
            return (
              <tr key={id}>
                <th scope="row" className="font-normal">
                  {n + 1}, {measuredOn} <span className="block text-label text-quiet">{createdBy}</span>
                  {note && <span className="block text-label text-quiet">{note}</span>}
                  {mayCheck && setAside === null && (
                    <SetAside what="reading" id={id} name={`reading ${n + 1} of ${wafer.name}`} />
                  )}
                </th>
                <td className="num">
                  <OwnFigure unit="µm">{um(bow)}</OwnFigure>
                </td>
                <td className="num">
                  <OwnFigure unit="µm">{withoutUnit(signedMicrometres(error))}</OwnFigure>
                </td>
                <td>{setAside === null ? agreesWords(passes) : `set aside: ${setAside}`}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}

function agreesWords(passes: boolean | null) {
  if (passes === null) return <span className="text-quiet">not told</span>;
  return passes ? "yes" : <span className="font-semibold text-caution">no</span>;
}
