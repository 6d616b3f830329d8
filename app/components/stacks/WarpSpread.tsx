import { memo, useState, type KeyboardEvent } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { RunProgress } from "#app/components/ui/RunProgress.tsx";
import { TextField } from "#app/components/ui/TextField.tsx";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { stackOf } from "#app/lib/stack-of-request.ts";
import { spreadSentences, type Estimated } from "#app/lib/stack-words.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { useWarpSampling } from "./use-warp-sampling.ts";
import { Understood } from "#app/components/units/Understood.tsx";

const FIRST_LIMIT = "400 µm";

/** How many wafers with this stack would exceed a warp, by drawing wafers within the tolerances given. */
export const WarpSpread = memo(function WarpSpread({ estimated: { request, answer } }: { estimated: Estimated }) {
  const [typed, setTyped] = useState(FIRST_LIMIT);
  const { state, key: asked, start, stop } = useWarpSampling();
  const limit = readQuantity(typed, RULES.warpLimit);
  const key = JSON.stringify([request, typed]);
  const why = whyNot(answer.shape);
  const ask = () => {
    if (limit.ok) start({ stack: stackOf(request), limit: limit.value }, key);
  };
  // Enter would save the stack.
  const onEnter = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key !== "Enter") return;
    event.preventDefault();
    ask();
  };
  if (why !== null) return <p className="text-quiet">{why}</p>;
  return (
    <>
      <div className="mt-1 flex flex-wrap items-start gap-3">
        <TextField
          name="spread-limit"
          label="Largest warp"
          className="w-36"
          value={typed}
          hint={limit.ok ? <Understood text={limit.understood} dimension="length" /> : undefined}
          error={limit.ok ? undefined : limit.message}
          autoComplete="off"
          onChange={(event) => setTyped(event.currentTarget.value)}
          onKeyDown={onEnter}
        />
        {state.kind === "running" ? (
          <button type="button" className="btn mt-5" onClick={stop}>
            Stop
          </button>
        ) : (
          <button type="button" className="btn mt-5" onClick={ask} disabled={!limit.ok}>
            Draw wafers
          </button>
        )}
        {state.kind === "running" && (
          <div className="mt-6">
            <RunProgress done={state.done} of={state.of} label="Wafers drawn" />
          </div>
        )}
      </div>
      <div aria-live="polite">
        {state.kind === "failed" && <p className="mt-1 text-stop">{state.why}</p>}
        {state.kind === "done" && (
          <p className={`mt-1 ${asked === key ? "" : "text-quiet"}`}>
            {asked !== key && "Of the stack before the last change: "}
            {spreadSentences(state.found).map((sentence) => (
              <span key={sentence} className="block">
                {noBreak(sentence)}
              </span>
            ))}
          </p>
        )}
      </div>
    </>
  );
});

/** Why there is nothing to draw, or null. */
function whyNot({ regime, warp_standard_uncertainty_m }: Estimated["answer"]["shape"]): string | null {
  if (regime === "curled") return "Free, it curls: it has an edge lift, and no warp that a tool could take.";
  if (warp_standard_uncertainty_m === null)
    return "Give the silicon or a film a tolerance, and the spread of the warp over wafers can be worked out.";
  return null;
}
