import type { StepInput } from "#app/engine/flow/model.ts";
import { LIMIT_DEFINITIONS, type LimitDefinition } from "#app/engine/rules/limits.ts";
import { runsInWords } from "#app/engine/runs-in-words.ts";
import type { AssessmentInput, InputChange, InputRecord } from "#app/schemas/assessment-changes.ts";
import { align, alignSteps } from "./align.ts";
import { changeTexts, inputProperty, isMeasured, isObject, NONE, valueText } from "./input-property.ts";
import { limitQuantity, limitText } from "./limit-quantity.ts";

/** What says nothing of a value: identities, which names tell apart as well, and the text as it was typed. */
const PASSED_OVER = new Set(["id", "filmId", "text"]);

/** Whose properties are being compared. */
interface Owner {
  subject: string;
  kind: InputRecord;
  id: string | null;
  steps: number[];
}

const RECORD_WORDS = {
  film: "Film",
  carrier: "Carrier",
  bondingMaterial: "Bonding material",
  tape: "Tape",
  equipment: "Tool",
} as const;

/** The names under which a record of the library stands in a step. */
const RECORDS: Record<string, keyof typeof RECORD_WORDS> = {
  film: "film",
  carrier: "carrier",
  material: "bondingMaterial",
  tape: "tape",
  equipment: "equipment",
};

/**
 * What differs between two inputs, each property once however many steps use it. Structure is followed, not a list of known
 * fields, so a property that a later engine brings is found as well; what the earlier input did not know at all is not a change,
 * the engine's version tells of it.
 */
export function inputChanges(before: AssessmentInput, after: AssessmentInput): InputChange[] {
  const found = new Changes();
  const wafer: Owner = { subject: "Incoming wafer", kind: "flow", id: null, steps: [] };
  const { steps: stepsBefore, name: nameBefore, ...restBefore } = before.flow;
  const { steps: stepsAfter, name: nameAfter, ...restAfter } = after.flow;
  found.compare(nameBefore, nameAfter, "name", { ...wafer, subject: "Flow" });
  for (const key of Object.keys(restBefore) as (keyof typeof restBefore)[])
    found.compare(restBefore[key], restAfter[key], key, wafer);
  compareSteps(found, stepsBefore, stepsAfter);
  compareLimits(found, before.limits, after.limits);
  return found.all;
}

/** Gathers changes; one that several steps share is kept once, with all of them. */
class Changes {
  readonly all: InputChange[] = [];

  note(owner: Owner, property: string, { from, to }: { from: string; to: string }): void {
    const known = this.all.find(
      (each) => each.subject === owner.subject && each.property === property && each.from === from && each.to === to,
    );
    if (known) known.steps = [...new Set([...known.steps, ...owner.steps])].sort((a, b) => a - b);
    else
      this.all.push({
        subject: owner.subject,
        property,
        from,
        to,
        steps: owner.steps,
        record: { kind: owner.kind, id: owner.id },
      });
  }

  /** Compares two values of one property and goes on into what they are made of. */
  compare(before: unknown, after: unknown, name: string, owner: Owner): void {
    if (PASSED_OVER.has(name) || before === undefined || isSame(before, after)) return;
    const property = inputProperty(owner.kind, name);
    if (isObject(before) && isObject(after) && !isMeasured(before) && !isMeasured(after))
      this.compareParts(before, after, name, owner);
    else if (isListOfThings(before) && isListOfThings(after)) this.compareLists(before, after, name, owner);
    else this.note(owner, property.label, changeTexts(before, after, property));
  }

  private compareParts(before: Record<string, unknown>, after: Record<string, unknown>, name: string, owner: Owner) {
    const kind = RECORDS[name];
    if (kind && before["name"] !== after["name"]) {
      this.note(owner, RECORD_WORDS[kind], { from: String(before["name"]), to: String(after["name"]) });
      return;
    }
    const part: Owner = kind
      ? { ...owner, kind, subject: String(after["name"]), id: typeof after["id"] === "string" ? after["id"] : null }
      : owner;
    for (const key of Object.keys(before)) {
      const asFilms = key === "stress" && isObject(after["film"]);
      this.compare(before[key], after[key], key, asFilms ? stressOwner(after["film"], part) : part);
    }
  }

  private compareLists(before: Thing[], after: Thing[], name: string, owner: Owner): void {
    const property = inputProperty("flow", name);
    for (const pair of align(before, after, [whatItIs])) {
      if (pair.before && pair.after) this.compareParts(pair.before, pair.after, name, thingOwner(pair.after, owner));
      else
        this.note(owner, property.label, {
          from: pair.before ? valueText(pair.before, property) : NONE,
          to: pair.after ? valueText(pair.after, property) : NONE,
        });
    }
  }
}

