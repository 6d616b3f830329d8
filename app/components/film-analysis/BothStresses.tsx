import { noBreak } from "#app/components/drawings/no-break.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { angleText } from "#app/lib/angle-text.ts";
import type { BothStresses as Both, DirectionalView, Expanded } from "#app/schemas/film-analysis.ts";

const mpa = ({ value, uncertainty }: Expanded) =>
  formatWithUncertainty(value, uncertainty, "stress", { unit: "MPa", sign: true });
const bare = (value: number) => formatQuantity(value, "stress", { unit: "MPa", significant: 3, sign: true });

/** The stress by the thin-film relation and by the full model, and by direction where the scans tell it. */
export function BothStresses({ stress, directional }: { stress: Both; directional: DirectionalView | null }) {
  const { stoney, full, differs, sentence } = stress;
  return (
    <section aria-labelledby="stress">
      <h2 id="stress" className="font-semibold">
        Film stress
      </h2>
      <dl className="mt-1">
        {full !== null && (
          <Line
            name={differs ? "By the thin-film relation" : "By the thin-film relation and the full model"}
            value={mpa(stoney)}
          />
        )}
        {full !== null && differs && <Line name="By the full model" value={mpa(full)} strong />}
        {directional && full !== null && (
          <>
            <Line name="Towards the notch" value={bare(directional.x)} />
            <Line name="Across it" value={bare(directional.y)} />
            <Line name="Shear" value={bare(directional.shear)} />
            <Line
              name={`Largest, at ${angleText(directional.angle)} from the notch; smallest, across it`}
              value={`${bare(directional.high)}; ${bare(directional.low)}`}
            />
          </>
        )}
      </dl>
      <p className="mt-1 text-label text-quiet">{noBreak(sentence)} Tension positive; ± is k = 2.</p>
    </section>
  );
}

function Line({ name, value, strong = false }: { name: string; value: string; strong?: boolean }) {
  return (
    <div
      className={`flex justify-between gap-4 border-t border-line py-2 first:border-0 ${strong ? "font-semibold" : ""}`}
    >
      <dt className={strong ? "" : "text-quiet"}>{name}</dt>
      <dd className="text-right">{noBreak(value)}</dd>
    </div>
  );
}
