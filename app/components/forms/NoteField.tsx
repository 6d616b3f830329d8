import { getTextareaProps, type FieldMetadata } from "@conform-to/react";
import type { ReactNode } from "react";

/** Several lines of text. */
export function NoteField({
  field,
  label,
  rows = 3,
  hint,
}: {
  field: FieldMetadata<string | undefined>;
  label: string;
  rows?: number;
  hint?: ReactNode;
}) {
  return (
    <div className="field">
      <label htmlFor={field.id}>{label}</label>
      <textarea {...getTextareaProps(field)} key={field.key} rows={rows} aria-describedby={field.errorId} />
      <small id={field.errorId}>{field.errors?.[0] ?? hint}</small>
    </div>
  );
}
