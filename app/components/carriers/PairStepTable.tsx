import type { PairStep } from "#app/lib/calibration-view.ts";

/** The steps after which a pair has a bow, with what is computed from the stated values: for those who may only look. */
export function PairStepTable({ steps }: { steps: readonly PairStep[] }) {
  const name = "Computed bows of the pair";
  return (
    <section className="frame max-w-240 p-4 tablet:p-6" aria-labelledby="pair-steps">
      <h2 id="pair-steps" className="font-semibold">
        {name}
      </h2>
      <p className="text-quiet">Engineers and process owners of the program enter measured bows beside them.</p>
      <div className="mt-2 overflow-x-auto" tabIndex={0} role="region" aria-label={name}>
        <table className="table">
          <caption className="sr-only">{name}</caption>
          <thead>
            <tr>
              <th scope="col" className="num">
                Step
              </th>
              <th scope="col">What is done</th>
              <th scope="col" className="num">
                Standard bow at 25&nbsp;°C
              </th>
            </tr>
          </thead>
          <tbody>
            {steps.map(({ number, title, bow }) => (
              <tr key={number}>
                <td className="num">{number}</td>
                <th scope="row" className="font-normal">
                  {title}
                </th>
                <td className="num">{bow}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}
