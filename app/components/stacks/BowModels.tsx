import { memo } from "react";
import {
  againstFreeWafer,
  differencePercent,
  lengthWords,
  percentWords,
  type Estimated,
} from "#app/lib/stack-words.ts";
import { Remark } from "./Remark.tsx";

/** Share from which the thin-film formula counts as off, in percent of the laminate's bow. */
const OFF = 5;

/**
 * The bow by three models side by side: the thin-film formula that spreadsheets use, the laminate that takes thick films, and
 * the free wafer beyond small bows. A curled wafer has no bow, so its edge lift stands there.
 */
export const BowModels = memo(function BowModels({ estimated: { answer } }: { estimated: Estimated }) {
  const { stoney, laminate, shape } = answer;
  const curled = shape.regime === "curled";
  const off = differencePercent(Math.abs(stoney.bow_m), Math.abs(laminate.bow_m));
  const rows = [
    { name: "Stoney’s formula, thin films", bow: stoney.bow_m },
    { name: "Laminate, small bows", bow: laminate.bow_m },
  ];
  return (
    <section className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby="models">
      <h3 id="models" className="font-semibold">
        Bow by three models, 25&nbsp;°C
      </h3>
      <div className="mt-1 overflow-x-auto" tabIndex={0} role="region" aria-label="Bow by three models">
        <table className="table">
          <caption className="sr-only">Bow by three models at 25&nbsp;°C, device side up, centre high positive</caption>
          <thead>
            <tr>
              <th scope="col">Model</th>
              <th scope="col" className="num">
                Bow, device side up
              </th>
              <th scope="col" className="num">
                Difference
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ name, bow }) => (
              <tr key={name}>
                <th scope="row" className="font-normal">
                  {name}
                </th>
                <td className="num">{lengthWords(bow, true)}</td>
                <td className="text-right">{againstFreeWafer(bow, shape)}</td>
              </tr>
            ))}
            <tr className="font-semibold">
              <th scope="row" className="font-semibold">
                Free wafer, large bows
              </th>
              <td className="text-right">
                {curled ? `curled, edge lift ${lengthWords(shape.warp_m)}` : lengthWords(shape.bow_m, true)}
              </td>
              <td />
            </tr>
          </tbody>
        </table>
      </div>
      {curled && (
        <p className="mt-1 text-label text-quiet">
          A curled wafer has no bow: the first two say what small-bow formulas would make of it, set against its edge
          lift.
        </p>
      )}
      {off !== null && Math.abs(off) > OFF && (
        <Remark>{`Stoney’s formula gives ${percentWords(Math.abs(off))} ${off > 0 ? "more" : "less"} than the laminate: the films are no thin films here`}</Remark>
      )}
    </section>
  );
});
