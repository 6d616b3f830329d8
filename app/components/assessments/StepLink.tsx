import type { ReactNode } from "react";
import { selectInPlace } from "#app/components/drawings/select-in-place.ts";
import { stepPath } from "#app/lib/step-path.ts";
import { useStepSelection } from "./use-step-selection.ts";

interface Props {
  step: number;
  selected?: boolean;
  className?: string;
  children: ReactNode;
}

/** A link that looks at a step: in place where scripts run, otherwise by loading the page at it. */
export function StepLink({ step, selected, className, children }: Props) {
  const { select, leg } = useStepSelection();
  return (
    <a
      href={stepPath(step, leg)}
      className={className}
      aria-current={selected ? "step" : undefined}
      onClick={selectInPlace(() => select(step))}
    >
      {children}
    </a>
  );
}
