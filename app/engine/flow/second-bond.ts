import { flowPoint, lockTemperature, slidingBonds, type BondState } from "./bond.ts";
import { lockedBond, settle, type SettleOptions } from "./settle.ts";
import type { WaferState } from "./state.ts";

/**
 * The state of rest of a bond that was made last, on the free face of a wafer that is on a carrier already. The bonder presses
 * wafer and first carrier flat while they cool, so adhesive and second carrier rest on the wafer as the first carrier has stretched
 * it where they lock (own derivation); on a wafer by itself that is its own length, which is why a first bond needs none of this.
 * A first bond that slides at the peak locks flat as well, each at its own temperature, the highest first.
 */
export function restOnPair(applied: WaferState, peak: number, options: SettleOptions): WaferState {
  const made = applied.bonds.at(-1);
  if (!made) return applied;
  const pressed = { ...options, heldFlat: true };
  const first = applied.bonds.slice(0, -1);
  const cooling = [
    ...slidingBonds(first, peak).map((bond) => ({ bond, at: flowPoint(bond.material) ?? peak })),
    { bond: made, at: lockTemperature(made) },
  ].sort((a, b) => b.at - a.at);
  let state = settle({ ...applied, bonds: first }, peak, pressed).state;
  const locks = new Map<BondState, BondState>();
  for (const { bond, at } of cooling) {
    const settled = settle(state, at, pressed);
    const locked = lockedBond(settled, bond, true);
    locks.set(bond, locked);
    state = { ...settled.state, bonds: bond === made ? [...state.bonds, locked] : swapped(state.bonds, bond, locked) };
  }
  return { ...applied, bonds: applied.bonds.map((bond) => locks.get(bond) ?? bond) };
}

const swapped = (bonds: readonly BondState[], bond: BondState, locked: BondState) =>
  bonds.map((each) => (each === bond ? locked : each));
