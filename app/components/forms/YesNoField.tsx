import type { FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";
import { ChoiceField, sameWords } from "./ChoiceField.tsx";

const YES_OR_NO = sameWords(["yes", "no"]);

/** Yes, no, or not given: what nobody has said is no 'no'. */
export function YesNoField(props: { field: FieldMetadata<string | undefined>; label: string; hint?: ReactNode }) {
  return <ChoiceField {...props} choices={YES_OR_NO} blank="Not given" />;
}
