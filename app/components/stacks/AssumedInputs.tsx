import { memo } from "react";
import { Link } from "react-router";
import type { StackDraft } from "#app/lib/stack-draft.ts";

interface Assumed {
  what: string;
  filmId?: string;
}

/** What nobody measured or stated: assumed values stay visible wherever figures rest on them. */
export const AssumedInputs = memo(function AssumedInputs({ draft }: { draft: StackDraft }) {
  const inputs = assumedInputs(draft);
  if (inputs.length === 0) return null;
  return (
    <section className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby="assumed">
      <h3 id="assumed" className="font-semibold text-caution">
        {inputs.length === 1 ? "One input is assumed" : `${inputs.length} inputs are assumed`}
      </h3>
      <ul className="mt-1">
        {inputs.map(({ what, filmId }, index) => (
          <li key={index} className="flex flex-wrap justify-between gap-x-4">
            <span>{what}</span>
            {filmId !== undefined && (
              <Link to={`/films/${filmId}`} className="link">
                Open the film
              </Link>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
});

function assumedInputs({ thickness, thicknessSource, layers }: StackDraft): Assumed[] {
  const silicon = thickness !== null && thicknessSource === "assumed" ? [{ what: "Remaining silicon" }] : [];
  const films = layers.flatMap(({ name, film, stress, thickness: filmThickness, thicknessSource: source }) => [
    ...(film && stress?.source === "assumed" ? [{ what: `Stress of ${name}`, filmId: film.id }] : []),
    ...(film && filmThickness !== null && source === "assumed" ? [{ what: `Thickness of ${name}` }] : []),
  ]);
  return [...silicon, ...films];
}
