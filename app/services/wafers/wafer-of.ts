import type { Wafer } from "#app/db/entities/wafer.ts";
import type { LabelledWafer } from "#app/lib/wafer-label.ts";

/** A wafer whose lot is loaded, as labels name it. */
export function labelled({ name, slot, lot }: Pick<Wafer, "name" | "slot" | "lot">): LabelledWafer {
  return { name, slot: slot ?? null, lot: lot?.name ?? null };
}
