import type { ReactNode } from "react";
import { PLANE_NARROW, PLANE_WIDE, type PlaneSize } from "./plane.ts";

interface Props {
  /** names of the axes with their units */
  names: { x: string; y: string };
  children: (size: PlaneSize) => ReactNode;
}

/** A drawing over two quantities in both widths; the stylesheet shows the one that fits, since the server does not know the window. */
export function PlaneFigure({ names, children }: Props) {
  return (
    <>
      <div className="max-tablet:hidden">{children(PLANE_WIDE)}</div>
      <div className="max-w-90 tablet:hidden">
        <p className="text-quiet">Upwards: {names.y}</p>
        {children(PLANE_NARROW)}
        <p className="text-right text-quiet">Along: {names.x}</p>
      </div>
    </>
  );
}
