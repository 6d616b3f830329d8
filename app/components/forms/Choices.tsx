interface Props<Value extends string> {
  title: string;
  name: string;
  words: Record<Value, string>;
  chosen: Value;
  children?: string;
}

/** One of a few ways, all in sight. */
export function Choices<Value extends string>({ title, name, words, chosen, children }: Props<Value>) {
  return (
    <fieldset className="border-b border-line p-4 tablet:px-6">
      <legend className="contents">
        <span className="font-semibold">{title}</span>
      </legend>
      {Object.entries<string>(words).map(([value, label]) => (
        <label key={value} className="flex min-h-8 items-center gap-2 max-tablet:min-h-11">
          <input type="radio" name={name} value={value} defaultChecked={value === chosen} />
          {label}
        </label>
      ))}
      {children && <p className="text-quiet">{children}</p>}
    </fieldset>
  );
}
