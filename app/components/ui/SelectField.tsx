import { useId, type ReactNode, type SelectHTMLAttributes } from "react";

export interface Option {
  value: string;
  label: string;
}

interface Props extends Omit<SelectHTMLAttributes<HTMLSelectElement>, "id"> {
  name: string;
  label: string;
  options: readonly Option[];
  /** offered first, with an empty value */
  blank?: string;
  hint?: ReactNode;
  error?: string | undefined;
}

/** A labelled choice with its hint or error below. */
export function SelectField({ label, options, blank, hint, error, className = "", ...select }: Props) {
  const id = useId();
  const described = error || hint ? `${id}-note` : undefined;
  return (
    <div className={`field ${className}`}>
      <label htmlFor={id}>{label}</label>
      <select {...select} id={id} aria-invalid={error ? true : undefined} aria-describedby={described}>
        {blank !== undefined && <option value="">{blank}</option>}
        {options.map(({ value, label: text }) => (
          <option key={value} value={value}>
            {text}
          </option>
        ))}
      </select>
      <small id={`${id}-note`}>{error ?? hint}</small>
    </div>
  );
}
