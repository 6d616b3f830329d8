import type { Holding } from "#app/engine/vocabulary.ts";
import { bandPath, linePath, offsetCurve, type BowCurve } from "./bow-curve.ts";
import { drawBow, type BowShape } from "./bow-shape.ts";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { textWidth } from "./text-width.ts";

export interface BowFigureProps {
  /** Wafer diameter, m. */
  diameter: number;
  shape: BowShape;
  /** Which face is up on the tool. The device side carries a thin second line. */
  deviceSideUp: boolean;
  holding: Holding;
  exaggeration: number;
  width: number;
  height: number;
  x?: number;
  y?: number;
  /** Clear space left and right of the rim, px. */
  margin?: number;
  /** Prints the exaggeration at the right, needed wherever it is not the page's. */
  showScale?: boolean;
  waferStroke?: number;
  carrierThickness?: number;
  /** Leaves the datum out where the drawing around it has its own. */
  withoutDatum?: boolean;
}

const FRAME_ROOM = 12;
/** Clearance between the wafer's lower edge and what holds it, px: the device line lies in it when it faces down. */
const GAP = 1.4;

/**
 * The bow line itself, for use inside another drawing. Wafer in silicon colour; device side a thin copper line just
 * outside its edge; datum a chain line through the rim. What holds it lies below: a carrier is a closed band, tape a
 * dashed line, a film frame also has open squares at the rim, an edge ring only the squares, a thin-wafer gripper two
 * jaws at the rim; bare has nothing. So support reads without colour.
 */
export function BowFigure(props: BowFigureProps) {
  const { diameter, shape, deviceSideUp, holding, exaggeration, width, height } = props;
  const { x = 0, y = 0, margin = 6, showScale = false, withoutDatum = false } = props;
  const stroke = props.waferStroke ?? (height > 40 ? 2.4 : 2);
  const carrier = props.carrierThickness ?? (height > 40 ? 5 : 4);
  const scaleText = `×${shape.kind === "rolled" ? 1 : exaggeration}`;
  const textRoom = showScale ? textWidth(scaleText, 12.5) + 5 : 0;
  const ringed = holding === "film frame" || holding === "edge ring" || holding === "thin-wafer gripper";
  const field = width - textRoom;
  const drawn = drawBow(shape, diameter, exaggeration, {
    width: field - 2 * margin - (ringed ? FRAME_ROOM : 0),
    height: height - stroke,
    middleY: height / 2,
  });
  const edge = stroke / 2;
  return (
    <g transform={`translate(${coordinate(x + field / 2)} ${coordinate(y)})`}>
      {withoutDatum ? null : <Datum halfWidth={field / 2 - 1} y={drawn.datumY} />}
      <Support holding={holding} curve={drawn.curve} edge={edge} carrier={carrier} deviceSideUp={deviceSideUp} />
      {drawn.across ? (
        <path d={linePath(drawn.across)} fill="none" stroke={colour("silicon")} strokeWidth="1" strokeDasharray="5 3" />
      ) : null}
      <path d={linePath(drawn.curve)} fill="none" stroke={colour("silicon")} strokeWidth={stroke} />
      <path
        d={linePath(drawn.curve, deviceSideUp ? edge + 0.7 : -(edge + 0.7))}
        fill="none"
        stroke={colour("copper")}
        style={{ strokeWidth: "var(--bow-device-weight)" }}
      />
      {showScale ? (
        <text x={coordinate(field / 2 + 3)} y={height / 2 + 4.5}>
          {scaleText}
        </text>
      ) : null}
    </g>
  );
}

function Datum({ halfWidth, y }: { halfWidth: number; y: number }) {
  return (
    <path
      d={`M${coordinate(-halfWidth)} ${coordinate(y)}H${coordinate(halfWidth)}`}
      fill="none"
      stroke={colour("edge")}
      strokeWidth="0.75"
      strokeDasharray="8 2 1.5 2"
    />
  );
}

function Support(props: { holding: Holding; curve: BowCurve; edge: number; carrier: number; deviceSideUp: boolean }) {
  const { holding, curve, edge, carrier, deviceSideUp } = props;
  // Clear of the device line where that faces the tape.
  const tape = (
    <path
      d={linePath(curve, -(edge + (deviceSideUp ? 2.4 : 3.6)))}
      fill="none"
      stroke={colour("ink")}
      strokeDasharray="3 2"
    />
  );
  switch (holding) {
    case "bare":
      return null;
    case "carrier":
      return (
        <path
          d={bandPath(curve, -(edge + GAP), -(edge + GAP + carrier))}
          fill="var(--bow-carrier-fill)"
          stroke={colour("quiet")}
          style={{ strokeWidth: "var(--bow-carrier-weight)" }}
        />
      );
    case "grinding tape":
      return tape;
    case "film frame":
      return (
        <>
          {tape}
          <RimSquares curve={curve} away={4} down={edge + 2} />
        </>
      );
    case "edge ring":
      return <RimSquares curve={curve} away={-2.5} down={edge + 4} />;
    case "thin-wafer gripper":
      return <Jaws curve={curve} />;
  }
}

/** Open squares at both rims: a frame around the wafer, or a ring beneath its edge (`away` negative). */
function RimSquares({ curve, away, down }: { curve: BowCurve; away: number; down: number }) {
  const [x, y] = offsetCurve(curve, 0).end;
  return (
    <>
      {[-1, 1].map((side) => (
        <rect
          key={side}
          x={coordinate(side * (x + away) - 2.5)}
          y={coordinate(y + down - 3)}
          width="5"
          height="6"
          fill={colour("raised")}
          stroke={colour("ink")}
        />
      ))}
    </>
  );
}

/** Brackets that grip the rim from both sides. */
function Jaws({ curve }: { curve: BowCurve }) {
  const [x, y] = offsetCurve(curve, 0).end;
  const d = [-1, 1]
    .map((side) => {
      const inner = coordinate(side * (x - 2));
      const outer = coordinate(side * (x + 4));
      return `M${inner} ${coordinate(y - 5)}H${outer}V${coordinate(y + 5)}H${inner}`;
    })
    .join("");
  return <path d={d} fill="none" stroke={colour("ink")} />;
}
