import type { RecordView } from "#app/components/library/LibraryDetail.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import { propertyRows } from "#app/components/library/property.ts";
import type { Property } from "#app/components/ui/PropertyTable.tsx";
import type { Measured } from "#app/engine/measured.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { SILICON_DENSITY } from "#app/engine/silicon/density.ts";
import { siliconExpansion, siliconThermalStrain } from "#app/engine/silicon/expansion.ts";
import { siliconDirectionalConstants, siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import { KINDS, kindPath } from "#app/lib/library-kinds.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";
import { FACES, SILICON_PROPERTIES } from "./silicon-properties.ts";

type Silicon = LibraryRecords["silicon"];

const ROOM = 298.15;
const HOT = 423.15;

/** Four digits: the elastic constants are known to about that. */
const gigapascal = (value: number) => formatQuantity(value, "stress", { unit: "GPa", significant: 4 });

export const SILICON_LIST: ListView<Silicon> = {
  ...KINDS.silicon,
  path: kindPath("silicon"),
  filters: [
    {
      name: "orientation",
      label: "Face",
      options: Object.entries(FACES).map(([value, label]) => ({ value, label })),
    },
  ],
  belongs:
    "Wafers as they are bought belong here. Stacks and flows start from one; its elastic data follow from its face.",
  columns: [
    { key: "orientation", head: "Face", sortable: true, cell: ({ orientation }) => FACES[orientation] },
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
      cell: ({ thickness }) => formatMeasured(thickness, "length", { unit: "µm", bare: true }),
    },
    {
      key: "modulus",
      head: "Biaxial modulus",
      unit: "GPa, 25\u00A0°C",
      numeric: true,
      wide: true,
      cell: ({ orientation }) => formatBare(siliconBiaxialModulus(orientation), "stress", "GPa"),
    },
  ],
};

const fromCrystal = (value: number): Measured => ({
  value,
  tolerance: null,
  source: "handbook",
  note: "from the elastic constants of silicon, see the method page",
});
const fromCurve = (value: number): Measured => ({
  value,
  tolerance: null,
  source: "handbook",
  note: "Okada and Tokumaru 1984, see the method page",
});

/** What the face of a wafer fixes: nothing of it is typed in. */
function crystalRows(orientation: Silicon["orientation"]): Property[] {
  const modulus = (label: string, value: number): Property => ({
    label,
    measured: fromCrystal(value),
    dimension: "stress",
    unit: "GPa",
  });
  const expansion = (label: string, value: number): Property => ({
    label,
    measured: fromCurve(value),
    dimension: "expansion",
    unit: "ppm/K",
  });
  const plate = siliconPlateConstants(orientation);
  return [
    modulus("Biaxial modulus at 25\u00A0°C", siliconBiaxialModulus(orientation)),
    modulus("Biaxial modulus at 150\u00A0°C", siliconBiaxialModulus(orientation, HOT)),
    modulus("Young’s modulus as a plate", plate.youngsModulus),
    {
      label: "Poisson’s ratio as a plate",
      measured: fromCrystal(plate.poissonsRatio),
      dimension: "number",
      unit: "",
    },
    ...(orientation === "100"
      ? [
          modulus("Young’s modulus along <100>", siliconDirectionalConstants("100").youngsModulus),
          modulus("Young’s modulus along <110>", siliconDirectionalConstants("110").youngsModulus),
        ]
      : []),
    expansion("Thermal expansion at 25\u00A0°C", siliconExpansion(ROOM)),
    expansion("Thermal expansion, mean 25 to 150\u00A0°C", siliconThermalStrain(ROOM, HOT) / (HOT - ROOM)),
    {
      label: "Density",
      measured: { ...fromCrystal(SILICON_DENSITY), note: "from memory of the named publication" },
      dimension: "density",
      unit: "kg/m³",
    },
  ];
}

/** A wafer as it is bought: what its face makes of it. */
export function siliconView(silicon: Silicon): RecordView {
  const { orientation, diameter } = silicon;
  return {
    answer: `${FACES[orientation]} silicon bends with a biaxial modulus of ${gigapascal(siliconBiaxialModulus(orientation))} at 25\u00A0°C.`,
    because:
      "It follows from the crystal and is the same in every direction of the face. Only the thickness below is this wafer’s own.",
    properties: [...propertyRows(silicon, SILICON_PROPERTIES), ...crystalRows(orientation)],
    facts: [
      { label: "Face", value: FACES[orientation] },
      { label: "Diameter", value: formatQuantity(diameter, "length", { unit: "mm" }) },
    ],
  };
}
