import type { EntityManager } from "@mikro-orm/postgresql";
import { BondingMaterial } from "#app/db/entities/bonding-material.ts";
import { FlowStep } from "#app/db/entities/flow-step.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import type { BondInput, FlowInput } from "#app/engine/flow/model.ts";
import { walkFlow, type StepState } from "#app/engine/flow/walk.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { CalibrationFlow, CalibrationPage } from "#app/lib/calibration-view.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { mayInProgram, mayOnSite, programsWhere } from "#app/policies/permissions.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { flowInputOf } from "../flows/flow-inputs.ts";
import { findFlow, readFlow } from "../flows/read-flow.server.ts";
import { readLimits } from "../limits.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { LIBRARY } from "./kinds.server.ts";

const WHAT = LIBRARY.bondingMaterial.what;

/** A flow whose pairs may calibrate a material: as the engine takes it, to the last step of its pair. */
export interface PairFlow {
  id: string;
  name: string;
  version: number;
  programId: string;
  /** that of every bond of the flow */
  bond: BondInput;
  input: FlowInput;
  /** states after the steps at which the pair has a bow; empty when `fault` says why nothing can be computed */
  states: StepState[];
  fault: string | null;
}

/** The material that an address names. */
export async function findMaterial(em: EntityManager, id: string | undefined): Promise<BondingMaterial> {
  const material = await em.findOne(BondingMaterial, { id: idFrom(id, WHAT) });
  if (!material) throw notFound(WHAT);
  return material;
}

/** Flows of the person's own programs in which every bond is of this material and of one and the same carrier. */
async function flowsOfOnePair(em: EntityManager, scope: ActorScope, materialId: string) {
  const programs = programsWhere(scope.actor, "see the work").map(({ programId }) => programId);
  const flows = await em.find(
    Flow,
    { program: { $in: programs } },
    { populate: ["program"], orderBy: { name: "asc", id: "asc" } },
  );
  const bonds = await em.find(FlowStep, { kind: "bond", flow: { $in: flows.map(({ id }) => id) } });
  return flows.filter(({ id }) => {
    const own = bonds.filter(({ flow }) => flow.id === id);
    const carrier = own[0]?.carrier?.id;
    return (
      carrier !== undefined &&
      own.every((step) => step.bondingMaterial?.id === materialId && step.carrier?.id === carrier)
    );
  });
}

/**
 * The flow that an id names, walked as far as its pair lasts.
 * @throws 404 for one that is not the person's own or whose pairs say nothing of the material
 */
export async function readPairFlow(
  em: EntityManager,
  scope: ActorScope,
  { materialId, flowId }: { materialId: string; flowId: string },
): Promise<PairFlow> {
  const found = await findFlow(em, scope, flowId);
  const usable = await flowsOfOnePair(em, scope, materialId);
  if (!usable.some(({ id }) => id === flowId)) throw notFound("flow with pairs of this material");
  const whole = flowInputOf(await readFlow(em, scope, flowId));
  const bond = whole.steps.find((step) => step.bond)?.bond;
  if (!bond) throw notFound("flow with pairs of this material");
  const known = { id: found.id, name: found.name, version: found.version, programId: found.program.id, bond };
  try {
    const { steps } = walkFlow(whole, await readLimits(em));
    const states = steps.filter(({ after, atRoom }) => after.bonds.length === 1 && atRoom?.rollRadius === null);
    const last = steps.findLast(({ after }) => after.bonds.length > 0)?.number ?? 0;
    return { ...known, input: { ...whole, steps: whole.steps.slice(0, last) }, states, fault: null };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { ...known, input: whole, states: [], fault: `This flow cannot be computed: ${error.reason}.` };
  }
}

/** Text of a bow, in µm with its sign. */
const bowText = (bow: number) => formatQuantity(bow, "length", { unit: "µm", sign: true, decimals: 0 });

function calibrationFlow(scope: ActorScope, flow: PairFlow): CalibrationFlow {
  const { id, name, bond, states, fault } = flow;
  const { carrier } = bond;
  const expansion = carrier.expansion && formatMeasured(carrier.expansion, "expansion", { unit: "ppm/K" });
  return {
    id,
    name,
    carrier: { id: carrier.id, name: carrier.name, expansion },
    steps: states.map(({ number, step, atRoom }) => ({
      number,
      title: step.title,
      bow: bowText(standardBow(atRoom?.sagitta ?? 0)),
    })),
    // A carrier that follows silicon's own curve has no expansion to fit.
    fits: expansion === null ? ["modulus"] : ["both", "modulus", "expansion"],
    fault,
    mayCalibrate: mayInProgram(scope.actor, "run assessments", flow.programId),
  };
}

/** The page of a material's calibration with the flow that the address asks for, or the first. */
export async function calibrationPage(
  scope: ActorScope,
  materialId: string | undefined,
  search: URLSearchParams,
): Promise<CalibrationPage> {
  requireOnSite(scope, "see the library");
  return inScope(scope, async (em) => {
    const material = await findMaterial(em, materialId);
    const flows = await flowsOfOnePair(em, scope, material.id);
    const flowId = (flows.find(({ id }) => id === search.get("flow")) ?? flows[0])?.id;
    const chosen = flowId ? await readPairFlow(em, scope, { materialId: material.id, flowId }) : null;
    return {
      material: {
        id: material.id,
        name: material.name,
        modulus: formatMeasured(material.effectiveModulus, "stress", { unit: "MPa" }),
      },
      flows: flows.map(({ id, name, program }) => ({ value: id, label: `${program.name}: ${name}` })),
      chosen: chosen && calibrationFlow(scope, chosen),
      mayUse: mayOnSite(scope.actor, LIBRARY.bondingMaterial.edit),
    };
  });
}
