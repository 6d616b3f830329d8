import { FILM_KINDS } from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import { needsCarrier, type ChosenBond, type StackStart } from "#app/lib/flow-from-stack.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { allOfLibrary } from "../library/library.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { getStack } from "../stacks.server.ts";

/** A stack as the start of a flow, with what is chosen for it. */
export interface StartFromStack {
  stack: { id: string; name: string };
  program: { id: string; name: string };
  siliconId: string;
  /** the silicon as it is bought */
  incoming: Measured;
  start: StackStart;
  needsCarrier: boolean;
  /** what of a bond is still to be chosen */
  missing: { carrier: boolean; bondingMaterial: boolean };
}

/**
 * What a flow needs to know of the stack that it starts from. `incoming` replaces the thickness at which its silicon is bought;
 * `chosen` names the carrier and bonding material, which count only when both are known.
 */
export async function startFromStack(
  scope: ActorScope,
  stackId: string,
  chosen: { incoming?: Measured; carrier?: string | null; bondingMaterial?: string | null } = {},
): Promise<StartFromStack> {
  const stack = await getStack(scope, stackId);
  requireInProgram(scope, "edit stacks and flows", stack.program.id, "stack");
  const [tools, wafers, carriers, materials] = await Promise.all([
    allOfLibrary(scope, "equipment"),
    allOfLibrary(scope, "silicon"),
    allOfLibrary(scope, "carrier"),
    allOfLibrary(scope, "bondingMaterial"),
  ]);
  const bought = wafers.find(({ id }) => id === stack.silicon.id)?.thickness ?? stack.siliconThickness;
  const carrier = carriers.find(({ id }) => id === chosen.carrier);
  const material = materials.find(({ id }) => id === chosen.bondingMaterial);
  const bond: ChosenBond | null =
    carrier && material
      ? {
          carrier: { id: carrier.id, name: carrier.name },
          material: {
            id: material.id,
            name: material.name,
            bondTemperature: material.bondTemperature.value,
            releaseTemperature: material.releaseTemperature.value,
            leastThickness: material.leastThickness,
            mostThickness: material.mostThickness,
          },
        }
      : null;
  const start: StackStart = {
    diameter: stack.silicon.diameter,
    incoming: chosen.incoming ?? bought,
    target: stack.siliconThickness,
    films: stack.layers.map((layer) => ({
      side: layer.side,
      id: layer.filmId,
      name: layer.filmName,
      kind: FILM_KINDS.find((kind) => kind === layer.filmKind) ?? "inorganic",
      thickness: layer.thickness,
      stress: layer.ownStress,
      coverage: layer.coverage,
      lines: layer.lines,
    })),
    tools: tools.map(({ id, name }) => ({ id, name })),
    bond,
  };
  return {
    stack: { id: stack.id, name: stack.name },
    program: stack.program,
    siliconId: stack.silicon.id,
    incoming: bought,
    start,
    needsCarrier: needsCarrier(start),
    missing: { carrier: !carrier, bondingMaterial: !material },
  };
}
