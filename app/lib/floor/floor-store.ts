import { openDB, type DBSchema, type IDBPDatabase } from "idb";

/** What somebody entered, until the server has it. */
export interface QueuedEntry {
  id: string;
  /** id of who wrote it: nobody else sends it */
  person: string;
  lot: string;
  /** what it says, in a few words */
  words: string;
  /** ISO */
  at: string;
  /** the fields of its form, photos among them; empty once they have been taken off the device */
  fields: [name: string, value: string | File][];
  /** why the server did not take it; null while it waits */
  refused: string | null;
}

interface Schema extends DBSchema {
  queue: { key: string; value: QueuedEntry };
}

const NAME = "floor";
/** How many wait, for who signs out on a page that knows nothing of the floor. */
const COUNT = "floor-unsent";
/** What is confidential stays on a device no longer, ms. */
const KEPT_FOR = 12 * 3600 * 1000;

let opened: Promise<IDBPDatabase<Schema>> | null = null;

const store = () =>
  (opened ??= openDB<Schema>(NAME, 1, { upgrade: (db) => void db.createObjectStore("queue", { keyPath: "id" }) }));

/**
 * The entries of a person that the server does not have, oldest first. Of one older than twelve hours the content is taken off the device;
 * that it was there stays, so that nobody takes it for sent.
 */
export async function queuedOf(person: string): Promise<QueuedEntry[]> {
  const db = await store();
  const own = (await db.getAll("queue")).filter((entry) => entry.person === person);
  for (const entry of own) {
    if (Date.now() - Date.parse(entry.at) < KEPT_FOR || entry.fields.length === 0) continue;
    entry.fields = [];
    entry.refused = "It waited for twelve hours, and its content was taken off this device. Enter it again.";
    await db.put("queue", entry);
  }
  await noteCount(db);
  return own.toSorted((a, b) => a.at.localeCompare(b.at));
}

export async function putQueued(entry: QueuedEntry): Promise<void> {
  const db = await store();
  await db.put("queue", entry);
  await noteCount(db);
}

export async function dropQueued(id: string): Promise<void> {
  const db = await store();
  await db.delete("queue", id);
  await noteCount(db);
}

async function noteCount(db: IDBPDatabase<Schema>): Promise<void> {
  const count = await db.count("queue");
  if (count === 0) localStorage.removeItem(COUNT);
  else localStorage.setItem(COUNT, String(count));
}
