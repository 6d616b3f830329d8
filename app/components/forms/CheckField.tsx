import { getInputProps, type FieldMetadata } from "@conform-to/react";

/** A box to tick. */
export function CheckField({ field, label }: { field: FieldMetadata<boolean | undefined>; label: string }) {
  return (
    <label className="flex min-h-8 items-center gap-2">
      <input {...getInputProps(field, { type: "checkbox" })} key={field.key} className="size-4 accent-ink" />
      <span>{label}</span>
    </label>
  );
}
