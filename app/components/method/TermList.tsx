import { noBreak } from "#app/components/drawings/no-break.ts";
import { termAnchor } from "#app/lib/method-sections.ts";
import type { Term } from "#app/lib/method-words.ts";

/** Terms with their meanings, each ruled off from the next. */
export function TermList({ terms }: { terms: readonly Term[] }) {
  return (
    <dl>
      {terms.map(({ term, meaning }) => (
        <div
          key={term}
          className="grid gap-x-6 border-t border-line py-2 first:border-0 has-target:bg-wash tablet:grid-cols-[200px_minmax(0,1fr)]"
        >
          <dt id={termAnchor(term)} className="scroll-mt-4 font-semibold">
            {term}
          </dt>
          <dd>{noBreak(meaning)}</dd>
        </div>
      ))}
    </dl>
  );
}
