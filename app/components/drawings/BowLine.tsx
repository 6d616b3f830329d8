import { BowFigure, type BowFigureProps } from "./BowFigure.tsx";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

export interface BowLineProps extends Omit<BowFigureProps, "x" | "y"> {
  /** Shape in words, such as 'edges up 343 µm, on carrier'. Empty where the same words stand beside the drawing. */
  label: string;
}

/**
 * The bow line: a wafer as a thin section, bent by its own computed shape, as it lies on the tool. One exaggeration for a
 * whole page stands in the column head; a line at another scale carries its own (`showScale`).
 *
 * Sizes in use: table 76 × 32, strip 75 × 70, list 84 × 36, phone 72 × 26, paper 60 × 28, floor 350 wide.
 */
export function BowLine({ label, ...figure }: BowLineProps) {
  const own = useOwnText();
  return (
    <svg
      className="block h-auto max-w-full overflow-visible"
      viewBox={`0 0 ${figure.width} ${figure.height}`}
      width={figure.width}
      height={figure.height}
      role={label === "" ? undefined : "img"}
      aria-label={label === "" ? undefined : own(label)}
      aria-hidden={label === "" ? true : undefined}
    >
      <BowFigure {...figure} />
    </svg>
  );
}
