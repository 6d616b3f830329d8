import { useId, useState, useSyncExternalStore, type KeyboardEvent } from "react";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { TextField } from "#app/components/ui/TextField.tsx";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { readQuantity } from "#app/lib/read-quantity.ts";
import { stackOf } from "#app/lib/stack-of-request.ts";
import { spreadSentences, type Estimated } from "#app/lib/stack-words.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { useWarpSampling } from "./use-warp-sampling.ts";

const FIRST_LIMIT = "400 µm";

const never = () => () => undefined;
/** Whether scripts run: the worker needs them, and what cannot work is not shown. */
const useScripts = () =>
  useSyncExternalStore(
    never,
    () => true,
    () => false,
  );

/** How many wafers with this stack would exceed a warp, by drawing wafers within the tolerances given. */
export function WarpSpread({ estimated: { request, answer } }: { estimated: Estimated }) {
  const scripts = useScripts();
  const id = useId();
  const [typed, setTyped] = useState(FIRST_LIMIT);
  const { state, start, stop } = useWarpSampling();
  if (!scripts) return null;
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
  return (
    <section className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby={id}>
      <h3 id={id} className="font-semibold">
        Wafers beyond a warp
      </h3>
      {why !== null ? (
        <p className="text-quiet">{why}</p>
      ) : (
        <>
          <div className="mt-1 flex flex-wrap items-start gap-3">
            <TextField
              name="spread-limit"
              label="Largest warp"
              className="w-36"
              value={typed}
              hint={limit.ok ? limit.understood : undefined}
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
              <p className="mt-6 flex items-center gap-2 text-quiet">
                <progress className="w-32" value={state.done} max={state.of} aria-label="Wafers drawn" />
                {formatNumber(state.done, { decimals: 0 })} of {formatNumber(state.of, { decimals: 0 })}
              </p>
            )}
          </div>
          <div aria-live="polite">
            {state.kind === "failed" && <p className="mt-1 text-stop">{state.why}</p>}
            {state.kind === "done" && (
              <p className={`mt-1 ${state.key === key ? "" : "text-quiet"}`}>
                {state.key !== key && "Of the stack before the last change: "}
                {spreadSentences(state.spread).map((sentence) => (
                  <span key={sentence} className="block">
                    {noBreak(sentence)}
                  </span>
                ))}
              </p>
            )}
          </div>
        </>
      )}
    </section>
  );
}

/** Why there is nothing to draw, or null. */
function whyNot({ regime, warp_standard_uncertainty_m }: Estimated["answer"]["shape"]): string | null {
  if (regime === "curled") return "Free, it curls: it has an edge lift, and no warp that a tool could take.";
  if (warp_standard_uncertainty_m === null)
    return "Give the silicon or a film a tolerance, and the spread of the warp over wafers can be worked out.";
  return null;
}
