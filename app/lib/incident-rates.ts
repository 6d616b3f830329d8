import { binomialInterval, type ShareInterval } from "#app/engine/index.ts";
import { SUPPORT_CLASSES, type SupportClass } from "#app/engine/vocabulary.ts";

/** One lot at one step of one assessment: what the step was, and how many wafers went through it. SI. */
export interface StepPassed {
  stepKind: string;
  support: SupportClass;
  silicon: number;
  films: string;
  /** null where nobody counted */
  through: number | null;
  incidents: number;
  affected: number;
  broken: number;
}

/** Upper ends of the bands of silicon thickness, m; our own division. */
const BANDS = [30e-6, 60e-6, 120e-6, 300e-6] as const;

export const THICKNESS_BANDS = ["up to 30 µm", "30 to 60 µm", "60 to 120 µm", "120 to 300 µm", "over 300 µm"] as const;
export type ThicknessBand = (typeof THICKNESS_BANDS)[number];

/** The band that a thickness is in; its upper end belongs to it. */
export function bandOf(silicon: number): ThicknessBand {
  const index = BANDS.findIndex((end) => silicon <= end);
  return THICKNESS_BANDS[index] ?? "over 300 µm";
}

/** What happened to wafers of a group of steps. */
export interface RateRow {
  name: string;
  incidents: number;
  affected: number;
  broken: number;
  /** wafers of those lots and steps of which somebody counted how many went through, and those of them that broke */
  through: number;
  brokenOfThrough: number;
  /** incidents at steps of which nobody counted the wafers: they are in no rate */
  uncounted: number;
  /** broken or scrapped per wafer that went through; null where nothing was counted */
  rate: ShareInterval | null;
}

export interface IncidentRates {
  all: RateRow;
  byStep: RateRow[];
  bySupport: RateRow[];
  byThickness: RateRow[];
  byFilms: RateRow[];
  /** thickness bands down, support classes across; only those that anything is known of */
  map: { supports: SupportClass[]; rows: { band: ThicknessBand; cells: (RateRow | null)[] }[] };
}

/** Counts and rates by what steps have in common, the most wafers broken first; bands and classes in their own order. */
export function incidentRates(passed: readonly StepPassed[]): IncidentRates {
  const supports = SUPPORT_CLASSES.filter((support) => passed.some((each) => each.support === support));
  const bands = THICKNESS_BANDS.filter((band) => passed.some(({ silicon }) => bandOf(silicon) === band));
  const inOrder = (names: readonly string[], of: (each: StepPassed) => string) =>
    names.map((name) =>
      rateRow(
        name,
        passed.filter((each) => of(each) === name),
      ),
    );
  return {
    all: rateRow("All", passed),
    byStep: grouped(passed, ({ stepKind }) => stepKind),
    bySupport: inOrder(supports, ({ support }) => support),
    byThickness: inOrder(bands, ({ silicon }) => bandOf(silicon)),
    byFilms: grouped(passed, ({ films }) => films),
    map: {
      supports,
      rows: bands.map((band) => ({
        band,
        cells: supports.map((support) => {
          const here = passed.filter((each) => each.support === support && bandOf(each.silicon) === band);
          return here.length > 0 ? rateRow(`${support}, ${band}`, here) : null;
        }),
      })),
    },
  };
}

function grouped(passed: readonly StepPassed[], of: (each: StepPassed) => string): RateRow[] {
  return [...groupBy(passed, of)]
    .map(([name, steps]) => rateRow(name, steps))
    .toSorted((a, b) => b.broken - a.broken || b.incidents - a.incidents || a.name.localeCompare(b.name));
}

function groupBy<Item>(items: readonly Item[], of: (item: Item) => string): Map<string, Item[]> {
  const groups = new Map<string, Item[]>();
  for (const item of items) {
    const group = groups.get(of(item));
    if (group) group.push(item);
    else groups.set(of(item), [item]);
  }
  return groups;
}

const sum = (steps: readonly StepPassed[], of: (step: StepPassed) => number) =>
  steps.reduce((total, step) => total + of(step), 0);

/** A row of counts with its rate. */
export function rateRow(name: string, steps: readonly StepPassed[]): RateRow {
  const counted = steps.filter(({ through }) => through !== null && through > 0);
  // A wafer that breaks twice at a step, or a count that is too low, must not make more than all.
  const brokenOfThrough = sum(counted, ({ broken, through }) => Math.min(broken, through ?? 0));
  const through = sum(counted, (step) => step.through ?? 0);
  return {
    name,
    incidents: sum(steps, ({ incidents }) => incidents),
    affected: sum(steps, ({ affected }) => affected),
    broken: sum(steps, ({ broken }) => broken),
    through,
    brokenOfThrough,
    uncounted: sum(
      steps.filter((step) => !counted.includes(step)),
      ({ incidents }) => incidents,
    ),
    rate: through > 0 ? binomialInterval(brokenOfThrough, through) : null,
  };
}
