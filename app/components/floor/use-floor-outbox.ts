import { createContext, use, useCallback, useEffect, useState } from "react";
import { deliver } from "#app/lib/floor/deliver.ts";
import { dropQueued, putQueued, queuedOf, type QueuedEntry } from "#app/lib/floor/floor-store.ts";

export interface FloorOutbox {
  /** what this person entered of this lot and the server does not have */
  queued: QueuedEntry[];
  /** how many entries went out by themselves since the page came */
  sent: number;
  /** keeps an entry until the server has it; what it was refused for is the caller's to show */
  enter: (entry: QueuedEntry) => Promise<"stored" | "waits" | "refused">;
  drop: (id: string) => Promise<void>;
  /** puts what a refused entry says into the lot's record as an observation */
  observe: (entry: QueuedEntry) => Promise<void>;
}

/** Entries are tried again so often while any waits, ms. */
const AGAIN = 15_000;

/** The entries of a person for one lot on their way to the server, through lost connections and closed pages. */
export function useFloorOutbox(person: string, lot: string): FloorOutbox {
  const [queued, setQueued] = useState<QueuedEntry[]>([]);
  const [sent, setSent] = useState(0);
  const look = useCallback(async () => {
    setQueued((await queuedOf(person)).filter((entry) => entry.lot === lot));
  }, [person, lot]);

  useEffect(() => {
    let stopped = false;
    const sendAll = async () => {
      for (const entry of await queuedOf(person)) {
        if (entry.refused !== null) continue;
        const delivered = await deliver(entry);
        if (delivered.outcome === "waits") break;
        if (delivered.outcome === "refused") await putQueued({ ...entry, refused: delivered.sentence });
        else {
          await dropQueued(entry.id);
          if (!stopped && entry.lot === lot) setSent((count) => count + 1);
        }
      }
      if (!stopped) await look();
    };
    const trying = () => void sendAll().catch(() => undefined);
    trying();
    const timer = setInterval(trying, AGAIN);
    window.addEventListener("online", trying);
    return () => {
      stopped = true;
      clearInterval(timer);
      window.removeEventListener("online", trying);
    };
  }, [person, lot, look]);

  return {
    queued,
    sent,
    enter: async (entry) => {
      await putQueued(entry);
      const { outcome } = await deliver(entry);
      if (outcome !== "waits") await dropQueued(entry.id);
      await look();
      return outcome;
    },
    drop: async (id) => {
      await dropQueued(id);
      await look();
    },
    observe: async (entry) => {
      const kept = entry.fields.filter(([name]) => ["revision", "leg", "step"].includes(name));
      const text = `Entered at ${entry.at} without a connection and not taken: ${entry.words}. ${entry.refused ?? ""}`;
      const id = newId();
      const fields: QueuedEntry["fields"] = [...kept, ["id", id], ["kind", "observed"], ["text", text.slice(0, 1000)]];
      await putQueued({ ...entry, id, fields, words: `observation: ${entry.words}`, refused: null });
      await dropQueued(entry.id);
      await look();
    },
  };
}

/** A random UUID, also where the page came over a connection on which the browser makes none. */
export function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x40;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join("-");
}

export const OutboxContext = createContext<{ outbox: FloorOutbox; person: string; lot: string } | null>(null);

/** The outbox of the lot on the screen. */
export function useOutbox() {
  return use(OutboxContext);
}
