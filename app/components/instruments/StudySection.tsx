import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { StudyView } from "#app/schemas/instrument.ts";
import { repeatabilityOfBow, repeatabilityText } from "./repeatability-text.ts";
import { SetAside } from "./SetAside.tsx";

interface Props {
  study: StudyView;
  inUse: boolean;
  mayCheck: boolean;
}

/** A repeatability study: what it says, its repeats, its working. */
export function StudySection({ study, inUse, mayCheck }: Props) {
  const { id, wafer, diameter, readings, result, note, setAside, createdAt, createdBy, working } = study;
  const day = createdAt.slice(0, 10);
  return (
    <section id={`study-${id}`} className="scroll-mt-4 border-t border-line py-3" aria-label={`Study of ${day}`}>
      <h3 className="font-medium">
        {day}, {wafer}: {repeatabilityText(result.forTwo)} (k = 2)
        {inUse && <span className="ml-3 text-label font-semibold text-clear">in use</span>}
      </h3>
      <p className="max-w-[60em]">
        {readings.length} repeats by {createdBy}; as a bow over {Math.round(diameter * 1000)}&nbsp;mm{" "}
        {repeatabilityOfBow(result.forTwo, diameter)}. {result.remark} {note}
      </p>
      {setAside !== null && (
        <p className="max-w-[60em]">
          <b className="text-caution">Set aside.</b> {setAside}
        </p>
      )}
      <details className="mt-1">
        <summary className="link w-fit cursor-pointer text-label">Repeats and working</summary>
        <div className="mt-2 grid gap-6 wide:grid-cols-2">
          <Repeats study={study} />
          <WorkingView working={working} level={4} />
        </div>
      </details>
      {mayCheck && setAside === null && <SetAside what="study" id={id} name={`study of ${day}, ${wafer}`} />}
    </section>
  );
}

function Repeats({ study: { readings, result, wafer } }: { study: StudyView }) {
  const perKm = (value: number, sign = false) =>
    formatQuantity(value, "curvature", { unit: "1/km", significant: 6, sign }).replace(/\u00A0.*$/, "");
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={`Repeats on ${wafer}`}>
      <table className="table">
        <caption className="sr-only">Repeats on {wafer}</caption>
        <thead>
          <tr>
            <th scope="col">Repeat</th>
            <th scope="col" className="num">
              Curvature<span className="block font-normal text-quiet">1/km</span>
            </th>
            <th scope="col" className="num">
              From the mean<span className="block font-normal text-quiet">1/km</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {readings.map(({ curvature, file }, n) => (
            <tr key={n}>
              <th scope="row" className="font-normal wrap-anywhere">
                {n + 1}
                {file !== null && `, ${file}`}
              </th>
              <td className="num">{perKm(curvature)}</td>
              <td className="num">
                {formatQuantity(curvature - result.mean, "curvature", {
                  unit: "1/km",
                  significant: 2,
                  sign: true,
                }).replace(/\u00A0.*$/, "")}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
