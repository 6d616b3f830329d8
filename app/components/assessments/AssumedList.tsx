import { noBreak } from "#app/components/drawings/no-break.ts";
import type { AssessmentView } from "#app/lib/assessment-view.ts";
import { StepLink } from "./StepLink.tsx";

type Assumed = AssessmentView["assumed"];

/** What a glance takes in; the rest is folded away. */
const SHOWN = 8;

/** Inputs that nobody measured, each with the step that it comes in at. */
export function AssumedList({ assumed }: { assumed: Assumed }) {
  const rest = assumed.slice(SHOWN);
  return (
    <>
      <Inputs assumed={assumed.slice(0, SHOWN)} />
      {rest.length > 0 && (
        <details className="border-t border-line pt-1.5">
          <summary className="link w-fit cursor-pointer">{rest.length} more</summary>
          <Inputs assumed={rest} />
        </details>
      )}
    </>
  );
}

function Inputs({ assumed }: { assumed: Assumed }) {
  return (
    <ul className="mt-1">
      {assumed.map(({ step, what }) => (
        <li key={what} className="flex gap-3 border-t border-line py-1.5 first:border-t-0">
          <span className="flex-1">{noBreak(what)}</span>
          <StepLink step={step} className="link whitespace-nowrap">
            step {step}
          </StepLink>
        </li>
      ))}
    </ul>
  );
}
