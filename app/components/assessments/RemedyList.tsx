import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import type { RemedyView } from "#app/lib/assessment-view.ts";
import { StepLink } from "./StepLink.tsx";

/** More than these are folded away: a flow that fails everywhere has one cause. */
const SHOWN = 5;

/** What would clear each finding that is not clear, worst first. */
export function RemedyList({ remedies }: { remedies: readonly RemedyView[] }) {
  if (remedies.length === 0) return <p className="text-quiet">Nothing to clear: every step is clear as planned.</p>;
  const [shown, folded] = [remedies.slice(0, SHOWN), remedies.slice(SHOWN)];
  return (
    <>
      <Remedies remedies={shown} />
      {folded.length > 0 ? (
        <details>
          <summary className="link w-fit cursor-pointer">{folded.length} more</summary>
          <Remedies remedies={folded} />
        </details>
      ) : null}
    </>
  );
}

function Remedies({ remedies }: { remedies: readonly RemedyView[] }) {
  return (
    <ul>
      {remedies.map(({ text, outcome, steps }) => (
        <li key={text} className="border-t border-line py-2 first:border-t-0">
          <FindingTag outcome={outcome}>
            {steps.map((step) => (
              <StepLink key={step} step={step} className="link mr-1.5">
                step {step}
              </StepLink>
            ))}
          </FindingTag>
          <p className="mt-0.5">{noBreak(text)}</p>
        </li>
      ))}
    </ul>
  );
}
