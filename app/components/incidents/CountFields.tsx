import type { FieldMetadata } from "@conform-to/react";
import { LineField } from "#app/components/forms/LineField.tsx";

interface Props {
  affected: FieldMetadata<string>;
  broken: FieldMetadata<string>;
  through: FieldMetadata<string>;
}

const DIGITS = { inputMode: "numeric" } as const;

/** How many wafers an incident is of. */
export function CountFields({ affected, broken, through }: Props) {
  return (
    <>
      <LineField field={affected} label="Wafers it happened to" input={DIGITS} />
      <LineField field={broken} label="Of these broken or scrapped" hint="0 for none" input={DIGITS} />
      <LineField
        field={through}
        label="Wafers of the lot that went through this step"
        hint="These among them. Rates count by it; blank: not known"
        input={DIGITS}
      />
    </>
  );
}
