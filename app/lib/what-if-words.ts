import type { FlowInput } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";

type Named = Pick<WhatIfSnapshot, "stepIds" | "carriers" | "materials"> & { input: Pick<FlowInput, "steps"> };

const inUnit = {
  siliconAfter: (value: number) => formatQuantity(value, "length", { unit: "µm" }),
  peakTemperature: (value: number) => formatQuantity(value, "temperature", { unit: "°C" }),
  filmThickness: (value: number) => formatQuantity(value, "length", { unit: "µm" }),
  filmStress: (value: number) => formatQuantity(value, "stress", { unit: "MPa", sign: true }),
};

/** A change in words: 'step 15, silicon after it: 90 µm'. */
export function whatIfWords(change: WhatIfChange, { stepIds, input, carriers, materials }: Named): string {
  const index = stepIds.indexOf(change.step);
  const step = input.steps[index];
  const place = `step ${index + 1}`;
  switch (change.field) {
    case "siliconAfter":
      return `${place}, silicon after it: ${inUnit.siliconAfter(change.value)}`;
    case "peakTemperature":
      return `${place}, peak temperature: ${inUnit.peakTemperature(change.value)}`;
    case "planned":
      return `${place}, held by: ${change.value}`;
    case "carrier":
      return `${place}, carrier: ${carriers.find(({ id }) => id === change.value)?.name ?? "unknown"}`;
    case "bondingMaterial":
      return `${place}, bonding material: ${materials.find(({ id }) => id === change.value)?.name ?? "unknown"}`;
    case "filmThickness":
    case "filmStress": {
      const what = change.field === "filmThickness" ? "thickness" : "stress";
      const film = step?.adds[change.film ?? -1]?.film.name ?? "film";
      return `${place}, ${what} of ${film}: ${inUnit[change.field](change.value)}`;
    }
  }
}
