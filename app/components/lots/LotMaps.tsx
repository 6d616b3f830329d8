import { thicknessFigures } from "#app/engine/profile/map/thickness-sites.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { withoutUnit } from "#app/lib/format-measured.ts";
import { underneathWords } from "#app/lib/wafer-figures.ts";
import type { WaferMap } from "#app/schemas/lot-view.ts";
import { SiteMap } from "../drawings/SiteMap.tsx";

const µm = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 4 });

/** The newest thickness map of each wafer, site by site. */
export function LotMaps({ maps, diameter }: { maps: readonly WaferMap[]; diameter: number }) {
  return (
    <section className="mt-8" aria-labelledby="maps">
      <h2 id="maps" className="font-semibold">
        Thickness maps
      </h2>
      <p className="text-quiet">x to the right and y upwards, as the files give them.</p>
      <ul className="mt-2 grid gap-6 tablet:grid-cols-2 wide:grid-cols-3">
        {maps.map(({ wafer, sites, underneath, on }) => {
          const [x, y] = [sites.map((site) => site.x), sites.map((site) => site.y)];
          const { mean, ttv } = thicknessFigures({ x, y, z: sites.map((site) => site.thickness) });
          return (
            <li key={wafer.id} className="frame p-4">
              <SiteMap
                sites={sites.map(({ x: at, y: up, thickness }) => ({ x: at, y: up, value: thickness }))}
                radius={diameter / 2}
                label={`Thickness of ${wafer.name} at ${sites.length} sites: ${µm(mean)} on average, TTV ${µm(ttv)}`}
                unit="µm"
                format={(metres) => withoutUnit(µm(metres))}
              />
              <p className="mt-2 font-semibold">
                {wafer.name}
                {wafer.slot !== null && <span className="font-normal text-quiet">, slot {wafer.slot}</span>}
              </p>
              <p className="text-quiet">
                {`Mean ${µm(mean)}, TTV ${µm(ttv)} over ${sites.length} sites; ${underneathWords(underneath)}; ${on}`}
              </p>
            </li>
          );
        })}
      </ul>
    </section>
  );
}
