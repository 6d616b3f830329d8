import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { useState, type ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";
import { readQuantity, type QuantityRule } from "#app/lib/read-quantity.ts";

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  dimension: Dimension;
  /** the rule that the server reads it by, so that a value out of range is told while it is typed */
  rule?: QuantityRule;
  /** shown while nothing is typed: an example with its unit */
  example?: string;
  hint?: ReactNode;
  className?: string;
}

/** A quantity typed with its unit. What was understood stands below as it is typed; a fault is said in a sentence. */
export function QuantityField({ field, label, dimension, rule, example, hint, className = "" }: Props) {
  const initial = field.initialValue ?? "";
  const [typed, setTyped] = useState(initial);
  const changed = typed !== initial;
  const error = changed ? undefined : field.errors?.[0];
  const read = () => (rule ? readQuantity(typed, rule) : parseQuantity(typed, dimension));
  const reading = typed.trim() === "" ? null : read();
  const fault = error ?? (reading && !reading.ok ? reading.message : undefined);
  return (
    <div className={`field ${className}`}>
      <label htmlFor={field.id}>{label}</label>
      <input
        {...getInputProps(field, { type: "text" })}
        key={field.key}
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        placeholder={example}
        aria-invalid={fault ? true : undefined}
        aria-describedby={field.errorId}
        onInput={(event) => setTyped(event.currentTarget.value)}
      />
      <small id={field.errorId} aria-live="polite">
        {fault ?? (reading?.ok ? reading.understood : hint)}
      </small>
    </div>
  );
}
