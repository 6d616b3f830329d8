import { Link } from "react-router";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import type { ShownWorking } from "#app/lib/shown-working.ts";

/** The calculation behind the stress. */
export function ScanWorking({ working }: { working: ShownWorking }) {
  return (
    <section id="working" aria-labelledby="working-title" className="scroll-mt-4">
      <h2 id="working-title" className="font-semibold">
        Working
      </h2>
      <div className="mt-2">
        <WorkingView working={working} />
      </div>
      <p className="mt-1">
        <Link to={`/method#equation-${working.equation}`} className="link">
          Where this relation holds
        </Link>
      </p>
    </section>
  );
}
