import type { ReactNode } from "react";
import { useNavigation } from "react-router";

interface Props {
  children: ReactNode;
  /** what it says while the form is on its way */
  busy: string;
  /** id of the form that it sends, where it stands outside of it */
  form?: string;
  /** takes something away: not the filled one */
  removes?: boolean;
  /** its size, where hands in gloves press it */
  className?: string;
}

/** The one filled button of a form. It keeps its place while the form is on its way. */
export function SubmitButton({ children, busy, form, removes = false, className = "" }: Props) {
  const waiting = useNavigation().state === "submitting";
  return (
    <button
      type="submit"
      form={form}
      className={`btn ${removes ? "btn-remove" : "btn-primary"} ${className}`}
      disabled={waiting}
    >
      {waiting ? busy : children}
    </button>
  );
}
