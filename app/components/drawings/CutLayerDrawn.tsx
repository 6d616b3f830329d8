import { memo } from "react";
import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { CutBand } from "./CutBand.tsx";
import type { CutLayer } from "./cut-layer.ts";
import { CUT, labelBaselines, NAME_SIZE, type CutPlace } from "./cut-layout.ts";

interface PartProps {
  layer: CutLayer;
  place: CutPlace;
}

interface CutLayerDrawnProps extends PartProps {
  /** the same while layer and place say the same */
  stamp: string;
}

/** A layer of the cut with its dimension and its words; drawn anew only when its stamp is another. */
export const CutLayerDrawn = memo(
  function CutLayerDrawn({ layer, place }: CutLayerDrawnProps) {
    return (
      <>
        <LabelWash layer={layer} place={place} />
        <CutBand layer={layer} y={place.y} height={place.height} />
        <Dimension layer={layer} place={place} />
        <Leader layer={layer} place={place} />
        <Words layer={layer} place={place} />
      </>
    );
  },
  (before, after) => before.stamp === after.stamp,
);

/** Where the words of a layer stand. */
export function labelBox(place: CutPlace) {
  return {
    x: CUT.label - 6,
    y: coordinate(place.labelY - place.labelHeight / 2),
    width: CUT.width - CUT.label + 6,
    height: coordinate(place.labelHeight),
  };
}

function LabelWash({ layer, place }: PartProps) {
  if (!layer.selected) return null;
  return (
    <>
      <rect {...labelBox(place)} fill={colour("wash")} />
      <rect {...labelBox(place)} x={CUT.width - 3} width="3" fill={colour("copper")} />
    </>
  );
}

/** Thickness as a dimension line left of the band, the figure right-aligned beside it. */
function Dimension({ layer, place }: PartProps) {
  const x = CUT.dimension;
  const foot = place.y + place.height;
  return (
    <>
      <path
        d={`M${x - 8} ${place.y + 0.5}H${CUT.left - 4}M${x - 8} ${foot + 0.5}H${CUT.left - 4}`}
        stroke={colour("edge")}
        strokeWidth="0.75"
      />
      <path d={`M${x} ${place.y + 1}V${foot}`} stroke={colour("ink")} strokeWidth="0.75" />
      <path d={`M${x} ${place.y + 1}l-2.4 7h4.8zM${x} ${foot}l-2.4 -7h4.8z`} fill={colour("ink")} />
      <text
        x={x - 12}
        y={coordinate(place.y + place.height / 2 + 4.5)}
        textAnchor="end"
        style={{ fontWeight: layer.selected ? 600 : 400 }}
      >
        {layer.thicknessText}
      </text>
    </>
  );
}

function Leader({ layer, place }: PartProps) {
  const from = coordinate(place.y + place.height / 2);
  const paint = colour(layer.selected ? "copper" : "edge");
  return (
    <>
      <path
        d={`M${CUT.right + 9} ${from}h5L${CUT.label - 12} ${coordinate(place.labelY)}H${CUT.label - 6}`}
        fill="none"
        stroke={paint}
        strokeWidth={layer.selected ? 1.5 : 0.75}
      />
      <circle cx={CUT.right + 9} cy={from} r={layer.selected ? 2.5 : 1.8} fill={paint} />
    </>
  );
}

function Words({ layer, place }: PartProps) {
  const baselines = labelBaselines(place);
  return (
    <>
      {place.name.map((line, index) => (
        <text
          key={index}
          x={CUT.label}
          y={baselines.name[index]}
          style={{ fontSize: NAME_SIZE, fontWeight: layer.selected ? 600 : 400 }}
        >
          {line}
        </text>
      ))}
      {place.notes.map((line, index) => {
        const assumed = layer.assumed === true && index === place.notes.length - 1;
        return (
          <text
            key={index}
            x={CUT.label}
            y={baselines.notes[index]}
            style={{ fill: colour(assumed ? "caution" : "quiet"), fontWeight: assumed ? 600 : 400 }}
          >
            {line}
          </text>
        );
      })}
    </>
  );
}
