import { WorkingView } from "#app/components/working/WorkingView.tsx";
import type { FilmAnalysis } from "#app/schemas/film-analysis.ts";

/** The calculations behind the figures, each folded under what it belongs to. */
export function AnalysisWorkings({ workings }: Pick<FilmAnalysis, "workings">) {
  const names = [...new Set(workings.map(({ of }) => of))];
  return (
    <section id="workings" aria-labelledby="workings-title" className="scroll-mt-4">
      <h2 id="workings-title" className="font-semibold">
        Workings
      </h2>
      {names.map((name) => (
        <details key={name} className="border-t border-line py-2 first:border-0">
          <summary className="link w-fit cursor-pointer">{name}</summary>
          <div className="mt-2 space-y-6">
            {workings
              .filter(({ of }) => of === name)
              .map(({ working }, n) => (
                <WorkingView key={n} working={working} />
              ))}
          </div>
        </details>
      ))}
    </section>
  );
}
