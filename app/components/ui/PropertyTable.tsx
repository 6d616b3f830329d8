import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";

export interface Property {
  label: string;
  measured: Measured | null | undefined;
  dimension: Dimension;
  unit: string;
  sign?: boolean;
  /** what it means that none is given */
  missing?: string;
}

/** A phone has no room for the columns: their words stand under property and value there. */
const ON_WIDE = "max-tablet:hidden print:table-cell";

const where = (measured: Measured | null | undefined) => [measured?.note, measured?.on].filter(Boolean).join(", ");

/** Properties of a material with tolerance, source and note: where every number comes from. */
export function PropertyTable({ caption, properties }: { caption: string; properties: Property[] }) {
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Property</th>
            <th scope="col" className="num">
              Value ± tolerance
            </th>
            <th scope="col" className={ON_WIDE}>
              Source
            </th>
            <th scope="col" className={ON_WIDE}>
              Where exactly
            </th>
          </tr>
        </thead>
        <tbody>
          {properties.map(({ label, measured, dimension, unit, sign, missing }) => (
            <tr key={label}>
              <th scope="row" className="font-normal">
                {label}
                {where(measured) !== "" && (
                  <span className="block text-label text-quiet tablet:hidden print:hidden">{where(measured)}</span>
                )}
              </th>
              <td className="num font-medium">
                {measured ? formatMeasured(measured, dimension, { unit, sign }) : "–"}
                <span className="block font-normal tablet:hidden print:hidden">
                  <SourceOf measured={measured} missing={missing} />
                </span>
              </td>
              <td className={ON_WIDE}>
                <SourceOf measured={measured} missing={missing} />
              </td>
              <td className={`text-quiet ${ON_WIDE}`}>{where(measured)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function SourceOf({ measured, missing }: Pick<Property, "measured" | "missing">) {
  return measured ? (
    <SourceMark kind={measured.source} />
  ) : (
    <span className="text-quiet">{missing ?? "not given"}</span>
  );
}
