import type { FieldName } from "@conform-to/react";
import type { LayerText } from "#app/lib/stack-text.ts";

/** Id of the form, so that buttons elsewhere on the page can send it. */
export const STACK_FORM = "stack";

/** The id that conform gives a field of this form. */
export const fieldId = (name: string) => `${STACK_FORM}-${name}`;

export function focusField(name: string) {
  const field = document.getElementById(fieldId(name));
  const folded = field?.closest("details");
  if (folded) folded.open = true;
  field?.focus();
}

/** The films of the form as a list. */
export const LAYERS = "layers" as FieldName<LayerText[]>;
