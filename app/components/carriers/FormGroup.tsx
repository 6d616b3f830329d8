import type { ReactNode } from "react";

/** Fields of a form that belong together, under one heading; set like a measured property. */
export function FormGroup({ label, children }: { label: string; children: ReactNode }) {
  return (
    <fieldset className="border-t border-line pt-3">
      <legend className="float-left mb-2 w-full font-semibold">{label}</legend>
      <div className="clear-both">{children}</div>
    </fieldset>
  );
}
