import type { FilmAddition } from "../flow/model.ts";
import { solderMelting } from "./solder.ts";
import type { StepState } from "../flow/walk.ts";
import { provenance } from "../measured.ts";
import { againstUpperLimit } from "./against-limit.ts";
import { dayOf } from "./calendar.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit } from "./make-finding.ts";
import { micrometres, percent } from "./words.ts";

const TITLE = "Where stresses come from";
const make = findingsOf(13, TITLE);

const DAY = 86400;

/** Mean month, s. */
const MONTH = (365.25 / 12) * DAY;

function faults({ flow, limits }: RuleContext, state: StepState, addition: FilmAddition, at: number): Finding[] {
  const { film, stress, stressRecord: record } = addition;
  const field = `steps[${state.number - 1}].adds[${at}].stressRecord.on`;
  const found: Finding[] = [];
  if (stress.source === "assumed")
    found.push(
      make(state, "caution", `The stress of ${film.name} is assumed.`, {
        remedy: "Measure it on a monitor wafer and accept the result into the film.",
        figures: [{ label: `${film.name}, stress`, value: stress.value, unit: "Pa" }],
      }),
    );
  const on = record?.on ?? stress.on ?? null;
  if (on && flow.assessedOn) {
    const age = DAY * (dayOf("assessedOn", flow.assessedOn) - dayOf(field, on));
    const outcome = againstUpperLimit(age, limits.recordAge.value, 0, "caution");
    if (outcome !== "clear")
      found.push(
        make(state, outcome, `The stress of ${film.name} was measured ${Math.round(age / MONTH)} months ago.`, {
          remedy: "Measure it again.",
          figures: [{ label: "Age of the record", value: age, unit: "s" }],
          limit: siteLimit(limits, "recordAge"),
        }),
      );
  }
  if (record?.state === "after heating")
    found.push(
      make(
        state,
        "caution",
        `The stress of ${film.name} was measured after heating and is used as deposited${film.yieldStress || solderMelting(film) ? ": this metal yields, so the two differ" : ""}.`,
        { remedy: "Use the stress as deposited; what heat does to it is computed." },
      ),
    );
  return [...found, ...thicknessFault(limits, state, addition)];
}

function thicknessFault(limits: RuleContext["limits"], state: StepState, addition: FilmAddition): Finding[] {
  const measured = addition.stressRecord?.filmThickness;
  if (!measured || !(measured > 0)) return [];
  const used = addition.thickness.value;
  const off = Math.abs(used - measured) / measured;
  if (againstUpperLimit(off, limits.recordThickness.value, 0, "caution") === "clear") return [];
  return [
    make(
      state,
      "caution",
      `The stress of ${addition.film.name} was measured at ${micrometres(measured)} and is used at ${micrometres(used)}, ${percent(off)} off: stress changes with thickness.`,
      {
        remedy: "Measure it at the thickness that is used.",
        figures: [{ label: "Film thickness off its record by", value: off, unit: "1" }],
        limit: siteLimit(limits, "recordThickness"),
      },
    ),
  ];
}

function judge(context: RuleContext, state: StepState): Finding[] {
  const { adds } = state.step;
  if (adds.length === 0) return [];
  const found = adds.flatMap((addition, at) => faults(context, state, addition, at));
  if (found.length > 0) return found;
  const sources = adds.map(({ film, stress }) => `${film.name}: ${provenance(stress)}`);
  return [make(state, "clear", `Stress of ${sources.join("; ")}.`)];
}

export const provenanceRule: Rule = {
  number: 13,
  title: TITLE,
  judge,
};

export const aboutProvenance: RuleAbout = {
  asks: "Do the film stresses come from measurements that are recent, in the state in which they are used, and at the thickness at which they are used?",
  limits: ["recordAge", "recordThickness"],
};
