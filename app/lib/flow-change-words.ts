import type { FlowInput } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import type { FlowChange } from "#app/engine/trial/change.ts";
import type { ChangeWords } from "./change-phrase.ts";

const micrometres = (value: number) => formatQuantity(value, "length", { unit: "µm", significant: 4, trim: true });
const celsius = (value: number) => formatQuantity(value, "temperature", { unit: "°C", significant: 4, trim: true });
const megapascals = (value: number) =>
  formatQuantity(value, "stress", { unit: "MPa", significant: 3, trim: true, sign: true });

/** A change of a flow in words. */
export function changeWords(
  change: FlowChange,
  flow: Pick<FlowInput, "steps">,
  { carriers, materials, tools }: Catalogue,
): ChangeWords {
  const { step: number } = change;
  const step = flow.steps[number - 1];
  const planned = (value: number | undefined | null, words: (value: number) => string) =>
    typeof value === "number" ? words(value) : null;
  const words = (what: string, from: string | null, to: string): ChangeWords => ({ what, step: number, from, to });
  switch (change.quantity) {
    case "silicon after":
      return words("Silicon left", planned(step?.siliconAfter?.value, micrometres), micrometres(change.value));
    case "peak temperature":
      return words("Peak temperature", planned(step?.peakTemperature, celsius), celsius(change.value));
    case "bond thickness":
      return words("Bond thickness", planned(step?.bond?.thickness.value, micrometres), micrometres(change.value));
    case "trim depth":
      return words("Trim depth", planned(step?.edgeTrim?.depth.value, micrometres), micrometres(change.value));
    case "support":
      return words("Held by", step?.planned ?? null, change.holding);
    case "tool":
      return words(
        "Tool, if it can do this step",
        step?.equipment?.name ?? null,
        tools.find(({ tool }) => tool.id === change.tool)?.tool.name ?? "unknown",
      );
    case "frame":
      return words("Mounted on a film frame before the step", null, "film frame, and left on it");
    case "place":
      return words("Place in the flow", `step ${number}`, `step ${change.to}`);
    case "film thickness":
    case "film stress":
    case "film on the back": {
      const addition = step?.adds[change.film];
      const name = addition?.film.name ?? "film";
      if (change.quantity === "film on the back")
        return words(`${name}, on the back side as well`, null, micrometres(change.value));
      return change.quantity === "film thickness"
        ? words(`${name}, thickness`, planned(addition?.thickness.value, micrometres), micrometres(change.value))
        : words(`${name}, stress`, planned(addition?.stress.value, megapascals), megapascals(change.value));
    }
    case "bond": {
      const bond = step?.bond;
      const carrier = carriers.find(({ id }) => id === change.carrier)?.name ?? "unknown";
      const material = materials.find((each) => each.material.id === change.material)?.material.name ?? "unknown";
      if (bond?.material.id === change.material && bond.thickness.value === change.thickness)
        return words("Carrier", bond.carrier.name, carrier);
      const pair = `${material}, ${micrometres(change.thickness)}`;
      const was = bond ? `${bond.material.name}, ${micrometres(bond.thickness.value)}` : null;
      if (bond?.carrier.id === change.carrier) return words("Bonding material", was, pair);
      return words("Carrier and bond", bond ? `${bond.carrier.name}, ${was}` : null, `${carrier}, ${pair}`);
    }
  }
}
