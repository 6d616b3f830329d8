import type { BondHandling, Resistances, StepHandling, TapeInput } from "#app/engine/flow/handling-inputs.ts";
import type { StepInput } from "#app/engine/flow/model.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";

type Given<Value> = { [Key in keyof Value]: NonNullable<Value[Key]> };

/** What is given of a record; what is missing is left out, so that an answer does not change when a question is added. */
function given<Value extends object>(record: Value): Partial<Given<Value>> {
  return Object.fromEntries(
    Object.entries(record).filter(([, value]) => value !== null && value !== undefined),
  ) as Partial<Given<Value>>;
}

/** The tape that a step names, what it states of it itself before what the library says; null when it says nothing of any. */
export function tapeOf(handling: StepHandlingValues, chosen: TapeInput | null): TapeInput | null {
  const word = (key: "Vacuum" | "Plasma" | "Solvent" | "Acid" | "Base" | "Ultraviolet") => {
    const stands = handling[`tape${key}`];
    return stands === null ? null : { word: stands };
  };
  const resistances: Resistances = given({
    vacuum: word("Vacuum"),
    plasma: word("Plasma"),
    solvent: word("Solvent"),
    acid: word("Acid"),
    base: word("Base"),
    ultraviolet: word("Ultraviolet"),
  });
  const tape = given({
    temperatureLimit: handling.tapeTemperatureLimit,
    embeddingDepth: handling.tapeEmbeddingDepth,
    thicknessVariation: handling.tapeThicknessVariation,
    longestTime: handling.tapeLongestTime,
    releasesInLight: handling.tapeReleasesInLight,
  });
  const stated = Object.keys(resistances).length > 0;
  if (!chosen && !stated && Object.keys(tape).length === 0 && handling.tapeName === null) return null;
  return {
    ...chosen,
    name: handling.tapeName ?? chosen?.name ?? "the tape",
    ...tape,
    ...(stated && { resistances: { ...chosen?.resistances, ...resistances } }),
  };
}

/** A step's handling as the engine takes it, on the tape of the library that it chose. */
export function stepHandlingOf(handling: StepHandlingValues, tape: TapeInput | null): StepHandling {
  const { exposureTimes, contactFace, contactMeans, bumpHeight, bumpPeelForce } = handling;
  return given({
    exposureTimes: Object.keys(exposureTimes).length > 0 ? exposureTimes : null,
    debondFace: handling.debondFace,
    solvent: handling.solvent,
    dehydrationBake: handling.dehydrationBake,
    contact: contactFace && contactMeans ? { face: contactFace, means: contactMeans } : null,
    tape: tapeOf(handling, tape),
    inLine: handling.inLine,
    timeSincePrevious: handling.timeSincePrevious,
    bumps: bumpHeight ? { height: bumpHeight, ...given({ standsPeelForce: bumpPeelForce }) } : null,
    topography: handling.topography,
    viaProtrusion: handling.viaProtrusion,
    thicknessVariation: handling.thicknessVariation,
  });
}

/** How the step is run: what its form keeps beside the handling, as the engine takes it. */
export function stepRunOf({ profile, sideUp, machine, recipe, slots }: StepHandlingValues): Partial<StepInput> {
  return given({ profile, sideUp, machine, recipe, slots });
}

/** What is given of the bond that a step makes. */
export function bondHandlingOf({ bondFace, bondThicknessVariation }: StepHandlingValues): BondHandling {
  return given({ face: bondFace, thicknessVariation: bondThicknessVariation });
}
