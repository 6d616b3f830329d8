import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ThinnedWafer } from "#app/schemas/thinned-wafer.ts";

/** Drawn width of the flat wafer's box, px; the arcs keep its scale. */
const WIDTH = 520;

/** The product's argument, drawn at true scale: one film stack on less and less silicon. */
export function ThinningStory({ wafers, force }: { wafers: ThinnedWafer[]; force: number }) {
  return (
    <section className="p-4 tablet:p-10" aria-label="What thinning does">
      <p className="mb-4 text-quiet">
        One film stack, {formatQuantity(force, "forcePerLength", { unit: "N/m", decimals: 0, sign: true })} on the
        device side, {formatQuantity(wafers[0]?.diameter ?? 0.3, "length", { unit: "mm", decimals: 0 })} silicon at 25
        °C. Drawn to scale; only the silicon gets thinner.
      </p>
      {wafers.map((wafer) => (
        <div
          key={wafer.thickness}
          className="grid items-center gap-x-6 border-t border-line py-3 tablet:grid-cols-[180px_1fr]"
        >
          <p>
            <span className="block text-figure font-medium">
              {formatQuantity(wafer.thickness, "length", { unit: "µm", decimals: 0 })}
            </span>
            <span className="text-quiet">{inWords(wafer)}</span>
          </p>
          <BowLine
            label=""
            diameter={wafer.diameter}
            shape={
              wafer.rollRadius === null
                ? { kind: "bowed", bow: wafer.bow }
                : { kind: "rolled", radius: wafer.rollRadius, edgesUp: true }
            }
            deviceSideUp
            holding="bare"
            exaggeration={1}
            width={WIDTH}
            height={heightOf(wafer)}
          />
        </div>
      ))}
    </section>
  );
}

function inWords({ rollRadius, warp }: ThinnedWafer): string {
  return rollRadius === null
    ? `edges up ${formatQuantity(warp, "length", { unit: "mm", decimals: 1 })}`
    : `rolls to ${formatQuantity(rollRadius, "length", { unit: "mm", decimals: 0 })} radius`;
}

/** Room for the arc at the drawing's own scale, so that nothing is shrunk. */
function heightOf({ rollRadius, diameter }: ThinnedWafer): number {
  if (rollRadius === null) return 24;
  const half = Math.min(diameter / 2 / rollRadius, Math.PI);
  return 24 + (rollRadius * (1 - Math.cos(half)) * WIDTH) / diameter;
}
