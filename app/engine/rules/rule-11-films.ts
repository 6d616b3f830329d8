import type { FilmInput } from "../flow/model.ts";
import { allFilms } from "../flow/state.ts";
import type { StepState } from "../flow/walk.ts";
import { timesReached } from "../flow/temperature-profile.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { outcomeRank } from "../vocabulary.ts";
import { againstUpperLimit, exceeds, reaches } from "./against-limit.ts";
import type { Finding, Rule, RuleAbout, RuleContext } from "./finding.ts";
import { findingsOf, siteLimit, statedLimit, temperatureFigure } from "./make-finding.ts";
import { firstToMelt, solderMelting } from "./solder.ts";
import { celsius } from "./words.ts";

const TITLE = "Films and heat";
const make = findingsOf(11, TITLE);

/** Films that the step heats, those that it puts down included, each material once. */
function films(state: StepState): FilmInput[] {
  const known = new Map(allFilms(state.after).map(({ addition: { film } }) => [film.id, film]));
  return [...known.values()];
}

/** Whether a film's temperature limit is no more than the melting of its own solder: then it is judged as solder. */
function onlyMelts(film: FilmInput): boolean {
  const melting = solderMelting(film);
  return melting !== null && film.temperatureLimit !== null && !exceeds(film.temperatureLimit.value, melting.value);
}

/** The film nearest its limit, or farthest beyond it. What melts on purpose is judged as solder, not by a limit. */
function temperatureLimits(state: StepState, list: FilmInput[]): Finding[] {
  const peak = state.step.peakTemperature;
  const limited = list
    .flatMap((film) =>
      film.temperatureLimit && !onlyMelts(film) ? [{ name: film.name, temperatureLimit: film.temperatureLimit }] : [],
    )
    .sort((a, b) => a.temperatureLimit.value - b.temperatureLimit.value);
  const [first] = limited;
  if (!first) return [];
  const outcome = againstUpperLimit(peak, first.temperatureLimit.value, 0, "do not run");
  return [
    make(state, outcome, `${celsius(peak)}; ${first.name} takes ${celsius(first.temperatureLimit.value)}.`, {
      remedy: `Lower the peak to less than ${celsius(first.temperatureLimit.value)}, or put the film down after this step.`,
      figures: [temperatureFigure("Peak temperature", peak)],
      limit: statedLimit(`${first.name}, temperature limit`, first.temperatureLimit, "K", true),
    }),
  ];
}

/** Polymers and solders have a limit of their own; the hottest step of each asks for it, once. */
function missingLimits({ steps }: RuleContext, state: StepState, list: FilmInput[]): Finding[] {
  const peak = state.step.peakTemperature;
  const unknown = list.filter(
    (film) =>
      film.temperatureLimit === null && (film.kind === "polymer" || (film.kind === "solder" && !solderMelting(film))),
  );
  return unknown
    .filter((film) => {
      const carrying = steps.filter(({ after }) =>
        allFilms(after).some(({ addition }) => addition.film.id === film.id),
      );
      const hottest = Math.max(...carrying.map(({ step }) => step.peakTemperature));
      return carrying.find(({ step }) => step.peakTemperature === hottest) === state && exceeds(peak, ROOM_TEMPERATURE);
    })
    .map((film) =>
      make(state, "caution", `${celsius(peak)} is the most that ${film.name} sees, and what it takes is not given.`, {
        remedy: `Give the temperature limit of ${film.name}.`,
        figures: [temperatureFigure("Peak temperature", peak)],
      }),
    );
}

/** Steps up to this one at which a solder melts. */
function meltings({ steps }: RuleContext, state: StepState, film: FilmInput, melting: number): StepState[] {
  return steps
    .slice(0, state.number)
    .filter(
      ({ step, after }) =>
        exceeds(step.peakTemperature, melting) && allFilms(after).some(({ addition }) => addition.film.id === film.id),
    );
}

/** Steps that press on the face, or draw molten solder into vacuum. */
const PRESSES = ["bond", "laminate tape", "grind", "polish", "stress relief", "debond", "mount on frame"];

/**
 * A reflow melts solder on purpose; any other step that does so is an error: a caution where nothing touches the melt, else not
 * to be run. Every melting counts.
 */
function solder(context: RuleContext, state: StepState): Finding[] {
  const first = firstToMelt(state.after);
  if (!first) return [];
  const { film, melting } = first;
  const { step } = state;
  const peak = step.peakTemperature;
  const limit = statedLimit(`${film.name}, melting`, melting, "K", true);
  const figures = [temperatureFigure("Peak temperature", peak)];
  const above = `${celsius(peak)} melts ${film.name}, ${celsius(melting.value)}`;
  if (!reaches(peak, melting.value)) {
    if (step.kind !== "reflow") return [];
    return [
      make(state, "do not run", `${celsius(peak)} does not melt ${film.name}, ${celsius(melting.value)}.`, {
        remedy: `Reflow above ${celsius(melting.value)}.`,
        figures,
        limit,
      }),
    ];
  }
  const findings: Finding[] = [];
  if (step.kind === "reflow") findings.push(make(state, "clear", `${above}, on purpose.`, { figures, limit }));
  else {
    const touched = PRESSES.includes(step.kind) || step.exposures.includes("vacuum");
    const beyond = exceeds(peak, melting.value);
    findings.push(
      make(
        state,
        beyond && touched ? "do not run" : "caution",
        `${above}, in a step that is no reflow${beyond && touched ? ", while it is pressed or in vacuum" : ""}.`,
        {
          remedy: `Keep this step below ${celsius(melting.value)}, or do it before the solder is put on.`,
          figures,
          limit,
        },
      ),
    );
  }
  return [...findings, ...counted(context, state, film, melting.value)];
}

function counted(context: RuleContext, state: StepState, film: FilmInput, melting: number): Finding[] {
  const times = meltings(context, state, film, melting);
  if (times.at(-1) !== state) return [];
  const count = times.reduce((sum, { step }) => sum + timesReached(step, melting), 0);
  const most = context.limits.mostReflows.value;
  const outcome = againstUpperLimit(count, most, 0, "do not run");
  if (outcome === "clear") return [];
  return [
    make(state, outcome, `${film.name} melts for the ${ordinal(count)} time; at most ${most} are usual.`, {
      remedy: "Join reflows, or put the solder on later.",
      figures: [{ label: "Times melted", value: count, unit: "1" }],
      limit: siteLimit(context.limits, "mostReflows"),
    }),
  ];
}

const ordinal = (count: number) => ["", "1st", "2nd", "3rd"][count] ?? `${count}th`;

function judge(context: RuleContext, state: StepState): Finding[] {
  if (!exceeds(state.step.peakTemperature, ROOM_TEMPERATURE)) return [];
  const list = films(state);
  if (list.length === 0) return [];
  const found = [...temperatureLimits(state, list), ...missingLimits(context, state, list), ...solder(context, state)];
  return found.sort((a, b) => outcomeRank(b.outcome) - outcomeRank(a.outcome));
}

export const filmsRule: Rule = {
  number: 11,
  title: TITLE,
  judge,
};

export const aboutFilms: RuleAbout = {
  asks: "Does every film stay below its temperature limit, and does solder melt in its reflows only, and not too often? The reflow that forms a ball is no error.",
  limits: ["mostReflows"],
};
