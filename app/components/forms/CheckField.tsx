import { getInputProps, type FieldMetadata } from "@conform-to/react";

/** A box to tick, with its error below. */
export function CheckField({ field, label }: { field: FieldMetadata<boolean | undefined>; label: string }) {
  const error = field.errors?.[0];
  return (
    <div className="field">
      <label className="mb-0 flex min-h-8 items-center gap-2 text-body text-ink">
        <input
          {...getInputProps(field, { type: "checkbox" })}
          key={field.key}
          aria-describedby={error ? field.errorId : undefined}
          className="size-4 accent-ink"
        />
        <span>{label}</span>
      </label>
      {error && <small id={field.errorId}>{error}</small>}
    </div>
  );
}
