import { getCollectionProps, type FieldMetadata } from "@conform-to/react";

interface Props {
  field: FieldMetadata<string[] | undefined>;
  label: string;
  options: readonly string[];
  hint?: string;
}

/** Several of a list, each a box to tick. */
export function CheckGroup({ field, label, options, hint }: Props) {
  const error = field.errors?.[0];
  return (
    <fieldset className="field" aria-describedby={error || hint ? field.errorId : undefined}>
      <legend className="mb-1 text-label text-quiet">{label}</legend>
      <div className="flex flex-wrap gap-x-6">
        {getCollectionProps(field, { type: "checkbox", options: [...options] }).map(({ key, ...box }) => (
          <label key={key} className="mb-0 flex min-h-8 items-center gap-2 text-body text-ink">
            <input {...box} className="size-4 accent-ink" />
            <span>{box.value}</span>
          </label>
        ))}
      </div>
      <small id={field.errorId}>{error ?? hint}</small>
    </fieldset>
  );
}
