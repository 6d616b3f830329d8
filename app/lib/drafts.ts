/*
 * What somebody has typed and not saved, kept in this browser so that a closed page, a crash or a lost connection costs nothing. It is
 * told apart by person, and gone when that person signs out.
 */

/** Begins the name of everything that is kept of unsaved work, in either store. */
const PREFIX = "planeward-draft ";

/** Unsaved work of a person on a record. Each visit keeps its own, so that two windows do not write over each other. */
export interface Draft {
  /** ISO 8601 */
  at: string;
  /** of the record when it was opened; null for a new one */
  version: number | null;
  /** the record when it was opened and as it was typed, as the JSON of its text */
  opened: string;
  said: string;
}

/** A draft with the name that it is kept under. */
export interface KeptDraft extends Draft {
  name: string;
}

/** Older drafts are not offered, and go, ms. */
const LIFE = 30 * 24 * 3600e3;

/** Whether the person is signing out: then nothing is written any more, however late it comes. */
let closed = false;

const subject = (person: string, record: string) => `${PREFIX}${person} ${record} `;

/** A name for the drafts of one visit. */
export function draftName(person: string, record: string): string {
  return `${subject(person, record)}${Date.now().toString(36)}${Math.random().toString(36).slice(2, 8)}`;
}

/** Drafts of a person's earlier visits to a record, newest first. */
export function keptDrafts(person: string, record: string): KeptDraft[] {
  try {
    const names = Object.keys(localStorage).filter((name) => name.startsWith(subject(person, record)));
    return names.flatMap(readDraft).toSorted((one, other) => other.at.localeCompare(one.at));
  } catch {
    // A browser may forbid its store; then nothing is offered.
    return [];
  }
}

function readDraft(name: string): KeptDraft[] {
  const draft = parsed(localStorage.getItem(name));
  if (draft && Date.now() - Date.parse(draft.at) < LIFE) return [{ ...draft, name }];
  localStorage.removeItem(name);
  return [];
}

function parsed(text: string | null): Draft | null {
  try {
    const value: unknown = JSON.parse(text ?? "null");
    return isDraft(value) ? value : null;
  } catch {
    return null;
  }
}

function isDraft(value: unknown): value is Draft {
  if (typeof value !== "object" || value === null) return false;
  const { at, version, opened, said } = value as Record<string, unknown>;
  return (
    typeof at === "string" &&
    (version === null || typeof version === "number") &&
    typeof opened === "string" &&
    typeof said === "string"
  );
}

/** Keeps a draft; whether it could be kept. */
export function keepDraft(name: string, draft: Draft): boolean {
  if (closed) return false;
  try {
    localStorage.setItem(name, JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

export function dropDraft(name: string): void {
  try {
    localStorage.removeItem(name);
  } catch {
    // What could not be kept needs no removing.
  }
}

/** Somebody goes on typing: a sign-out that was begun has been called off. */
export function stillHere(): void {
  closed = false;
}

/** Takes away everything that this browser keeps of unsaved work, whoever typed it. */
export function wipeDrafts(): void {
  closed = true;
  for (const store of [() => localStorage, () => sessionStorage])
    try {
      for (const name of Object.keys(store())) if (name.startsWith(PREFIX)) store().removeItem(name);
    } catch {
      // A browser that forbids its store has nothing in it.
    }
}
