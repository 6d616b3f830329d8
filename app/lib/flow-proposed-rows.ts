import { proposeSteps, type ChosenBond, type StackStart } from "./flow-from-stack.ts";
import { stepRows, type StepRow } from "./flow-rows.ts";

/** Stands where the person has yet to choose. */
const UNCHOSEN: ChosenBond = {
  carrier: { id: "", name: "the carrier chosen above" },
  material: {
    id: "",
    name: "the bonding material chosen above",
    bondTemperature: 298.15,
    releaseTemperature: 298.15,
    leastThickness: 1e-6,
    mostThickness: 1e-6,
  },
};

/** The steps proposed for a stack as rows of the step table; what depends on a bond not yet chosen says so. */
export function proposedRows(start: StackStart): StepRow[] {
  const { bond } = start;
  const { carrier, material } = bond ?? UNCHOSEN;
  const steps = proposeSteps({ ...start, bond: bond ?? UNCHOSEN });
  const named = (list: { id: string; name: string }[], id: string | null) =>
    list.find((each) => each.id === id) ?? null;
  const rows = stepRows(
    steps.map((step, index) => ({
      ...step,
      id: String(index),
      equipment: named(start.tools, step.equipment),
      carrier: step.carrier === null ? null : carrier,
      bondingMaterial: step.bondingMaterial === null ? null : material,
      bondThickness: bond ? step.bondThickness : null,
      films: step.films.map(({ film, coverage, ...change }) => ({
        ...change,
        film: named(start.films, film) ?? { name: film },
        coverage: coverage ?? 1,
      })),
    })),
    start.incoming,
  );
  if (bond) return rows;
  return rows.map((row) => (row.kind === "bond" || row.kind === "debond" ? { ...row, peak: "as chosen" } : row));
}
