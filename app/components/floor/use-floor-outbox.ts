import { createContext, use, useCallback, useEffect, useRef, useState } from "react";
import { deliver } from "#app/lib/floor/deliver.ts";
import { dropQueued, putQueued, queuedOf, type QueuedEntry } from "#app/lib/floor/floor-store.ts";

export interface FloorOutbox {
  /** what this person entered of this lot and the server does not have */
  queued: QueuedEntry[];
  /** entries of this lot that went out by themselves since the page came */
  sent: QueuedEntry[];
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
  const [sent, setSent] = useState<QueuedEntry[]>([]);
  // On its way by its own form, which leads on by itself: it does not wait.
  const sending = useRef(new Set<string>());
  const look = useCallback(async () => {
    const own = (await queuedOf(person)).filter((entry) => entry.lot === lot);
    setQueued(own.filter(({ id }) => !sending.current.has(id)));
  }, [person, lot]);

  const busy = useRef(false);
  /** Sends what waits, oldest first, and stops at what has to wait on: an end of a step is nothing before its beginning. */
  const sendAll = useCallback(async () => {
    if (busy.current) return;
    busy.current = true;
    try {
      for (const entry of await queuedOf(person)) {
        if (entry.refused !== null || sending.current.has(entry.id)) continue;
        const delivered = await deliver(entry);
        if (delivered.outcome === "waits") break;
        if (delivered.outcome === "refused") await putQueued({ ...entry, refused: delivered.sentence });
        else {
          await dropQueued(entry.id);
          if (entry.lot === lot) setSent((before) => [...before, entry]);
        }
      }
    } finally {
      busy.current = false;
    }
    await look();
  }, [person, lot, look]);

  useEffect(() => {
    const trying = () => void sendAll().catch(() => undefined);
    trying();
    const timer = setInterval(trying, AGAIN);
    window.addEventListener("online", trying);
    return () => {
      clearInterval(timer);
      window.removeEventListener("online", trying);
    };
  }, [sendAll]);

  return {
    queued,
    sent,
    enter: async (entry) => {
      if ((await queuedOf(person)).some(({ refused }) => refused === null)) {
        await putQueued(entry);
        await look();
        void sendAll().catch(() => undefined);
        return "waits";
      }
      sending.current.add(entry.id);
      try {
        await putQueued(entry);
        const { outcome } = await deliver(entry);
        if (outcome !== "waits") await dropQueued(entry.id);
        return outcome;
      } finally {
        sending.current.delete(entry.id);
        await look();
      }
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
      void sendAll().catch(() => undefined);
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
