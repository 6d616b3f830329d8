import { formatQuantity } from "#app/engine/units/format.ts";
import { Link } from "react-router";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { azimuthText } from "#app/lib/wafer-label.ts";
import type { ScanParameters } from "#app/schemas/scan-result.ts";
import type { ScanDetail } from "#app/schemas/scan-view.ts";

/** What the stress was computed with, beside the two files. */
export function ScanInputs({ parameters, placed }: { parameters: ScanParameters; placed: ScanDetail["placed"] }) {
  const thickness = (value: number, tolerance: number | null) =>
    formatMeasured({ value, tolerance, source: "measured here" }, "length", { unit: "µm" });
  const mm = (value: number) => formatQuantity(value, "length", { unit: "mm" });
  const rows = [
    ["Film thickness", thickness(parameters.filmThickness, parameters.filmThicknessTolerance)],
    [
      parameters.siliconThicknessFrom ? `Silicon thickness, ${parameters.siliconThicknessFrom}` : "Silicon thickness",
      thickness(parameters.siliconThickness, parameters.siliconThicknessTolerance),
    ],
    ...(typeof parameters.sinceCure === "number"
      ? [["From cure to scan", formatQuantity(parameters.sinceCure, "time", { unit: "h", significant: 3, trim: true })]]
      : []),
    ["Diameter", mm(parameters.diameter)],
    ["Orientation", `(${parameters.orientation})`],
    ["Rim left out", mm(parameters.edgeExclusion)],
    ...(typeof placed?.azimuth === "number" ? [["Azimuth from the notch", azimuthText(placed.azimuth)]] : []),
    ...(placed ? [["Instrument", placed.instrument || "not named"]] : []),
  ];
  return (
    <section aria-labelledby="inputs">
      <h2 id="inputs" className="font-semibold">
        Computed with
      </h2>
      <dl className="mt-1">
        {placed && (
          <div className="flex justify-between gap-4 py-2">
            <dt className="text-quiet">Wafer</dt>
            <dd className="text-right">
              <Link to={`/wafers/${placed.wafer.id}`} className="link wrap-anywhere">
                {placed.wafer.label}
              </Link>
            </dd>
          </div>
        )}
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
