import { WorkingView } from "#app/components/working/WorkingView.tsx";
import type { EstimateAnswer } from "#app/schemas/estimate.ts";

/** The calculations behind the figures, folded away until asked for. */
export function StackWorkings({ working, names }: { working: EstimateAnswer["working"]; names: readonly string[] }) {
  if (!working) return null;
  return (
    <section className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby="workings">
      <h3 id="workings" className="font-semibold">
        Workings
      </h3>
      <Folded words="Bow of the free wafer">
        <WorkingView working={working.shape} level={4} />
      </Folded>
      <Folded words="Bow by Stoney’s formula">
        <WorkingView working={working.stoney} level={4} />
      </Folded>
      {working.film_forces.length > 0 && (
        <Folded words="Film forces">
          {working.film_forces.map((force, index) => (
            <div key={index} className="mt-3 first:mt-0">
              <p className="text-quiet">{names[index]}</p>
              <WorkingView working={force} level={4} />
            </div>
          ))}
        </Folded>
      )}
    </section>
  );
}

function Folded({ words, children }: { words: string; children: React.ReactNode }) {
  return (
    <details className="mt-1">
      <summary className="link w-fit cursor-pointer">{words}</summary>
      <div className="mt-2 mb-4">{children}</div>
    </details>
  );
}
