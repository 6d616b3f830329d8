import { z } from "zod";
import { CAUTION_SIGNS } from "#app/lib/sheet/caution-signs.ts";
import { HOLDINGS, OUTCOMES, SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";

const text = z.string();
const texts = z.array(text);

/** A wafer's shape as the bow line draws it, as it lies; m. */
const bowShape = z.discriminatedUnion("kind", [
  z.strictObject({ kind: z.literal("bowed"), bow: z.number() }),
  z.strictObject({ kind: z.literal("rolled"), radius: z.number(), edgesUp: z.boolean() }),
  z.strictObject({ kind: z.literal("saddle"), bowX: z.number(), bowY: z.number() }),
  z.strictObject({ kind: z.literal("flat") }),
  z.strictObject({ kind: z.literal("held") }),
]);

const bowLine = z.strictObject({ shape: bowShape, deviceSideUp: z.boolean(), holding: z.enum(HOLDINGS) });

const support = z.strictObject({
  required: z.array(z.enum(SUPPORT_CLASSES)),
  planned: z.array(text.nullable()),
  outcomes: z.array(z.enum(OUTCOMES)),
  numbers: z.array(z.number()),
  /** the bar in words, for who does not see it */
  label: text,
});

/** Consecutive steps on which the same thing holds the wafer, in words for hands. */
const group = z.strictObject({
  /** '1 to 12' */
  steps: text,
  /** by name; null where the support class says it all */
  heldBy: text.nullable(),
  support: z.enum(SUPPORT_CLASSES),
  sideUp: text,
  touch: text,
  silicon: text,
  hottest: text,
  /** which of several tools and by which recipe, one line each */
  runs: texts,
  shape: texts,
  bow: bowLine,
  stop: z.strictObject({ lines: texts, how: text }),
  doNot: texts.max(5),
});

const bond = z.strictObject({
  steps: text,
  /** 'device side bonded', where that has to be said */
  face: text.nullable(),
  carrier: text,
  material: text,
  debond: text,
});

/** Page 1: what hands need, and nothing that a guest of the program must not read. */
const hands = z.strictObject({
  /** said first and in bold: that it is a draft, superseded, for some slots alone, or of inputs that have changed */
  notices: texts,
  program: text,
  /** 'Effective from 2026-12-01 07:55 UTC'; null for a draft */
  effective: text.nullable(),
  /** 'Any lot of the program', or 'Lot TRN-24-017' that it is pinned to; null leaves room to write */
  lots: text.nullable(),
  outcome: z.enum(OUTCOMES),
  /** 'first at step 12'; null when it is clear */
  where: text.nullable(),
  /** it must not be worked from, whatever its status */
  blocked: z.boolean(),
  answer: text,
  support,
  /** one scale for all bow lines of the page */
  exaggeration: z.number(),
  groups: z.array(group),
  bonds: z.array(bond),
  /** tapes, frames and rings of the flow, each once */
  tapes: texts,
  /** deviations in force, a sentence each */
  deviations: texts,
  cautions: z.array(z.strictObject({ sign: z.enum(CAUTION_SIGNS), text })),
  emergency: z.strictObject({ heading: text, text, call: text.nullable() }),
});

/** One step for engineers; figures as text with ±, without the unit that stands in the head of their column. */
const stepRow = z.strictObject({
  number: z.number(),
  title: text,
  silicon: text,
  /** °C */
  hottest: text,
  heldBy: text,
  support: z.enum(SUPPORT_CLASSES),
  /** what holds it changes here */
  newSupport: z.boolean(),
  bow: bowLine,
  /** warp at 25 °C as it lies, µm */
  warp: text,
  lies: text,
  /** what its tool takes for the side that it lies on, µm */
  limit: text,
  outcome: z.enum(OUTCOMES),
  /** the worst finding in a few words; null when all are clear */
  finding: text.nullable(),
});

const point = z.strictObject({ x: z.number(), y: z.number() });

/** Warp of the free wafer at 25 °C against silicon thickness, ready to draw; m. */
const warpByThickness = z.strictObject({
  series: z.array(z.strictObject({ id: z.enum(["front", "all"]), label: text, points: z.array(point) })).min(1),
  thicknessLimits: z.array(z.strictObject({ value: z.number(), lines: texts })),
  curling: z.strictObject({ thickness: z.number(), label: text }).nullable(),
  /** silicon that the flow ends with */
  chosenThickness: z.number().nullable(),
  /** the drawing in words */
  label: text,
});

/** What an engineer reads beside: null in a document for a guest. */
const engineers = z.strictObject({
  exaggeration: z.number(),
  steps: z.array(stepRow),
  plot: warpByThickness.nullable(),
  /** why there is no plot; null where there is one */
  noPlot: text.nullable(),
  /** figures that rest on an assumption, a line each */
  assumptions: texts,
  /** what its figures mean */
  meaning: text,
  /** what they were made with */
  remarks: texts,
  /** how its bow lines are read */
  signs: text,
  /** since the last released revision, at most three lines */
  changes: texts.max(3),
});

/** The fields of its title block after ISO 7200; the page is counted where it is drawn. */
const titleBlock = z.strictObject({
  owner: text,
  documentType: text,
  title: text,
  prepared: text,
  checked: text,
  released: text,
  number: text,
  revision: text,
  status: text,
  date: text,
  language: text,
});

/**
 * A handling-risk sheet as everything that its paper says: words, numbers and what its drawings are drawn from, in the units as
 * delivered. It is stored with a released revision and drawn again from there, so it asks nothing of the library, of a person's
 * settings or of the engine.
 */
export const sheetDocument = z.strictObject({
  format: z.literal(1),
  language: z.literal("en"),
  /** 'Handling-risk sheet TRN-H003 B' */
  name: text,
  /** across every page in outline; null while it is in force */
  mark: text.nullable(),
  /** wafer diameter, m */
  diameter: z.number(),
  titleBlock,
  /** where the code on paper leads, and its words; null for a draft */
  status: z
    .strictObject({
      address: z.url(),
      words: text,
      /** the code, a path over so many modules */
      code: z.strictObject({ size: z.number(), path: text }),
    })
    .nullable(),
  /** 'Uncontrolled when printed.' */
  uncontrolled: text,
  /** ISO date-time of the paper: when it became effective, or was assessed */
  dated: z.iso.datetime(),
  hands,
  engineers: engineers.nullable(),
});

export type SheetDocument = z.infer<typeof sheetDocument>;
export type SheetHands = SheetDocument["hands"];
export type SheetEngineers = NonNullable<SheetDocument["engineers"]>;
export type SheetStepRow = SheetEngineers["steps"][number];
