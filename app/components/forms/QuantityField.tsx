import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { useState, type ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";

interface Props {
  field: FieldMetadata<string | undefined>;
  label: string;
  dimension: Dimension;
  /** shown while nothing is typed: an example with its unit */
  example?: string;
  hint?: ReactNode;
  className?: string;
}

/** A quantity typed with its unit. What was understood stands below as it is typed; a fault is said in a sentence. */
export function QuantityField({ field, label, dimension, example, hint, className = "" }: Props) {
  const initial = field.initialValue ?? "";
  const [typed, setTyped] = useState(initial);
  const [said] = field.errors ?? [];
  const [judged, setJudged] = useState({ said, typed });
  if (said !== judged.said) setJudged({ said, typed });
  // What the server found wrong is about the text that it was sent.
  const error = typed === judged.typed ? said : undefined;
  const reading = typed.trim() === "" ? null : parseQuantity(typed, dimension);
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
