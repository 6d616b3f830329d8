import { getInputProps, type FieldMetadata } from "@conform-to/react";
import type { InputHTMLAttributes, ReactNode } from "react";
import { PlainInput } from "./PlainInput.tsx";

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  hint?: ReactNode;
  type?: "text" | "number";
  className?: string;
  input?: InputHTMLAttributes<HTMLInputElement>;
}

/** A line of text with its error or hint below. */
export function LineField({ field, label, hint, type = "text", className = "", input }: Props) {
  return (
    <div className={`field ${className}`}>
      <label htmlFor={field.id}>{label}</label>
      <PlainInput {...getInputProps(field, { type })} {...input} key={field.key} aria-describedby={field.errorId} />
      <small id={field.errorId}>{field.errors?.[0] ?? hint}</small>
    </div>
  );
}
