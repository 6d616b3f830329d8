import { SLOTS } from "#app/engine/flow/legs.ts";

/** Slots as they were typed: understood, blank or all of them as null, or what is wrong and where. */
export type ReadSlots = { ok: true; slots: number[] | null } | { ok: false; message: string };

const EXAMPLE = "Type for example 1-12, 14.";
const RUN = /^(\d{1,4})(?:-(\d{1,4}))?$/;

const refuse = (message: string): ReadSlots => ({ ok: false, message });

/**
 * Reads the slots of a cassette that take a step: single ones and runs, '1-12, 14' or '1 to 12 and 14'. A run backwards, a slot that
 * there is not and one that is named twice are refused by name, because each may be a slip of the key.
 */
export function readSlots(typed: string | null | undefined): ReadSlots {
  const parts = (typed ?? "")
    .replace(/[\u2010-\u2015\u2212]/g, "-")
    .replace(/\s*(?:-|\bto\b)\s*/gi, "-")
    .split(/[\s,;]+|\band\b/i)
    .filter((part) => part !== "");
  if (parts.length === 0) return { ok: true, slots: null };
  const named = new Set<number>();
  for (const part of parts) {
    const run = RUN.exec(part);
    if (!run) return refuse(`“${part.slice(0, 40)}” is no slot. ${EXAMPLE}`);
    const [from, to] = [Number(run[1]), Number(run[2] ?? run[1])];
    if (to < from) return refuse(`${part} runs backwards: type ${to}-${from}.`);
    for (let slot = from; slot <= to; slot += 1) {
      if (slot < 1 || slot > SLOTS) return refuse(`There is no slot ${slot}: a cassette has slots 1 to ${SLOTS}.`);
      if (named.has(slot)) return refuse(`Slot ${slot} is named twice.`);
      named.add(slot);
    }
  }
  if (named.size === SLOTS) return { ok: true, slots: null };
  return { ok: true, slots: [...named].sort((one, other) => one - other) };
}

/** Slots as the text of their field, which reads back to the same slots. */
export function slotsText(slots: readonly number[] | null): string {
  const runs: [from: number, to: number][] = [];
  for (const slot of slots ?? []) {
    const last = runs.at(-1);
    if (last && last[1] + 1 === slot) last[1] = slot;
    else runs.push([slot, slot]);
  }
  return runs.map(([from, to]) => (from === to ? `${from}` : `${from}-${to}`)).join(", ");
}
