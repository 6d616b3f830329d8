import type { FieldMetadata } from "@conform-to/react";
import { useState } from "react";
import { ChoiceField } from "#app/components/forms/ChoiceField.tsx";
import type { ExplainedChoice } from "#app/lib/flow-step-choices.ts";

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  choices: readonly ExplainedChoice[];
  blank: string;
  /** said while nothing is chosen */
  hint?: string;
  className?: string;
  onChoose?: (id: string) => void;
}

/** A choice from the library; what matters of the one chosen stands below it. */
export function ExplainedChoiceField({ field, label, choices, blank, hint, className, onChoose }: Props) {
  const [chosen, setChosen] = useState(field.initialValue ?? "");
  const words = choices.find(({ id }) => id === chosen)?.words;
  return (
    <ChoiceField
      field={field}
      label={label}
      choices={choices.map(({ id, name }) => ({ value: id, label: name }))}
      blank={blank}
      hint={words ?? hint}
      className={className}
      select={{
        onChange: (event) => {
          setChosen(event.currentTarget.value);
          onChoose?.(event.currentTarget.value);
        },
      }}
    />
  );
}
