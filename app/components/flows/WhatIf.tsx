import { lazy, Suspense, useState } from "react";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";

/** The engine comes only when it is asked for: it is as large as the rest of the page. */
const WhatIfPane = lazy(() => import("./WhatIfPane.tsx"));

interface Props {
  flowId: string;
  /** version of the flow as the page shows it: a newer one begins the what-if anew */
  version: number;
  mayEdit: boolean;
}

/** The what-if of a flow, folded away until somebody wonders. Nothing in it changes the flow unless it is applied. */
export function WhatIf({ flowId, version, mayEdit }: Props) {
  const [open, setOpen] = useState(false);
  const scripted = useInBrowser();
  return (
    <details className="p-4 tablet:px-6" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="cursor-pointer font-semibold">
        What if
        <span className="ml-2 font-normal text-quiet">
          Try another thickness, temperature, stress, support or bond, and see at once what becomes of the answer.
        </span>
      </summary>
      {!scripted && <p className="mt-2 text-quiet">This part computes in the browser and needs its scripts.</p>}
      {open && (
        <Suspense fallback={<p className="mt-3 text-quiet">Loading the engine</p>}>
          <WhatIfPane key={version} flowId={flowId} mayEdit={mayEdit} />
        </Suspense>
      )}
    </details>
  );
}
