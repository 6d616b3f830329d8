import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { sameWords } from "#app/components/forms/ChoiceField.tsx";
import type { ListView } from "#app/components/library/LibraryList.tsx";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { formatBare, formatMeasured } from "#app/lib/format-measured.ts";
import type { LibraryRecords } from "#app/schemas/library-records.ts";

export const FILM_LIST: ListView<LibraryRecords["film"]> = {
  title: "Films",
  one: "film",
  many: "films",
  path: "/films",
  filters: [{ name: "kind", label: "Kind", options: sameWords(FILM_KINDS) }],
  belongs: "Films with their stress, modulus and expansion belong here. Stacks and flows are made of them.",
  columns: [
    { key: "kind", head: "Kind", sortable: true, wide: true, cell: ({ kind }) => kind },
    {
      key: "stress",
      head: "Stress at 25\u00A0°C",
      unit: "MPa",
      numeric: true,
      sortable: true,
      cell: ({ stress }) => formatMeasured(stress, "stress", { unit: "MPa", sign: true, bare: true }),
    },
    {
      key: "sense",
      head: "Pulls as",
      wide: true,
      cell: ({ stress }) => (stress.value > 0 ? "tension" : stress.value < 0 ? "compression" : "none"),
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
      wide: true,
      cell: ({ expansion }) => formatBare(expansion.value, "expansion", "ppm/K"),
    },
    {
      key: "limit",
      head: "Limit",
      unit: "°C",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ temperatureLimit }) =>
        temperatureLimit ? formatBare(temperatureLimit.value, "temperature", "°C") : "not given",
    },
    {
      key: "source",
      head: "Source of stress",
      sortable: true,
      cell: ({ stress }) => (
        <>
          <SourceMark kind={stress.source} />
          {stress.meanOf !== undefined && (
            <span className="block text-label text-quiet">
              {stress.meanOf === 1 ? "1 accepted value" : `mean of ${stress.meanOf} values`}
            </span>
          )}
        </>
      ),
    },
  ],
};
