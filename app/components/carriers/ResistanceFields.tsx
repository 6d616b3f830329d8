import type { FieldMetadata } from "@conform-to/react";
import { CheckGroup } from "#app/components/forms/CheckGroup.tsx";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import { LineField } from "#app/components/forms/LineField.tsx";
import { QuantityField } from "#app/components/forms/QuantityField.tsx";
import { SOLVENT_FAMILIES } from "#app/engine/flow/handling-inputs.ts";
import { FormGroup } from "./FormGroup.tsx";
import { RESISTANCES, type ResistanceName } from "./resistance-words.ts";

export interface ResistanceText {
  word: string;
  longest: string;
}

interface Props {
  handling: Record<ResistanceName, FieldMetadata<ResistanceText | undefined>> & {
    attackedBy: FieldMetadata<string[] | undefined>;
  };
  /** the words of the data sheet, where there is a field for them */
  says?: Record<"vacuum" | "solvent" | "acid" | "base", FieldMetadata<string | undefined>>;
  /** what follows where nothing is given, in one sentence */
  without: string;
}

const WORDS = [
  { value: "resists", label: "Resists" },
  { value: "attacked", label: "Is attacked" },
  { value: "unknown", label: "Not known" },
];

/** What a bonding material or a tape does in vacuum, chemicals and light: the word that the rules take, and what its data sheet says. */
export function ResistanceFields({ handling, says, without }: Props) {
  return (
    <FormGroup label="What it stands">
      <p className="mb-3 max-w-[60em] text-quiet">The handling rules go by the word and the time. {without}</p>
      <div className="space-y-3 tablet:space-y-0">
        {RESISTANCES.map(({ name, label, says: words }) => {
          const { word, longest } = handling[name].getFieldset();
          return (
            <div
              key={name}
              role="group"
              aria-label={label}
              className="grid grid-cols-2 gap-x-3 gap-y-1 tablet:grid-cols-[3fr_3fr_7fr]"
            >
              <ChoiceField field={word} label={label} choices={WORDS} blank="Not given" />
              <QuantityField field={longest} label="For at most" dimension="time" example="30 min" />
              {words && says && (
                <LineField
                  field={says[words]}
                  label="In the words of its data sheet"
                  className="max-tablet:col-span-2"
                />
              )}
            </div>
          );
        })}
      </div>
      <CheckGroup field={handling.attackedBy} label="Solvents that attack it all the same" options={SOLVENT_FAMILIES} />
    </FormGroup>
  );
}
