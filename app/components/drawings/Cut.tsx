import { BowFigure, type BowFigureProps } from "./BowFigure.tsx";
import { colour } from "./colour.ts";
import { CutKey } from "./CutKey.tsx";
import type { CutLayer } from "./cut-layer.ts";
import { CUT, cutLayout, type CutPlace } from "./cut-layout.ts";
import { CutLayerDrawn, labelBox } from "./CutLayerDrawn.tsx";
import { CutPart } from "./CutPart.tsx";
import { selectInPlace } from "./select-in-place.ts";
import { useCutDrag } from "./use-cut-drag.ts";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";

/** The words at one end of the cut, with the link that adds a film there. */
export interface CutEnd {
  words: string;
  add?: {
    words: string;
    href: string;
    /** Adds it in place, where scripts run. */
    onAdd?: () => void;
  };
}

export interface CutProps {
  /** Top to bottom as drawn: unbonded device side up; bonded back side up, adhesive and carrier below. */
  layers: readonly CutLayer[];
  top: CutEnd;
  bottom: CutEnd;
  label: string;
  /** Address that selects a layer; makes every layer a link that works without scripts. */
  hrefFor?: (index: number) => string;
  /** Selects a layer in place; with hrefFor it replaces the navigation, alone it makes every layer a button. */
  onSelect?: (index: number) => void;
  /** Moves a film one place up or down; with it Alt and an arrow key do so. False where it stays. */
  onShift?: (index: number, by: 1 | -1) => boolean;
  /** Moves a film before another layer, the number of layers being the foot; with it films can be dragged. */
  onMove?: (move: { from: number; before: number }) => void;
  /** Explains heights and arrows under the cut. */
  showKey?: boolean;
  /** The free shape that results, under everything. */
  shape?: Pick<BowFigureProps, "diameter" | "shape" | "deviceSideUp" | "holding" | "exaggeration"> & {
    head: string;
    note: string;
  };
}

const KEY_HEIGHT = 124;
const SHAPE_HEIGHT = 84;

/**
 * The cut: a stack drawn layer by layer on a compressed scale, with its thicknesses, stresses and sources. It is the
 * editor's list of layers: each is one focusable part. Arrow keys move between layers, Enter selects; where films can be
 * moved, they are dragged, or Alt and an arrow key move them.
 */
export function Cut(props: CutProps) {
  const { layers, top, bottom, label, hrefFor, onSelect, onShift, onMove, showKey = false, shape } = props;
  const layout = cutLayout(
    layers.map((layer) => ({
      thickness: layer.thickness,
      name: layer.name,
      notes: layer.assumed ? [...layer.notes, "assumed"] : layer.notes,
    })),
    top.add ? 76 : 58,
  );
  const parts = layers.flatMap((layer, index) => {
    const place = layout.places[index];
    return place ? [{ layer, place, index }] : [];
  });
  const own = useOwnText();
  const { drag, handle } = useCutDrag(layout.places, onMove);
  const endY = layout.bottom + (bottom.add ? 48 : 28);
  const keyY = Math.max(endY, layout.foot) + 28;
  const shapeY = showKey ? keyY + KEY_HEIGHT : Math.max(endY, layout.foot) + 12;
  const height = shape ? shapeY + SHAPE_HEIGHT : showKey ? shapeY : Math.max(endY, layout.foot) + 4;
  return (
    <svg
      className="block h-auto max-w-full"
      width={CUT.width}
      viewBox={`0 0 ${CUT.width} ${height}`}
      role="group"
      aria-label={own(label)}
    >
      <End end={top} y={layout.top - (top.add ? 34 : 14)} />
      <g aria-hidden="true" pointerEvents="none">
        {parts.map(({ layer, place, index }) => (
          <g key={index} opacity={drag?.from === index ? 0.5 : undefined}>
            <CutLayerDrawn layer={layer} place={place} stamp={JSON.stringify([layer, place])} />
          </g>
        ))}
        {parts.map(({ layer, place, index }) =>
          layer.selected ? <Outline key={index} place={place} away={2.5} stroke={colour("copper")} /> : null,
        )}
      </g>
      {parts.map(({ layer, place, index }) => (
        <CutPart
          key={index}
          layer={layer}
          index={index}
          href={hrefFor?.(index)}
          onSelect={onSelect}
          onShift={layer.role === "film" ? onShift : undefined}
          drag={layer.role === "film" ? handle?.(index) : undefined}
        >
          <rect {...labelBox(place)} fill="transparent" />
          <Outline place={place} away={0} className="hover-outline" />
          <Outline place={place} away={5} className="focus-mark" />
        </CutPart>
      ))}
      {drag ? <DropMark y={layout.places[drag.before]?.y ?? layout.bottom} /> : null}
      <End end={bottom} y={layout.bottom + 22} />
      {showKey ? <CutKey y={keyY} /> : null}
      {shape ? <Shape shape={shape} y={shapeY} /> : null}
    </svg>
  );
}

function End({ end, y }: { end: CutEnd; y: number }) {
  return (
    <>
      <text x={CUT.left} y={y} style={{ fontWeight: 600 }}>
        {end.words}
      </text>
      {end.add ? (
        <a className="drawing-link" href={end.add.href} onClick={selectInPlace(end.add.onAdd)}>
          <text x={CUT.left} y={y + 17} style={{ fill: colour("copper"), textDecoration: "underline" }}>
            {end.add.words}
          </text>
          <rect className="focus-mark" x={CUT.left - 4} y={y + 4} width={CUT.right - CUT.left + 8} height="19" />
        </a>
      ) : null}
    </>
  );
}

/** Where the film that is being moved would go. */
function DropMark({ y }: { y: number }) {
  return (
    <path
      d={`M${CUT.left - 10} ${y + 0.5}H${CUT.right + 10}`}
      stroke={colour("copper")}
      strokeWidth="4"
      pointerEvents="none"
    />
  );
}

function Outline(props: { place: CutPlace; away: number; stroke?: string; className?: string }) {
  const { place, away, stroke, className } = props;
  return (
    <rect
      className={className}
      x={CUT.left - away}
      y={place.y - away}
      width={CUT.right - CUT.left + 2 * away}
      height={place.height + 2 * away}
      fill="transparent"
      stroke={stroke}
      strokeWidth={stroke === undefined ? undefined : 2}
    />
  );
}

function Shape({ shape, y }: { shape: NonNullable<CutProps["shape"]>; y: number }) {
  const own = useOwnText();
  return (
    <>
      <path d={`M16 ${y + 0.5}H448`} stroke={colour("line")} />
      <text x="16" y={y + 24} style={{ fontWeight: 600 }}>
        {shape.head}
      </text>
      <text x="16" y={y + 41} style={{ fill: colour("quiet") }}>
        {shape.note}
      </text>
      <g role="img" aria-label={own(`${shape.head}: ${shape.note}`)}>
        <BowFigure
          diameter={shape.diameter}
          shape={shape.shape}
          deviceSideUp={shape.deviceSideUp}
          holding={shape.holding}
          exaggeration={shape.exaggeration}
          x={200}
          y={y + 12}
          width={252}
          height={60}
          margin={10}
          waferStroke={2.6}
        />
      </g>
    </>
  );
}
