import { useEffect, useMemo, useState } from "react";
import type { Estimated } from "#app/lib/stack-words.ts";
import type { EstimateAnswer, EstimateRequest } from "#app/schemas/estimate.ts";

export type Workings = NonNullable<EstimateAnswer["working"]>;

type Maker = (request: EstimateRequest) => Workings;

/**
 * The workings of an estimate: those that came with it, else made here once `asked`. What makes them, with all equations and the
 * bibliography, loads only then.
 */
export function useWorkings({ request, answer }: Estimated, asked: boolean) {
  const { working: served } = answer;
  const [maker, setMaker] = useState<{ make: Maker } | null>(null);
  const [failed, setFailed] = useState(false);
  const load = asked && !served && !maker;
  useEffect(() => {
    if (!load) return;
    import("#app/lib/estimate-workings.ts").then(
      ({ workingsOfRequest }) => setMaker({ make: workingsOfRequest }),
      () => setFailed(true),
    );
  }, [load]);
  const made = useMemo(() => (asked && !served && maker ? maker.make(request) : null), [asked, served, maker, request]);
  return { workings: served ?? made, failed: failed && !maker };
}