type Thing = Record<string, unknown>;

const isListOfThings = (value: unknown): value is Thing[] => Array.isArray(value) && value.every(isObject);

/** The same for this purpose: null, missing and empty are all nothing; what the earlier value does not know does not count. */
function isSame(before: unknown, after: unknown): boolean {
  if (isNothing(before) || isNothing(after)) return isNothing(before) && isNothing(after);
  if (Array.isArray(before) && Array.isArray(after))
    return before.length === after.length && before.every((each, index) => isSame(each, after[index]));
  if (isMeasured(before) && isMeasured(after))
    return (["value", "tolerance", "source", "note", "on"] as const).every((key) => isSame(before[key], after[key]));
  if (isObject(before) && isObject(after))
    return Object.keys(before).every(
      (key) => PASSED_OVER.has(key) || before[key] === undefined || isSame(before[key], after[key]),
    );
  if (typeof before === "number" && typeof after === "number") return sameNumber(before, after);
  return before === after;
}

/** A value that went through a form and back may differ in its last digit. */
const sameNumber = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));

const isNothing = (value: unknown) =>
  value === null || value === undefined || value === "" || (Array.isArray(value) && value.length === 0);

/** What tells a thing of a list from its neighbours: its name or its film's, and its side. */
function whatItIs(thing: Thing): string {
  const film = thing["film"];
  return [thing["kind"], thing["side"], isObject(film) ? film["name"] : thing["filmName"], thing["name"]].join("\n");
}

/** A film that a step adds is called by its name beside the step's. */
function thingOwner(thing: Thing, owner: Owner): Owner {
  const film = thing["film"];
  return isObject(film) ? { ...owner, subject: `${owner.subject}, ${String(film["name"])}` } : owner;
}

/** Stress belongs to the film, whichever steps put it down. */
function stressOwner(film: unknown, owner: Owner): Owner {
  if (!isObject(film)) return owner;
  const id = typeof film["id"] === "string" ? film["id"] : null;
  return { ...owner, kind: "film", id, subject: String(film["name"]) };
}

function compareSteps(found: Changes, before: readonly StepInput[], after: readonly StepInput[]): void {
  const numberBefore = new Map(before.map((step, index) => [step, index + 1]));
  const numberAfter = new Map(after.map((step, index) => [step, index + 1]));
  const owner = (step: StepInput, number: number): Owner => ({
    subject: `Step ${number}, ${step.title}`,
    kind: "flow",
    id: null,
    steps: [number],
  });
  for (const pair of alignSteps(before, after)) {
    if (pair.before && pair.after) {
      const own = owner(pair.after, numberAfter.get(pair.after) ?? 0);
      for (const key of Object.keys(pair.before) as (keyof StepInput)[])
        if (key !== "slots") found.compare(pair.before[key], pair.after[key], key, own);
      const [from, to] = [slotsText(pair.before), slotsText(pair.after)];
      if (from !== to) found.note(own, "Slots", { from, to });
    } else if (pair.before) {
      const number = numberBefore.get(pair.before) ?? 0;
      found.note(owner(pair.before, number), "Step", { from: `step ${number}`, to: "taken out" });
    } else {
      const number = numberAfter.get(pair.after) ?? 0;
      found.note(owner(pair.after, number), "Step", { from: NONE, to: "put in" });
    }
  }
}

/** Slots that a step does not name are all of them: nobody who did not know of the question meant anything else. */
const slotsText = ({ slots }: StepInput) => (slots ? runsInWords(slots) : "all");

const definitions: Record<string, LimitDefinition> = LIMIT_DEFINITIONS;

function compareLimits(found: Changes, before: AssessmentInput["limits"], after: AssessmentInput["limits"]): void {
  for (const [key, was] of Object.entries(before)) {
    const is = after[key as keyof typeof after];
    const definition = definitions[key];
    // A limit that only one of two versions of the engine knows is the engine's change.
    if (!is || !definition) continue;
    const owner: Owner = { subject: "Site limit", kind: "limit", id: key, steps: [] };
    const text = (value: number) => limitText(value, limitQuantity(definition));
    if (!sameNumber(was.value, is.value))
      found.note(owner, definition.title, { from: text(was.value), to: text(is.value) });
    else if (was.source !== is.source)
      found.note(owner, definition.title, {
        from: `${text(was.value)}, ${was.source}`,
        to: `${text(is.value)}, ${is.source}`,
      });
  }
}
