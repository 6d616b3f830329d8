import type { KeyboardEvent, ReactNode, SVGAttributes } from "react";
import type { CutLayer } from "./cut-layer.ts";
import { selectInPlace } from "./select-in-place.ts";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

export interface CutPartProps {
  layer: CutLayer;
  index: number;
  /** Address that selects the layer. */
  href?: string;
  /** Selects it in place. */
  onSelect?: (index: number) => void;
  /** Moves it one place; false where it stays. */
  onShift?: (index: number, by: 1 | -1) => boolean;
  /** What a pointer does that drags it. */
  drag?: SVGAttributes<SVGElement>;
  children: ReactNode;
}

/** What one layer says to a reader who does not see the drawing. */
function spoken(layer: CutLayer): string {
  return [layer.name, layer.thicknessText, ...layer.notes, ...(layer.assumed ? ["assumed"] : [])].join(", ");
}

/**
 * One layer as a focusable part of the cut: a link where there is an address, else a button, else a picture with a name.
 */
export function CutPart({ layer, index, href, onSelect, onShift, drag, children }: CutPartProps) {
  const own = useOwnText();
  const name = { "aria-label": own(spoken(layer)), "data-layer": index };
  const current = layer.selected ? ("true" as const) : undefined;
  if (href !== undefined) {
    return (
      <a
        className="drawing-link"
        href={href}
        {...name}
        {...(drag as object)}
        aria-current={current}
        aria-keyshortcuts={onShift && "Alt+ArrowUp Alt+ArrowDown"}
        onClick={selectInPlace(onSelect && (() => onSelect(index)))}
        onKeyDown={(event) => moveFocus(event, onShift)}
      >
        {children}
      </a>
    );
  }
  if (onSelect) {
    const press = (event: KeyboardEvent<SVGGElement>) => {
      if (event.key === "Enter" || event.key === " ") {
        event.preventDefault();
        onSelect(index);
      } else {
        moveFocus(event);
      }
    };
    return (
      <g
        className="drawing-link"
        role="button"
        tabIndex={0}
        {...name}
        aria-pressed={layer.selected ?? false}
        onClick={() => onSelect(index)}
        onKeyDown={press}
      >
        {children}
      </g>
    );
  }
  return (
    <g role="img" {...name}>
      {children}
    </g>
  );
}

/** Up and down arrows go to the neighbouring layer; with Alt the layer goes there, and the focus with it. */
function moveFocus(event: KeyboardEvent<HTMLElement | SVGElement>, onShift?: CutPartProps["onShift"]) {
  const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
  if (step === 0) return;
  const here = Number(event.currentTarget.dataset.layer);
  const next = event.currentTarget.closest("svg")?.querySelector(`[data-layer="${here + step}"]`);
  if (event.altKey && onShift) {
    event.preventDefault();
    if (!onShift(here, step)) return;
  }
  if (next instanceof SVGElement) {
    event.preventDefault();
    next.focus();
  }
}
