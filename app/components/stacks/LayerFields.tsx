import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { Link } from "react-router";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { FilmCutFields } from "#app/components/forms/FilmCutFields.tsx";
import type { MeasuredText } from "#app/components/forms/MeasuredField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { toleranceRule, type QuantityRule } from "#app/lib/read-quantity.ts";
import type { DraftLayer, FilmChoice } from "#app/lib/stack-draft.ts";
import type { LayerText } from "#app/lib/stack-text.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { Remark } from "./Remark.tsx";
import { SourceFields } from "./SourceFields.tsx";

interface Props {
  field: FieldMetadata<LayerText>;
  draft: DraftLayer | undefined;
  films: readonly FilmChoice[];
  /** opens what a film that the library lacks is typed into */
  onTypeFilm: () => void;
}

/** The fields of one film of the stack. */
export function LayerFields({ field, draft, films, onTypeFilm }: Props) {
  const { side, film, thickness, stress } = field.getFieldset();
  const thicknessParts = thickness.getFieldset();
  const stressParts = stress.getFieldset();
  return (
    <div className="space-y-3">
      <input {...getInputProps(side, { type: "hidden" })} key={side.key} />
      <ChoiceField
        field={film}
        label="Film"
        choices={films.map(({ id, name }) => ({ value: id, label: name }))}
        blank="Choose"
        hint={<TypeFilm onTypeFilm={onTypeFilm} />}
      />
      <QuantityField
        field={thicknessParts.value}
        label="Thickness"
        dimension="length"
        rule={RULES.filmThickness}
        example="5 µm"
      />
      <FilmCutFields field={field} />
      {draft?.film && <FilmStress film={draft.film} />}
      <QuantityField
        field={stressParts.value}
        label="Stress for this stack only"
        dimension="stress"
        rule={RULES.stress}
        example="as the film"
        hint="Blank keeps the film’s value"
      />
      {draft?.remarks.map((remark) => (
        <Remark key={remark}>{remark}</Remark>
      ))}
      <details>
        <summary className="link w-fit cursor-pointer text-label">Tolerances and sources</summary>
        <Provenance parts={thicknessParts} of="thickness" rule={RULES.filmThickness} />
        <Provenance parts={stressParts} of="stress" rule={RULES.stress} />
      </details>
    </div>
  );
}

/** The way to a film that the library lacks: beside the stack, or without scripts on a page of its own. */
function TypeFilm({ onTypeFilm }: Pick<Props, "onTypeFilm">) {
  const inBrowser = useInBrowser();
  if (inBrowser)
    return (
      <button type="button" className="link cursor-pointer" onClick={onTypeFilm}>
        Not in the library? Type it here
      </button>
    );
  return (
    <Link to="/films/new" className="link">
      Not in the library? Add it there
    </Link>
  );
}

/** The stress that the film brings along, and where it is from. */
function FilmStress({ film }: { film: FilmChoice }) {
  const { value, source, on } = film.stress;
  const sense = value > 0 ? "tension" : value < 0 ? "compression" : "no stress";
  return (
    <div className="text-label text-quiet">
      <p>Stress at 25&nbsp;°C</p>
      <p className="text-lead font-medium text-ink">
        {formatMeasured(film.stress, "stress", { unit: "MPa", sign: true })}
      </p>
      <p>
        {sense},{" "}
        {source === "assumed" ? (
          <span className="font-semibold text-caution">assumed</span>
        ) : (
          [source, on].filter(Boolean).join(" ")
        )}
        .{" "}
        <Link to={`/films/${film.id}`} className="link">
          Open the film
        </Link>
      </p>
    </div>
  );
}

interface ProvenanceProps {
  parts: ReturnType<FieldMetadata<MeasuredText>["getFieldset"]>;
  /** whose tolerance and source they are */
  of: string;
  rule: QuantityRule;
}

/** Tolerance and source of a value. */
function Provenance({ parts, of, rule }: ProvenanceProps) {
  return (
    <div className="mt-2 grid grid-cols-2 gap-x-3">
      <QuantityField
        field={parts.tolerance}
        label={`Tolerance of the ${of}, ±`}
        dimension={rule.dimension}
        rule={toleranceRule(rule)}
        hint="Half-width"
      />
      <SourceFields parts={parts} of={of} />
    </div>
  );
}
