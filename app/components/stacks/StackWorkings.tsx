import { lazy, memo, Suspense, useEffect, useRef, useState, type ReactNode } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { Estimated } from "#app/lib/stack-words.ts";
import { useWorkings, type Workings } from "./use-workings.ts";

// Without scripts the server writes them; with scripts they are drawn for who unfolds them.
const WorkingView = lazy(() =>
  import("#app/components/working/WorkingView.tsx").then((module) => ({ default: module.WorkingView })),
);

interface Props {
  estimated: Estimated;
  /** of the films, in the order of the request */
  names: readonly string[];
}

/** The calculations behind the figures, folded away until asked for: what was typed since is worked out only then. */
export const StackWorkings = memo(function StackWorkings({ estimated, names }: Props) {
  const inBrowser = useInBrowser();
  const [asked, setAsked] = useState(false);
  const section = useRef<HTMLElement>(null);
  useEffect(() => {
    // Unfolded before the scripts were there.
    if (section.current?.querySelector("details[open]")) setAsked(true);
  }, []);
  const { workings, failed } = useWorkings(estimated, asked);
  const fold = (words: string, of: (workings: Workings) => ReactNode) => (
    <details className="mt-1" onToggle={(event) => event.currentTarget.open && setAsked(true)}>
      <summary className="link w-fit cursor-pointer">{words}</summary>
      <div className="mt-2 mb-4">
        {workings && (asked || !inBrowser) ? (
          <Suspense>{of(workings)}</Suspense>
        ) : (
          <p className={failed ? "text-stop" : "text-quiet"} role="status">
            {failed ? "The workings did not load. Save the stack to see them." : "Working it out"}
          </p>
        )}
      </div>
    </details>
  );
  return (
    <section ref={section} className="border-t border-line px-4 py-3 tablet:px-6" aria-labelledby="workings">
      <h3 id="workings" className="font-semibold">
        Workings
      </h3>
      {fold("Bow of the free wafer", ({ shape }) => (
        <WorkingView working={shape} level={4} />
      ))}
      {fold("Bow by Stoney’s formula", ({ stoney }) => (
        <WorkingView working={stoney} level={4} />
      ))}
      {estimated.request.films.length > 0 &&
        fold("Film forces", ({ film_forces }) =>
          film_forces.map((force, index) => (
            <div key={index} className="mt-3 first:mt-0">
              <p className="text-quiet">{names[index]}</p>
              <WorkingView working={force} level={4} />
            </div>
          )),
        )}
    </section>
  );
});
