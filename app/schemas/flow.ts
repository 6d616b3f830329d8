import { z } from "zod";
import { WAFER_KINDS } from "#app/engine/flow/handling-inputs.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { profileHeat } from "#app/engine/flow/temperature-profile.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import { EXPOSURES, HOLDINGS, type Side } from "#app/engine/vocabulary.ts";
import { exposureKey } from "#app/lib/exposure-key.ts";
import { inputsOf, KIND_FIELDS } from "#app/lib/flow-step-kinds.ts";
import { blankMessage } from "#app/lib/read-quantity.ts";
import { checkFilmCut, filmCutFields, linesOf } from "./film-cut.ts";
import { measured, optionalMeasured, optionalQuantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";
import { identifier, stepHandling, type StepHandlingValues } from "./step-handling.ts";

const SPREAD = "The tolerance is as large as the thickness itself.";

/** A thickness whose tolerance reaches zero says that there may be none of it. */
const reachesZero = (thickness: Measured | null | undefined) =>
  typeof thickness?.tolerance === "number" && thickness.tolerance >= thickness.value;

const flowFields = {
  ...recordFields,
  program: z.uuid("Choose a program."),
  silicon: z.uuid("Choose the silicon."),
  incomingThickness: measured({ ...RULES.siliconThickness, source: "supplier" }),
  incomingBowAlong: optionalMeasured({ ...RULES.bow, label: "bow along the notch", source: "measured here" }),
  incomingBowAcross: optionalMeasured({ ...RULES.bow, label: "bow across it", source: "measured here" }),
  incomingFilmShare: optionalMeasured({ ...RULES.share, label: "share that films cause", source: "assumed" }),
  waferKind: z
    .enum(WAFER_KINDS, "Choose what stands in the flow.")
    .optional()
    .transform((kind) => kind ?? "silicon wafer"),
  gateBow: optionalMeasured({ ...RULES.bow, label: "accepted bow", source: "supplier" }),
  gateWarp: optionalMeasured({ ...RULES.warp, label: "accepted warp", source: "supplier" }),
};

interface Incoming {
  incomingThickness: Measured;
  incomingBowAlong: Measured | null;
  incomingBowAcross: Measured | null;
  incomingFilmShare: Measured | null;
}

function checkIncoming(flow: Incoming, context: z.core.$RefinementCtx): void {
  const { incomingBowAlong: along, incomingBowAcross: across } = flow;
  const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
  if (reachesZero(flow.incomingThickness)) fail(["incomingThickness", "tolerance"], SPREAD);
  if (along && !across)
    fail(["incomingBowAcross", "value"], "Type the bow across as well: the same again where both are alike.");
  if (across && !along)
    fail(["incomingBowAlong", "value"], "Type the bow along the notch as well: the same again where both are alike.");
  if (flow.incomingFilmShare && !along && !across)
    fail(["incomingBowAlong", "value"], "Type the bow that this is a share of, or clear the share.");
}

/** The head of a flow. */
export const flowSchema = z.object(flowFields).superRefine(checkIncoming);
export type FlowValues = z.output<typeof flowSchema>;

/** A new flow, which may start from a template, from another flow, or from the steps proposed for a stack. */
export const newFlowSchema = z
  .object({
    ...flowFields,
    stack: identifier,
    template: identifier,
    flow: identifier,
    carrier: identifier,
    bondingMaterial: identifier,
  })
  .superRefine(checkIncoming);
export type NewFlowValues = z.output<typeof newFlowSchema>;

/** Name and note of a flow template. */
export const templateNameSchema = z.object(recordFields);

/** A film that a step adds or takes off. */
interface FilmChange {
  change: "adds" | "removes";
  side: Side;
  film: string;
  thickness: Measured | null;
  stress: Measured | null;
  coverage: number | null;
  /** absent in plans of before lines could be typed: none */
  lines?: FilmLines | null;
}

const filmChange = z
  .object({
    change: z.enum(["adds", "removes"], "Choose whether the step adds or removes it."),
    side: z.enum(["front", "back"], "Choose the side."),
    film: z.uuid("Choose a film."),
    thickness: optionalMeasured({ ...RULES.filmThickness, source: "assumed" }),
    stress: optionalMeasured({ ...RULES.stress, source: "assumed" }),
    ...filmCutFields,
  })
  .superRefine((typed, context) => {
    if (typed.change === "adds")
      checkFilmCut(typed, (path, message) => context.addIssue({ code: "custom", path, message }));
  })
  .transform(({ cut, lineWidth, lineDirection, ...film }): FilmChange => ({
    ...film,
    lines: linesOf({ cut, lineWidth, lineDirection }),
  }));

const PEAK = { ...RULES.temperature, label: "peak temperature" };

/** Fields of a step, each by itself. */
const stepFields = z.object({
  title: z.string("Say what is done.").trim().min(1, "Say what is done.").max(120, "Keep it under 120 characters."),
  kind: z.enum(STEP_KINDS, "Choose the kind of step."),
  /** K; with a profile it follows from that */
  peakTemperature: optionalQuantity(PEAK),
  holdTime: optionalQuantity(RULES.holdTime),
  equipment: identifier,
  exposures: z
    .array(z.enum(EXPOSURES))
    .optional()
    .transform((list) => list ?? []),
  planned: z.enum(HOLDINGS, "Choose what holds the wafer."),
  siliconAfter: optionalMeasured({ ...RULES.siliconThickness, label: "silicon after the step", source: "assumed" }),
  trimWidth: optionalMeasured({ ...RULES.trimWidth, source: "assumed" }),
  trimDepth: optionalMeasured({ ...RULES.trimDepth, source: "assumed" }),
  carrier: identifier,
  bondingMaterial: identifier,
  bondThickness: optionalMeasured({ ...RULES.bondThickness, source: "assumed" }),
  groundFaceForce: optionalMeasured({ ...RULES.faceForce, source: "assumed" }),
  tape: identifier,
  films: z
    .array(filmChange)
    .max(20, "A step changes at most 20 films.")
    .optional()
    .transform((list) => list ?? []),
  handling: stepHandling.prefault({}),
});
type StepFields = z.output<typeof stepFields>;
/** A step as it is kept. */
export type StepValues = Omit<StepFields, "peakTemperature"> & { peakTemperature: number };

/** A step some of whose fields may not have been understood. */
type Partly<Values> = { [Field in keyof Values]?: Values[Field] | undefined };
type Fail = (path: (string | number)[], message: string) => void;

/** What the kind of step asks for, and what it has no use for: that must not lie in wait unseen. */
function checkKind(step: Partly<StepFields>, fail: Fail): void {
  if (!step.kind) return;
  const has = inputsOf(step.kind);
  if (has.bond) {
    if (!step.carrier) fail(["carrier"], "Choose the carrier that it is bonded to.");
    if (!step.bondingMaterial) fail(["bondingMaterial"], "Choose the bonding material.");
    if (!step.bondThickness) fail(["bondThickness", "value"], "Type the thickness of the bond.");
  } else {
    const only = "Only a bond has it: leave it blank, or choose the kind ‘bond’.";
    if (step.carrier) fail(["carrier"], only);
    if (step.bondingMaterial) fail(["bondingMaterial"], only);
    if (step.bondThickness) fail(["bondThickness", "value"], only);
  }
  if (has.trim) {
    if (!step.trimWidth) fail(["trimWidth", "value"], "Type how wide the trim is.");
    if (!step.trimDepth) fail(["trimDepth", "value"], "Type how deep the trim goes.");
  } else {
    const only = "Only an edge trim has it: leave it blank, or choose the kind ‘edge trim’.";
    if (step.trimWidth) fail(["trimWidth", "value"], only);
    if (step.trimDepth) fail(["trimDepth", "value"], only);
  }
  if (!has.tape && step.tape) fail(["tape"], "Only a step that puts it on tape has it: leave it blank.");
  if (!has.groundFace && step.groundFaceForce)
    fail(["groundFaceForce", "value"], "Only a grind, stress relief, polish or via reveal changes it: leave it blank.");
  if (step.kind === "grind" && !step.siliconAfter)
    fail(["siliconAfter", "value"], "Type the silicon that remains after the grind.");
}

/** What is given for handling must have something to belong to. */
function checkHandling(handling: StepHandlingValues, step: Partly<StepFields>, fail: Fail): void {
  const { exposures = [], kind } = step;
  for (const exposure of EXPOSURES)
    if (typeof handling.exposureTimes[exposure] === "number" && !exposures.includes(exposure))
      fail(["handling", "exposureTimes", exposureKey(exposure)], `Tick ${exposure} too, or leave its time blank.`);
  if (handling.solvent && !exposures.includes("solvent"))
    fail(["handling", "solvent"], "Tick solvent too, or leave this open.");
  if (handling.contactFace && !handling.contactMeans)
    fail(["handling", "contactMeans"], "Say with what it is touched.");
  if (handling.contactMeans && !handling.contactFace) fail(["handling", "contactFace"], "Say which face is touched.");
  if (handling.bumpPeelForce && !handling.bumpHeight)
    fail(["handling", "bumpHeight", "value"], "Type the height of the bumps as well.");
  const has = inputsOf(kind);
  for (const { field, group, who } of KIND_FIELDS) {
    const value = handling[field];
    if (value === null || has[group]) continue;
    const measured = typeof value === "object";
    fail(["handling", field, ...(measured ? ["value"] : [])], `Only ${who} has it: leave it blank.`);
  }
}

function checkFilm(
  { change, thickness, stress, coverage, lines }: Partly<StepValues["films"][number]>,
  fail: Fail,
): void {
  if (change === "adds") {
    if (thickness === null) fail(["thickness", "value"], "Type the film thickness. Blank is missing, not zero.");
    if (reachesZero(thickness)) fail(["thickness", "tolerance"], SPREAD);
  }
  if (change !== "removes") return;
  const whole = "A removal takes the whole film: leave this blank.";
  if (thickness) fail(["thickness", "value"], whole);
  if (stress) fail(["stress", "value"], whole);
  if (typeof coverage === "number") fail(["coverage"], whole);
  if (lines) fail(["lineWidth"], whole);
}

/** Looks at the fields together. A field that has been spoken of already is not spoken of again. */
function checkStep(step: Partly<StepFields>, context: z.core.$RefinementCtx): void {
  const spokenOf = context.issues.map(({ path }) => `${path?.join(".")}.`);
  const fail: Fail = (path, message) => {
    const field = path.filter((part) => part !== "value" && part !== "tolerance").join(".");
    if (spokenOf.some((known) => known.startsWith(`${field}.`))) return;
    context.addIssue({ code: "custom", path, message });
  };
  if (step.peakTemperature === null && typeof step.handling === "object" && !step.handling.profile)
    fail(["peakTemperature"], blankMessage(PEAK));
  checkKind(step, fail);
  if (step.kind && typeof step.handling === "object") checkHandling(step.handling, step, fail);
  for (const field of ["siliconAfter", "trimWidth", "trimDepth", "bondThickness"] as const)
    if (reachesZero(step[field])) fail([field, "tolerance"], SPREAD.replace("thickness", "value"));
  if (!Array.isArray(step.films)) return;
  for (const [index, film] of step.films.entries())
    if (typeof film === "object") checkFilm(film, (path, message) => fail(["films", index, ...path], message));
}

/**
 * A step of a flow. Everything that is wrong is said at once, so the step as a whole is looked at even when a field of it was not
 * understood. Whether the order of steps makes sense is not asked here: the order rule says so in the assessment.
 */
export const stepSchema = stepFields
  .superRefine(checkStep, { when: ({ value }) => typeof value === "object" && value !== null })
  .transform((step): StepValues => {
    const { profile } = step.handling;
    return { ...step, ...heatOf(step), ...(profile ? profileHeat(profile) : {}) };
  });

/** The peak that `checkStep` has asked for. */
const heatOf = ({ peakTemperature }: StepFields) => ({ peakTemperature: peakTemperature ?? ROOM_TEMPERATURE });
