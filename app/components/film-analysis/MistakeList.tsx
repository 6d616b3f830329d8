import { noBreak } from "#app/components/drawings/no-break.ts";
import { Swatch } from "#app/components/drawings/Swatch.tsx";
import type { MistakeView } from "#app/schemas/film-analysis.ts";

/** What the checks for mistakes say: those that were seen with what to do, those that cannot be told, and the rest folded away. */
export function MistakeList({ mistakes }: { mistakes: MistakeView[] }) {
  const of = (state: MistakeView["state"]) => mistakes.filter((mistake) => mistake.state === state);
  const [seen, open, clear] = [of("seen"), of("cannot tell"), of("not seen")];
  return (
    <section aria-labelledby="mistakes">
      <h2 id="mistakes" className="font-semibold">
        Mistakes looked for
      </h2>
      <p className="text-quiet">
        {mistakes.length} checks: {seen.length === 0 ? "none" : seen.length} seen, {open.length} cannot be told,{" "}
        {clear.length} not seen.
      </p>
      <ul className="mt-1 max-w-240">
        {seen.map((mistake) => (
          <li key={mistake.number} className="flex gap-3 border-t border-line py-2 first:border-0">
            <span className="mt-0.5 w-[22px] flex-none">
              <Swatch level="caution" />
            </span>
            <p>
              <b className="text-caution">{mistake.name}. </b>
              {noBreak(mistake.sentence)} {mistake.where.length > 0 && `Seen in ${mistake.where.join(", ")}. `}
              {mistake.remedy}
            </p>
          </li>
        ))}
      </ul>
      <Folded title={`${open.length} cannot be told`} mistakes={open} />
      <Folded title={`${clear.length} not seen`} mistakes={clear} />
    </section>
  );
}

function Folded({ title, mistakes }: { title: string; mistakes: MistakeView[] }) {
  if (mistakes.length === 0) return null;
  return (
    <details className="mt-1">
      <summary className="link w-fit cursor-pointer">{title}</summary>
      <ul className="mt-1 max-w-240">
        {mistakes.map(({ number, name, sentence, read }) => (
          <li key={number} className="border-t border-line py-2 first:border-0">
            {name}: {noBreak(sentence)} <span className="text-quiet">Looked at {read}.</span>
          </li>
        ))}
      </ul>
    </details>
  );
}
