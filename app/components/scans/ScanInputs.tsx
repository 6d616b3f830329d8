import { formatQuantity } from "#app/engine/units/format.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import type { ScanParameters } from "#app/schemas/scan-result.ts";

/** What the stress was computed with, beside the two files. */
export function ScanInputs({ parameters }: { parameters: ScanParameters }) {
  const thickness = (value: number, tolerance: number | null) =>
    formatMeasured({ value, tolerance, source: "measured here" }, "length", { unit: "µm" });
  const mm = (value: number) => formatQuantity(value, "length", { unit: "mm" });
  const rows = [
    ["Film thickness", thickness(parameters.filmThickness, parameters.filmThicknessTolerance)],
    ["Silicon thickness", thickness(parameters.siliconThickness, parameters.siliconThicknessTolerance)],
    ["Diameter", mm(parameters.diameter)],
    ["Orientation", `(${parameters.orientation})`],
    ["Rim left out", mm(parameters.edgeExclusion)],
  ];
  return (
    <section aria-labelledby="inputs">
      <h2 id="inputs" className="font-semibold">
        Computed with
      </h2>
      <dl className="mt-1">
        {rows.map(([name, value]) => (
          <div key={name} className="flex justify-between gap-4 border-t border-line py-2 first:border-0">
            <dt className="text-quiet">{name}</dt>
            <dd className="text-right">{value}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
