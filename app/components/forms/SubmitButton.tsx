import type { ReactNode } from "react";
import { useNavigation } from "react-router";

/** The one filled button of a form. It keeps its place while the form is on its way. */
export function SubmitButton({ children, busy }: { children: ReactNode; busy: string }) {
  const waiting = useNavigation().state === "submitting";
  return (
    <button type="submit" className="btn btn-primary" disabled={waiting}>
      {waiting ? busy : children}
    </button>
  );
}
