import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import type { RecordView } from "#app/components/library/LibraryDetail.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import { propertyRows } from "#app/components/library/property.ts";
import { CARRIER_MATERIALS } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { meanOfCurve } from "#app/lib/expansion-rows.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { CARRIER_PROPERTIES } from "./carrier-properties.ts";
import { SecondLine } from "./SecondLine.tsx";

type Carrier = LibraryRecords["carrier"];

/** The light that a carrier lets through, in words. */
function passes({ passesUltraviolet, passesInfrared }: Carrier): string {
  const light = [passesUltraviolet && "ultraviolet", passesInfrared && "infrared"].filter(Boolean);
  return light.join(", ") || "none";
}

const yesOrNo = (answer: boolean | null) => (answer === null ? "not given" : answer ? "yes" : "no");

/** Silicon's own curve is not stated with the carrier. */
const expansionOver = ({ expansion, expansionCurve, expansionRange }: Carrier) =>
  expansion || expansionCurve ? expansionRange : "silicon’s own curve";

const times = (count: number) => (count === 1 ? "once" : `${count} times`);

export const CARRIER_LIST: ListView<Carrier> = {
  ...KINDS.carriers,
  path: kindPath("carriers"),
  filters: [{ name: "material", label: "Material", options: sameWords(CARRIER_MATERIALS) }],
  belongs:
    "Glass and silicon carriers belong here, each with its thickness, expansion and limit. A bond step chooses one.",
  columns: [
    { key: "material", head: "Material", sortable: true, wide: true, cell: ({ material }) => material },
    {
      key: "diameter",
      head: "Diameter",
      unit: "mm",
      numeric: true,
      sortable: true,
      cell: ({ diameter }) => formatBare(diameter, "length", "mm"),
    },
    {
      key: "thickness",
      head: "Thickness",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ thickness }) => formatMeasured(thickness, "length", { unit: "µm", bare: true }),
    },
    {
      key: "modulus",
      head: "Modulus E",
      unit: "GPa",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ youngsModulus }) => formatBare(youngsModulus.value, "stress", "GPa"),
    },
    {
      key: "expansion",
      head: "Expansion",
      unit: "ppm/K",
      numeric: true,
      sortable: true,
      cell: ({ expansion, expansionCurve, expansionRange }) => {
        const value = expansion ?? (expansionCurve && meanOfCurve(expansionCurve));
        if (!value) return "silicon’s own";
        return (
          <>
            {formatMeasured(value, "expansion", { unit: "ppm/K", bare: true })}
            <SecondLine>{expansionRange}</SecondLine>
          </>
        );
      },
    },
    {
      key: "source",
      head: "Source of expansion",
      wide: true,
      // Silicon's own curve is a published one.
      cell: ({ expansion, expansionCurve }) => (
        <SourceMark kind={expansion?.source ?? expansionCurve?.source ?? "handbook"} />
      ),
    },
    {
      key: "variation",
      head: "TTV",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ thicknessVariation }) => formatBare(thicknessVariation.value, "length", "µm"),
    },
    {
      key: "passes",
      head: "Passes light",
      wide: true,
      cell: (carrier) => (
        <>
          {passes(carrier)}
          {carrier.perforated && <SecondLine>perforated</SecondLine>}
        </>
      ),
    },
    {
      key: "limit",
      head: "Limit",
      unit: "°C",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ temperatureLimit }) => formatBare(temperatureLimit.value, "temperature", "°C"),
    },
    {
      key: "reuse",
      head: "Reuse limit",
      unit: "times",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ reuseLimit }) => reuseLimit,
    },
  ],
};

/** A carrier by itself; what it does to a wafer is shown by the trial of a pair. */
export function carrierView(carrier: Carrier): RecordView {
  return {
    properties: propertyRows(carrier, CARRIER_PROPERTIES),
    facts: [
      { label: "Material", value: carrier.material },
      { label: "Diameter", value: formatQuantity(carrier.diameter, "length", { unit: "mm" }) },
      { label: "Expansion over", value: expansionOver(carrier) },
      { label: "Passes light", value: passes(carrier) },
      { label: "Perforated", value: carrier.perforated ? "yes, for solvent" : "no" },
      { label: "May be used", value: times(carrier.reuseLimit) },
      { label: "Conductive coating", value: yesOrNo(carrier.handling.conductiveCoating) },
      { label: "Seen by sensors", value: yesOrNo(carrier.handling.seenBySensors) },
      { label: "Opaque layer", value: yesOrNo(carrier.handling.metalInLight) },
    ],
  };
}
