import type { DirectionalLayer } from "../directional/layer.ts";
import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE, type Expansion, type Layer } from "../laminate/layer.ts";
import { meanOfDirections } from "../patterned/mean-of-directions.ts";
import { checkPattern, coverageOf, type FilmPattern } from "../patterned/pattern.ts";
import { edgeReliefOf } from "../patterned/pattern-stiffness.ts";
import { siliconThermalStrain } from "../silicon/expansion.ts";
import type { FilmAddition, FilmInput } from "./model.ts";
import { stackEntry, type StackEntry } from "./stack-entry.ts";

/** Whether a film bends the two directions differently. */
export function isDirectional({ pattern }: FilmAddition): boolean {
  return pattern?.kind === "lines";
}

/**
 * Share of its yield stress that the mean stress of a film reaches when it yields: its edges carry less. Lines are relieved
 * across alone (practical, as `edgeRelief`).
 */
export function yieldShare({ film, thickness, pattern }: FilmAddition): number {
  if (!pattern) return 1;
  const g = edgeReliefOf({ thickness: thickness.value, youngsModulus: film.youngsModulus.value, pattern });
  return pattern.kind === "lines" ? (1 + g) / 2 : g;
}

/** The layer of a film as it came, without what it has flowed since. */
export function filmEntry(addition: FilmAddition): StackEntry {
  const { film, thickness, stress, coverage } = addition;
  const [youngsModulus, poissonsRatio] = [film.youngsModulus.value, film.poissonsRatio.value];
  const blanket = {
    thickness: thickness.value,
    youngsModulus,
    poissonsRatio,
    stress: stress.value,
    cte: filmExpansion(film, stress.value),
  };
  const plain: Layer = { ...blanket, coverage };
  if (!addition.pattern) return stackEntry(plain, film.name);
  const pattern = checkPattern(addition.pattern, `${film.name}.pattern`);
  // Checked before the pattern is worked out, so that a refusal names the film's own number.
  stackEntry({ ...plain, coverage: coverageOf(pattern) }, film.name);
  return patternedEntry(blanket, pattern, film.name);
}

function patternedEntry(blanket: Layer & { stress: number }, pattern: FilmPattern, field: string): StackEntry {
  const made = stackEntry(meanOfDirections(blanket, pattern), field);
  const directional: DirectionalLayer = { ...blanket, pattern };
  return pattern.kind === "lines" ? { ...made, directional } : made;
}

/**
 * A polymer with a zero-stress temperature expands so that its stress on thick silicon falls from that at 25 °C to zero there;
 * any other film by its stated expansion.
 */
function filmExpansion(film: FilmInput, stress: number): Expansion {
  const zero = film.kind === "polymer" ? film.zeroStressTemperature?.value : undefined;
  if (zero === undefined) return film.expansion.value;
  if (!(zero > ROOM_TEMPERATURE))
    throw new EngineInputError(
      `${film.name}.zeroStressTemperature`,
      "must lie above 25\u00A0°C",
      `above ${ROOM_TEMPERATURE} K`,
    );
  const modulus = film.youngsModulus.value / (1 - film.poissonsRatio.value);
  return (siliconThermalStrain(ROOM_TEMPERATURE, zero) + Math.max(0, stress) / modulus) / (zero - ROOM_TEMPERATURE);
}
