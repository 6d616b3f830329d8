interface Props {
  done: number;
  /** zero while it is not known */
  of: number;
  /** what is counted: 'Wafers drawn' */
  label: string;
}

/** How far a run is: a bar with its figures beside it. */
export function RunProgress({ done, of, label }: Props) {
  const text = of === 0 ? "Reading the inputs" : `${count(done)} of ${count(of)}`;
  return (
    <span className="flex items-center gap-2 text-quiet">
      <progress className="w-32" value={of === 0 ? undefined : done} max={of || 1} aria-label={label} />
      {text}
    </span>
  );
}

/** A count with its thousands set apart. */
export const count = (number: number) => String(number).replace(/\B(?=(?:\d{3})+$)/g, ",");
