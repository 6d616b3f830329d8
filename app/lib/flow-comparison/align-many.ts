import { alignSteps } from "../align.ts";

/** A place of several flows: the step that each has there, null where it has none. */
export interface AlignedSteps<Step> {
  kind: string;
  title: string;
  steps: (Step | null)[];
}

/**
 * The steps of several flows as one list: each flow in turn is paired with what is there of those before it, by kind and title, then by
 * kind alone. A place has the title of the first flow that has it.
 */
export function alignMany<Step extends { kind: string; title: string }>(
  flows: readonly (readonly Step[])[],
): AlignedSteps<Step>[] {
  return flows.reduce<AlignedSteps<Step>[]>(
    (places, steps, column) =>
      alignSteps<Pick<AlignedSteps<Step>, "kind" | "title"> & { place?: AlignedSteps<Step>; step?: Step }>(
        places.map((place) => ({ kind: place.kind, title: place.title, place })),
        steps.map((step) => ({ kind: step.kind, title: step.title, step })),
      ).map(({ before, after }) => {
        const { kind, title } = before ?? after;
        const others = before?.place?.steps ?? Array.from({ length: column }, () => null);
        return { kind, title, steps: [...others, after?.step ?? null] };
      }),
    [],
  );
}
