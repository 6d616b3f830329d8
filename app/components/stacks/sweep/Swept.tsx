import { noBreak } from "#app/components/drawings/no-break.ts";
import type { SweptView } from "#app/schemas/stack-sweep.ts";
import { sweepName } from "./sweep-name.ts";
import { SweepDrawn } from "./SweepDrawn.tsx";

const SECTION = "border-t border-ink p-4 tablet:px-6";

/** The answer, where the limits are reached, and the drawing. */
export function Swept({ swept }: { swept: SweptView }) {
  const { summary, crossings, remarks } = swept;
  return (
    <>
      <section className={SECTION} aria-label="What it comes to">
        <h2 className="text-figure font-medium text-pretty">
          {summary.map((sentence) => (
            <span key={sentence} className="block">
              {noBreak(sentence)}{" "}
            </span>
          ))}
        </h2>
        <Sentences of={crossings} className="mt-2" />
        <Sentences of={remarks} className="mt-2 text-quiet" />
      </section>
      <section className={SECTION} aria-labelledby="drawn">
        <h2 id="drawn" className="mb-2 font-semibold">
          {noBreak(sweepName(swept))}
        </h2>
        <SweepDrawn swept={swept} />
      </section>
    </>
  );
}

function Sentences({ of, className }: { of: readonly string[]; className: string }) {
  if (of.length === 0) return null;
  return (
    <ul className={className}>
      {of.map((sentence) => (
        <li key={sentence}>{noBreak(sentence)}</li>
      ))}
    </ul>
  );
}
