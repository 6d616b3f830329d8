import { getSelectProps, type FieldMetadata } from "@conform-to/react";
import type { ReactNode, SelectHTMLAttributes } from "react";

export interface Choice {
  value: string;
  label: string;
}

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  choices: readonly Choice[];
  /** offered first, with an empty value */
  blank?: string;
  hint?: ReactNode;
  className?: string;
  select?: SelectHTMLAttributes<HTMLSelectElement>;
}

/** A choice with its error or hint below. */
export function ChoiceField({ field, label, choices, blank, hint, className = "", select }: Props) {
  return (
    <div className={`field ${className}`}>
      <label htmlFor={field.id}>{label}</label>
      <select {...getSelectProps(field)} {...select} key={field.key} aria-describedby={field.errorId}>
        {blank !== undefined && <option value="">{blank}</option>}
        {choices.map(({ value, label: text }) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
      <small id={field.errorId}>{field.errors?.[0] ?? hint}</small>
    </div>
  );
}

/** Choices whose value is also their label. */
export const sameWords = (words: readonly string[]): Choice[] =>
  words.map((word) => ({ value: word, label: word.charAt(0).toUpperCase() + word.slice(1) }));
