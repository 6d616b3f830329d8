import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { ReferenceReading } from "#app/db/entities/reference-reading.ts";
import { ReferenceWafer } from "#app/db/entities/reference-wafer.ts";
import type { ReferenceReadingValues, ReferenceWaferView } from "#app/schemas/instrument.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { referenceWaferView } from "./get-instrument.server.ts";
import { instrumentOf } from "./instrument-of.server.ts";

/** The site's wafers of known bow, by name, and the instrument that one is read on. */
export async function referenceForm(
  scope: ActorScope,
  instrument: string | undefined,
): Promise<{ instrument: { id: string; name: string }; wafers: ReferenceWaferView[] }> {
  requireOnSite(scope, "check instruments");
  return inScope(scope, async (em) => {
    const { id, name } = await instrumentOf(em, instrument);
    const wafers = await em.findAll(ReferenceWafer, { orderBy: { name: "asc" } });
    return { instrument: { id, name }, wafers: wafers.map(referenceWaferView) };
  });
}

export type ReadingAdded = { outcome: "stored" } | { outcome: "refused"; field: "wafer" | "newName"; reason: string };

const TAKEN =
  "There is already a reference wafer of that name. Choose it above, or give the new certificate a name of its own.";

/**
 * Keeps a reading of a wafer of known bow; a wafer that is new is kept with it.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function addReferenceReading(
  scope: ActorScope,
  instrument: string | undefined,
  values: ReferenceReadingValues,
): Promise<ReadingAdded> {
  requireOnSite(scope, "check instruments");
  try {
    return await inScope(scope, async (em): Promise<ReadingAdded> => {
      const record = await instrumentOf(em, instrument);
      const wafer = await waferOf(em, scope, values);
      if (typeof wafer === "string")
        return { outcome: "refused", field: values.wafer ? "wafer" : "newName", reason: wafer };
      em.create(ReferenceReading, {
        id: randomUUID(),
        profile: record.id,
        instrument: record.name,
        wafer,
        measuredOn: values.measuredOn,
        bow: values.bow,
        note: values.note,
        setAside: null,
        createdAt: new Date(),
        createdBy: scope.actor.id,
      });
      await em.flush();
      return { outcome: "stored" };
    });
  } catch (error) {
    // Somebody else has just taken the name.
    if (error instanceof UniqueConstraintViolationException)
      return { outcome: "refused", field: "newName", reason: TAKEN };
    throw error;
  }
}

/** The wafer that was chosen, or a new one; a sentence when there is none to be had. */
async function waferOf(
  em: EntityManager,
  scope: ActorScope,
  { wafer, newName, knownBow, knownUncertainty, diameter, certificate }: ReferenceReadingValues,
): Promise<ReferenceWafer | string> {
  if (wafer !== null)
    return (await em.findOne(ReferenceWafer, { id: wafer })) ?? "That wafer is not there. Choose one from the list.";
  if (!newName || knownBow === null || knownUncertainty === null || diameter === null)
    throw new Error("the schema asks for a new wafer's certificate");
  if (await em.findOne(ReferenceWafer, { name: newName })) return TAKEN;
  return em.create(ReferenceWafer, {
    id: randomUUID(),
    name: newName,
    bow: knownBow,
    // A certificate states k = 2.
    bowUncertainty: knownUncertainty / 2,
    diameter,
    note: certificate,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
}
