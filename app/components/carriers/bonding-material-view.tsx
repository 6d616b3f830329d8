import { noBreak } from "#app/components/drawings/no-break.ts";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import type { RecordView } from "#app/components/library/LibraryDetail.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import type { Fact } from "#app/components/library/Facts.tsx";
import { givenRows, notGiven, propertyRows } from "#app/components/library/property.ts";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { softensAt } from "#app/lib/adhesive-bands.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { BOND_HEAT_PROPERTIES, BONDING_MATERIAL_PROPERTIES, PEEL_PROPERTIES } from "./bonding-material-properties.ts";
import { RESISTANCES, resistanceText } from "./resistance-words.ts";
import { SecondLine } from "./SecondLine.tsx";
import type { SiteFacts } from "#app/lib/kind-data.ts";

type BondingMaterial = LibraryRecords["bondingMaterial"];

const { flowPoint: _thermoplasticsAlone, ...CROSS_LINKED_PROPERTIES } = BONDING_MATERIAL_PROPERTIES;

const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C" });
const classOf = ({ flows }: BondingMaterial) => (flows ? "flows" : "cross-linked");
const range = ({ leastThickness, mostThickness }: BondingMaterial) =>
  `${formatBare(leastThickness, "length", "µm")} to ${formatQuantity(mostThickness, "length", { unit: "µm" })}`;

/** Temperature up to which a step on this material is clear, K. */
function clearBelow(material: BondingMaterial, { adhesiveMargin }: SiteFacts): number {
  const withMargin = material.temperatureLimit.value - adhesiveMargin;
  const soft = softensAt(material);
  return material.flows && soft !== null ? Math.min(soft, withMargin) : withMargin;
}

export const bondingMaterialList = (site: SiteFacts): ListView<BondingMaterial> => ({
  ...KINDS["bonding-materials"],
  path: kindPath("bonding-materials"),
  filters: [
    { name: "class", label: "Class", options: sameWords(["flows", "cross-linked"]) },
    { name: "release", label: "Lets go by", options: sameWords(RELEASE_METHODS) },
  ],
  belongs:
    "Temporary bonding materials belong here, each with its softening point, its limit and the way it lets go. A bond step chooses one.",
  columns: [
    { key: "class", head: "Class", sortable: true, wide: true, cell: classOf },
    {
      key: "softening",
      head: "Softens",
      unit: "°C",
      numeric: true,
      sortable: true,
      cell: ({ softening }) => (softening ? formatBare(softening.value, "temperature", "°C") : "none"),
    },
    {
      key: "limit",
      head: "Limit",
      unit: "°C",
      numeric: true,
      sortable: true,
      cell: (material) => (
        <>
          {formatBare(material.temperatureLimit.value, "temperature", "°C")}
          <SecondLine>clear below {formatBare(clearBelow(material, site), "temperature", "°C")}</SecondLine>
        </>
      ),
    },
    {
      key: "bond",
      head: "Bonds at",
      unit: "°C",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ bondTemperature }) => formatBare(bondTemperature.value, "temperature", "°C"),
    },
    {
      key: "thickness",
      head: "Thickness",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ leastThickness, mostThickness }) =>
        `${formatBare(leastThickness, "length", "µm")} to ${formatBare(mostThickness, "length", "µm")}`,
    },
    {
      key: "modulus",
      head: "Locked-in modulus",
      unit: "MPa",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ effectiveModulus, dataSheetModulus }) => (
        <>
          {formatMeasured(effectiveModulus, "stress", { unit: "MPa", bare: true })}
          {dataSheetModulus && (
            <SecondLine>
              data sheet {formatMeasured(dataSheetModulus, "stress", { unit: "MPa", bare: true })}
            </SecondLine>
          )}
        </>
      ),
    },
    {
      key: "source",
      head: "Source of modulus",
      wide: true,
      cell: ({ effectiveModulus }) => <SourceMark kind={effectiveModulus.source} />,
    },
    {
      key: "release",
      head: "Lets go by",
      sortable: true,
      wide: true,
      cell: ({ release, releaseTemperature }) => (
        <>
          {release}
          <SecondLine>at {celsius(releaseTemperature.value)}</SecondLine>
        </>
      ),
    },
  ],
});

function meaning(material: BondingMaterial): string {
  const soft = softensAt(material);
  if (soft === null) return "Stays coupled: it is cross-linked and has no softening point in the range used.";
  const at = celsius(soft);
  return material.flows
    ? `Flows above ${at}; never in vacuum above it.`
    : `Stays coupled above ${at}: it is cross-linked and does not flow.`;
}

/** What it does in each exposure, as the handling rules take it and as its data sheet says it; what they would do without. */
function handlingFacts(material: BondingMaterial): Fact[] {
  const { handling } = material;
  const stands = RESISTANCES.map(({ name, label, says }): Fact => {
    const words = says && material[says] !== "not known" ? material[says] : "";
    return {
      label,
      value: (
        <>
          {resistanceText(handling[name])}
          {words && <SecondLine>{noBreak(words)}</SecondLine>}
        </>
      ),
    };
  });
  const missing = [
    ...notGiven(handling, BOND_HEAT_PROPERTIES),
    ...(material.release.includes("peel") ? notGiven(handling, PEEL_PROPERTIES) : []),
  ];
  return [
    ...stands,
    ...(handling.attackedBy.length > 0 ? [{ label: "Attacked by", value: handling.attackedBy.join(", ") }] : []),
    ...(handling.releaseLight ? [{ label: "Light of release", value: handling.releaseLight }] : []),
    ...(handling.remover ? [{ label: "Taken off with", value: handling.remover }] : []),
    ...(missing.length > 0 ? [{ label: "Not given", value: missing.join(", ") }] : []),
  ];
}

/** A bonding material: what its softening point means, up to where it is clear, and all its properties. */
export function bondingMaterialView(material: BondingMaterial, site: SiteFacts): RecordView {
  const { effectiveModulus, dataSheetModulus, temperatureLimit } = material;
  const modulus = formatMeasured(effectiveModulus, "stress", { unit: "MPa" });
  const instead = dataSheetModulus
    ? `, not the ${formatMeasured(dataSheetModulus, "stress", { unit: "MPa" })} of the data sheet`
    : "";
  return {
    answer: meaning(material),
    because: `A step on it is clear below ${celsius(clearBelow(material, site))} and does not run beyond ${celsius(temperatureLimit.value)}. The locked-in modulus, ${modulus}, couples the pair${instead}.`,
    properties: [
      ...(material.flows
        ? propertyRows(material, BONDING_MATERIAL_PROPERTIES)
        : propertyRows(material, CROSS_LINKED_PROPERTIES)),
      ...givenRows(material.handling, { ...BOND_HEAT_PROPERTIES, ...PEEL_PROPERTIES }),
    ],
    facts: [
      { label: "Class", value: material.flows ? "thermoplastic, flows" : "cross-linked" },
      { label: "Lets go by", value: material.release },
      { label: "Thickness", value: range(material) },
      { label: "Heatings it stands", value: material.thermalCycles ?? "not known" },
      ...handlingFacts(material),
    ],
  };
}
