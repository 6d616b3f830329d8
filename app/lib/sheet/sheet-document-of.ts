import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import { tieUnits } from "#app/components/drawings/no-break.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { SheetDocument, SheetHands } from "#app/schemas/sheet-document.ts";
import type { AssessmentHead } from "../assessment-view.ts";
import { CAUTIONS } from "../cautions.ts";
import { sheetView, type SheetView } from "../sheet-view.ts";
import { endedNotice, markWords, statusWord } from "./revision-words.ts";
import { codePath } from "./qr-path.ts";
import { engineersPart } from "./engineers-part.ts";
import type { SheetFacts } from "./sheet-facts.ts";

/** What a sheet is made of: a stored assessment, its inputs, and which leg of it the sheet is for. */
export interface SheetSource {
  head: AssessmentHead;
  /** of all slots */
  result: AssessmentResult;
  input: AssessmentInput;
  /** number of the leg; null where the flow does not part by slot */
  leg: number | null;
}

export const DRAFT_NOTICE = "Draft, not released: not for the floor";

/** A sheet as everything that its paper says. */
export function sheetDocumentOf(source: SheetSource, facts: SheetFacts): SheetDocument {
  const view = sheetView(source.head, source.result, source.leg === null ? null : String(source.leg));
  const { release } = facts;
  const { page: _, ...drafted } = view.titleBlock;
  const titleBlock = release
    ? {
        ...drafted,
        prepared: release.preparedBy,
        checked: release.checkedBy,
        released: release.releasedBy,
        number: release.number,
        revision: release.revision,
        status: statusWord(release),
        date: release.effectiveFrom.slice(0, 10),
      }
    : drafted;
  const revision = titleBlock.revision === "none" ? "" : ` ${titleBlock.revision}`;
  const document: SheetDocument = {
    format: 1,
    language: "en",
    name: `Handling-risk sheet ${titleBlock.number}${revision}`,
    mark: release ? markWords(release) : "Draft, not for the floor",
    diameter: view.diameter,
    titleBlock,
    status: release && {
      address: release.statusAddress,
      words: "Still current? Scan.",
      code: codePath(release.statusAddress),
    },
    uncontrolled: "Uncontrolled when printed.",
    dated: release?.effectiveFrom ?? source.head.createdAt,
    hands: handsPart(view, facts),
    engineers: engineersPart(source, view, facts),
  };
  return tied(document);
}

/** The same without what engineers read: what a guest of the program may have. */
export function handsOnly(document: SheetDocument): SheetDocument {
  return { ...document, engineers: null };
}

function handsPart(view: SheetView, facts: SheetFacts): SheetHands {
  const { release } = facts;
  const bows = view.groups.flatMap(({ bow }) => (bow.shape.kind === "bowed" ? [bow.shape.bow] : []));
  return {
    notices: notices(view, release),
    program: view.program,
    effective: release && `Effective from ${release.effectiveFrom.slice(0, 16).replace("T", " ")} UTC`,
    lots: lotsOf(view, facts),
    outcome: view.outcome,
    where: view.where,
    blocked: view.blocked,
    answer: view.answer,
    support: view.support,
    exaggeration: chooseExaggeration(bows, view.diameter),
    groups: view.groups,
    bonds: view.bonds,
    tapes: view.tapes,
    deviations: (release?.deviations ?? []).map(
      ({ text, scope, until }) => `${text}. Only for ${scope}, until ${until}.`,
    ),
    cautions: CAUTIONS.map(({ sign, text }) => ({ sign, text })),
    emergency: {
      heading: "If a wafer breaks: stop.",
      text: "Razor-sharp shards: gloves and eye protection. Site procedure; tell the shift lead.",
      call: facts.whomToCall,
    },
  };
}

/** What must be read before anything else. */
function notices(view: SheetView, release: SheetFacts["release"]): string[] {
  const found: string[] = [];
  if (!release) found.push(DRAFT_NOTICE);
  const ended = release && endedNotice(release);
  if (ended) found.push(ended);
  if (view.legs) found.push(`For ${view.legs.chosen.slots} alone: the other slots have sheets of their own`);
  // What a released revision was made from is settled: only a draft asks to be assessed again.
  if (!release && view.changedSince !== null)
    found.push(`Inputs have changed since ${view.changedSince}: assess again`);
  return found;
}

function lotsOf({ lot }: SheetView, { lots, release }: SheetFacts): string | null {
  const pinned = [...new Set([...(lot === null ? [] : [lot]), ...lots])];
  if (pinned.length > 0) return `${pinned.length === 1 ? "Lot" : "Lots"} ${pinned.join(", ")}`;
  return release ? "Any lot of the program" : null;
}

/** Every text with its values tied to their units, so that none wraps apart, on whatever paper. */
function tied<T>(value: T): T {
  if (typeof value === "string") return tieUnits(value) as T;
  if (Array.isArray(value)) return value.map(tied) as T;
  if (typeof value !== "object" || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, each]) => [key, isWord(key) ? each : tied(each)])) as T;
}

/** Words that are matched and addresses, not read. */
const isWord = (key: string) =>
  [
    "address",
    "kind",
    "holding",
    "support",
    "outcome",
    "outcomes",
    "required",
    "sign",
    "id",
    "dated",
    "number",
  ].includes(key);
