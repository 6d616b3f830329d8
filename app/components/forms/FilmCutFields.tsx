import type { FieldMetadata } from "@conform-to/react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { FILM_CUT_NAMES, FILM_CUTS, type FilmCutText } from "#app/lib/film-cut.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { ChoiceField } from "./ChoiceField.tsx";
import { QuantityField } from "./QuantityField.tsx";

const CHOICES = FILM_CUTS.map((cut) => ({ value: cut, label: FILM_CUT_NAMES[cut] }));
const BY_HAND = { alike: "Only of a patterned film", lines: "Only of lines" };

/** How a film is cut. With scripts only the fields that the choice asks for stand there, without them all do. */
export function FilmCutFields({ field }: { field: FieldMetadata<FilmCutText> }) {
  const { cut, coverage, lineWidth, lineDirection } = field.getFieldset();
  const inBrowser = useInBrowser();
  const asked = (by: "alike" | "lines") => {
    const chosen = cut.value ?? cut.initialValue;
    return !inBrowser || chosen === "lines" || (by === "alike" && chosen !== "whole");
  };
  const hint = (by: "alike" | "lines") => (inBrowser ? undefined : BY_HAND[by]);
  return (
    <div className="grid grid-cols-2 gap-3 tablet:grid-cols-[repeat(auto-fit,minmax(8.5rem,1fr))]">
      <ChoiceField field={cut} label="How it is cut" choices={CHOICES} className="col-span-full" />
      {asked("alike") && (
        <QuantityField
          field={coverage}
          label="Area coverage"
          dimension="fraction"
          rule={RULES.coverage}
          example="38 %"
          hint={hint("alike")}
        />
      )}
      {asked("lines") && (
        <>
          <QuantityField
            field={lineWidth}
            label="Width of the lines"
            dimension="length"
            rule={RULES.lineWidth}
            example="10 µm"
            hint={hint("lines")}
          />
          <QuantityField
            field={lineDirection}
            label="Direction of the lines"
            dimension="angle"
            rule={RULES.lineDirection}
            example="0°"
            hint="0° along the notch axis, 90° across it; counter-clockwise, device side up"
            className="col-span-full"
          />
          <p className="col-span-full text-label text-quiet">
            Wide lines pull as their coverage says and narrow tall ones along their length alone: both limits are exact,
            what lies between them is practical.
          </p>
        </>
      )}
    </div>
  );
}
