import { getCollectionProps, type FieldMetadata } from "@conform-to/react";

interface Props<Value extends string> {
  field: FieldMetadata<string[]>;
  legend: string;
  options: readonly Value[];
  words: (value: Value) => string;
  hint: string;
}

/** Some of several things, each with a box to tick. */
export function CheckList<Value extends string>({ field, legend, options, words, hint }: Props<Value>) {
  return (
    <fieldset className="field" aria-describedby={field.errorId}>
      <legend className="mb-1 text-label text-quiet">{legend}</legend>
      {getCollectionProps(field, { type: "checkbox", options: [...options] }).map(({ key, ...box }) => (
        <label key={key} className="mb-0 flex min-h-8 items-center gap-2 text-body text-ink">
          <input {...box} className="size-4 accent-ink" />
          <span>{words(box.value as Value)}</span>
        </label>
      ))}
      <small id={field.errorId}>{field.errors?.[0] ?? hint}</small>
    </fieldset>
  );
}
