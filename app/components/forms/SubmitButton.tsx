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
}

/** The one filled button of a form. It keeps its place while the form is on its way. */
export function SubmitButton({ children, busy, form, removes = false }: Props) {
  const waiting = useNavigation().state === "submitting";
  return (
    <button type="submit" form={form} className={removes ? "btn btn-remove" : "btn btn-primary"} disabled={waiting}>
      {waiting ? busy : children}
    </button>
  );
}
