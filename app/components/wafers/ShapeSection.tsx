import { useId } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { WaferMap } from "#app/components/drawings/WaferMap.tsx";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { Directions, ShapeView } from "#app/schemas/film-analysis.ts";

interface Props {
  shape: ShapeView;
  directions: Directions;
  azimuths: readonly number[];
}

const TITLES: Record<ShapeView["of"], string> = {
  "after the film": "The wafer after the film",
  "before the film": "The wafer before the film",
  "change by the film": "What the film changed",
};

const NAMES: Record<string, string> = { bow: "Bow", "bow, best fit": "Bow, best fit", warp: "Warp", sori: "Sori" };

/** A shape of the wafer: its map, and bow, warp and sori with what each is. */
export function ShapeSection({ shape, directions, azimuths }: Props) {
  const id = useId();
  const { of, figures, map, rms, remarks } = shape;
  const axis = directions.all?.angleTold ? directions.all.angle.value : null;
  return (
    <section aria-labelledby={id} className="break-inside-avoid">
      <h3 id={id} className="font-semibold">
        {TITLES[of]}
      </h3>
      <div className="mt-2 grid gap-6 wide:grid-cols-2">
        <figure>
          <WaferMap
            map={map}
            label={`${TITLES[of]}: heights over the wafer, notch down`}
            azimuths={azimuths}
            axis={axis}
          />
          <figcaption className="mt-2 text-label text-quiet">
            Device side towards you, notch down. Dotted: the scans, with their azimuths from the notch.
            {axis !== null && " Chain line: the axis along which it curves most."} Left over between scans and surface:{" "}
            {formatQuantity(rms, "length", { significant: 2 })} root mean square.
          </figcaption>
        </figure>
        <div>
          <dl>
            {figures.map(({ name, value, definition, source }) => (
              <div key={name} className="grid grid-cols-[1fr_auto] gap-x-4 border-t border-line py-2 first:border-0">
                <dt className="font-medium">{NAMES[name] ?? name}, k = 2</dt>
                <dd className="text-right font-medium">
                  {noBreak(
                    formatWithUncertainty(value.value, value.uncertainty, "length", {
                      unit: "µm",
                      sign: name.startsWith("bow"),
                    }),
                  )}
                </dd>
                <dd className="col-span-2 text-label text-quiet">
                  {definition} {source}.
                </dd>
              </div>
            ))}
          </dl>
          <ul className="mt-2 text-label">
            {remarks.map((remark) => (
              <li key={remark} className="py-1">
                {noBreak(remark)}
              </li>
            ))}
          </ul>
        </div>
      </div>
    </section>
  );
}
