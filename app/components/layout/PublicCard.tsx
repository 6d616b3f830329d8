import type { ReactNode } from "react";
import { Mark } from "#app/components/drawings/Mark.tsx";

/** A page of one answer that needs nobody to be signed in. */
export function PublicCard({ children }: { children: ReactNode }) {
  return (
    <main id="main" className="mx-auto max-w-160 p-4 tablet:p-6">
      <div className="frame">
        <p className="flex items-center gap-2 border-b border-ink px-6 py-3 text-lead font-semibold">
          <Mark /> Planeward
        </p>
        {children}
      </div>
    </main>
  );
}
