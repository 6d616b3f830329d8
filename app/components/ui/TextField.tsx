import { useId, type InputHTMLAttributes, type ReactNode } from "react";
import { Verbatim } from "#app/components/units/Understood.tsx";

interface Props extends Omit<InputHTMLAttributes<HTMLInputElement>, "id"> {
  name: string;
  label: string;
  /** what was understood, or what is expected; gives way to the error */
  hint?: ReactNode;
  error?: string | undefined;
}

/** A labelled input with its hint or its error below; the wiring for assistive technology is done here once. */
export function TextField({ label, hint, error, className = "", ...input }: Props) {
  const id = useId();
  const described = error || hint ? `${id}-note` : undefined;
  return (
    <div className={`field ${className}`}>
      <label htmlFor={id}>{label}</label>
      <input {...input} id={id} aria-invalid={error ? true : undefined} aria-describedby={described} />
      <small id={`${id}-note`}>{error === undefined ? hint : <Verbatim>{error}</Verbatim>}</small>
    </div>
  );
}
