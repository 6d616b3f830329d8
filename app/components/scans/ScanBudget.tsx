import { formatQuantity } from "#app/engine/units/format.ts";
import { COVERAGE, stressText } from "#app/lib/scan-answer.ts";
import type { ScanContribution, ScanResult } from "#app/schemas/scan-result.ts";

const WORDS: Record<string, string> = {
  "curvature change": "Curvature, from the scatter of the points",
  "biaxial modulus": "Silicon’s modulus, 1\u00A0% taken",
  "silicon thickness": "Silicon thickness, by its tolerance",
  "film thickness": "Film thickness, by its tolerance",
};

/** Where the uncertainty of the stress comes from: what each input adds, and its part of the whole. */
export function ScanBudget({ result }: { result: ScanResult }) {
  const total = result.stressUncertainty ** 2;
  const share = ({ contribution }: ScanContribution) => (total === 0 ? 0 : contribution ** 2 / total);
  const sorted = result.budget.toSorted((a, b) => b.contribution - a.contribution);
  return (
    <section aria-labelledby="budget">
      <h2 id="budget" className="font-semibold">
        Where the ± in {stressText(result)} comes from
      </h2>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Parts of the uncertainty">
        <table className="table">
          <thead>
            <tr>
              <th scope="col">Input</th>
              <th scope="col" className="num">
                Adds, k = 2<span className="block">MPa</span>
              </th>
              <th scope="col" className="num">
                Part of the whole
                <span className="block">of the squares</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {sorted.map((row) => (
              <tr key={row.input}>
                <th scope="row" className="font-normal">
                  {WORDS[row.input] ?? row.input}
                </th>
                {row.given ? (
                  <>
                    <td className="num">
                      {formatQuantity(COVERAGE * row.contribution, "stress", { unit: "MPa", significant: 2 }).replace(
                        /\u00A0MPa$/,
                        "",
                      )}
                    </td>
                    <td className="num">{shareText(share(row))}</td>
                  </>
                ) : (
                  <td colSpan={2} className="num font-semibold text-caution">
                    no tolerance given
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <p className="mt-2 text-label text-quiet">
        Inputs taken as independent. Not in it: drift of the instrument, a second scan on another line, a film that
        varies over the wafer. The ± of curvature and bow hold the scatter of the points alone.
      </p>
    </section>
  );
}

const shareText = (share: number) =>
  share < 0.005 ? "under\u00A01\u00A0%" : formatQuantity(share, "fraction", { unit: "%", decimals: 0 });
