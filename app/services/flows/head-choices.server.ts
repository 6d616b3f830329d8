import { formatQuantity } from "#app/engine/units/format.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { allOfLibrary } from "../library/library.server.ts";

/** What the head of a flow offers: programs in which the person may edit, and the silicon of the site. */
export async function headChoices(scope: ActorScope) {
  const wafers = await allOfLibrary(scope, "silicon");
  return {
    programs: programsWhere(scope.actor, "edit stacks and flows").map(({ programId, programName }) => ({
      value: programId,
      label: programName,
    })),
    silicon: wafers.map(({ id, name, diameter }) => {
      const size = formatQuantity(diameter, "length", { unit: "mm" });
      return { value: id, label: name.includes(size.replace("\u00A0", " ")) ? name : `${name}, ${size}` };
    }),
  };
}
