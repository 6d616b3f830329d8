import { getInputProps, type FieldMetadata } from "@conform-to/react";
import { useState, type ReactNode } from "react";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";
import { readQuantity, type QuantityRule } from "#app/lib/read-quantity.ts";
import { PlainInput } from "./PlainInput.tsx";
import { Understood, Verbatim } from "#app/components/units/Understood.tsx";

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
  const [typed, setTyped] = useState(textOf(field.initialValue));
  // Another key says that another text has been put into the field.
  const [key, setKey] = useState(field.key);
  if (key !== field.key) {
    setKey(field.key);
    setTyped(textOf(field.initialValue));
  }
  // What the server said is about what was sent: it goes with the first key, until the server has said something again.
  const [answered, setAnswered] = useState<string[]>();
  const error = field.errors === answered ? undefined : field.errors?.[0];
  const read = () => (rule ? readQuantity(typed, rule) : parseQuantity(typed, dimension));
  const reading = typed.trim() === "" ? null : read();
  const fault = error ?? (reading && !reading.ok ? reading.message : undefined);
  return (
    <div
      className={`field ${className}`}
      onInput={({ target }) => {
        setTyped((target as HTMLInputElement).value);
        setAnswered(field.errors);
      }}
    >
      <label htmlFor={field.id}>{label}</label>
      <PlainInput
        {...getInputProps(field, { type: "text" })}
        key={field.key}
        inputMode="text"
        autoComplete="off"
        spellCheck={false}
        placeholder={example}
        aria-invalid={fault ? true : undefined}
        aria-describedby={field.errorId}
      />
      <small id={field.errorId} aria-live="polite">
        {fault !== undefined ? (
          <Verbatim>{fault}</Verbatim>
        ) : reading?.ok ? (
          <Understood text={reading.understood} dimension={dimension} />
        ) : (
          hint
        )}
      </small>
    </div>
  );
}

/** The text of a field; a post that is not from one of our forms may have sent something else under its name. */
const textOf = (value: unknown) => (typeof value === "string" ? value : "");
