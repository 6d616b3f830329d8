import { colour } from "#app/components/drawings/colour.ts";
import { coordinate } from "#app/components/drawings/coordinate.ts";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { HatchBox } from "#app/components/drawings/HatchBox.tsx";
import { OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { adhesiveBands, type AdhesiveTemperatures, type Band } from "#app/lib/adhesive-bands.ts";
import { useOwnText } from "#app/components/units/OwnFigure.tsx";
import { useOwnUnits } from "#app/components/units/own-units-context.ts";
import { ownScale, type OwnScale } from "#app/lib/own-units.ts";
import { multiples } from "#app/components/drawings/plot-ticks.ts";

interface Props {
  temperatures: AdhesiveTemperatures;
  bond: number;
  release: number;
}

const ZERO = 273.15;
const WIDTH = 640;
const LEFT = 104;
const RIGHT = 40;
const ROW = 30;
const BOX = 18;

const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });
const spoken = (bands: Band[]) =>
  bands.map(({ from, to, outcome }) => `${outcome} from ${celsius(from)} to ${celsius(to)}`).join(", ");

/** The temperatures of a bonding material on one scale: where a step on it is clear, and where it bonds and lets go. */
export function TemperatureBand({ temperatures, bond, release }: Props) {
  const own = useOwnText();
  const { softening, flows, limit } = temperatures;
  const hottest = Math.max(limit, bond, release, softening ?? 0) - ZERO;
  const end = Math.ceil((hottest + 20) / 50) * 50;
  const x = (kelvin: number) => LEFT + ((kelvin - ZERO) / end) * (WIDTH - LEFT - RIGHT);
  const { unit, ticks } = ticksOf(end, ownScale("°C", useOwnUnits()));
  const range = { from: ZERO, to: ZERO + end };
  const inAir = adhesiveBands(temperatures, { ...range, vacuum: false });
  const inVacuum = adhesiveBands(temperatures, { ...range, vacuum: true });
  const rows = flows
    ? [
        { name: "Step in air", bands: inAir },
        { name: "Step in vacuum", bands: inVacuum },
      ]
    : [{ name: "Any step", bands: inAir }];
  const marks = [
    ...(softening === null ? [] : [{ name: flows ? "Flows from" : "Softens at", at: softening }]),
    { name: "Bonds at", at: bond },
    { name: "Lets go at", at: release },
    { name: "Limit", at: limit },
  ];
  const outcomes = new Set<Outcome>(rows.flatMap(({ bands }) => bands.map(({ outcome }) => outcome)));
  const axis = (rows.length + marks.length) * ROW + 4;
  const words = [
    ...rows.map(({ name, bands }) => `${name}: ${spoken(bands)}`),
    ...marks.map(({ name, at }) => `${name} ${celsius(at)}`),
  ].join(". ");
  return (
    <figure className="max-tablet:hidden">
      <svg
        className="block h-auto max-w-full"
        width={WIDTH}
        viewBox={`0 0 ${WIDTH} ${axis + 24}`}
        role="img"
        aria-label={own(words)}
      >
        {rows.map(({ name, bands }, index) => (
          <g key={name}>
            <RowName y={index * ROW}>{name}</RowName>
            {bands.map(({ from, to, outcome }) => (
              <HatchBox
                key={from}
                level={OUTCOME_SIGNS[outcome].level}
                x={x(from)}
                y={index * ROW + 4}
                width={x(to) - x(from)}
                height={BOX}
              />
            ))}
          </g>
        ))}
        {marks.map(({ name, at }, index) => (
          <Mark key={name} name={name} x={x(at)} y={(rows.length + index) * ROW} words={celsius(at)} foot={axis} />
        ))}
        <path d={`M${LEFT} ${axis + 0.5}H${WIDTH - RIGHT}`} stroke={colour("ink")} />
        {ticks.map(({ kelvin, text }, index) => (
          <g key={text}>
            <path d={`M${coordinate(x(kelvin))} ${axis}v5`} stroke={colour("ink")} />
            <text x={coordinate(x(kelvin))} y={axis + 19} textAnchor="middle" style={{ fill: colour("quiet") }}>
              {index === ticks.length - 1 ? `${text}\u00A0${unit}` : text}
            </text>
          </g>
        ))}
      </svg>
      <figcaption className="mt-2 flex flex-wrap gap-x-5 gap-y-1 text-label">
        {[...outcomes].map((outcome) => (
          <FindingTag key={outcome} outcome={outcome} />
        ))}
      </figcaption>
    </figure>
  );
}

/** Every 50 °C from 0 °C on, or every 100 °F. */
function ticksOf(end: number, scale: OwnScale | null) {
  const at = (degrees: number, kelvin: number) => ({ text: String(degrees), kelvin });
  if (!scale) return { unit: "°C", ticks: multiples(50, 0, end).map((degrees) => at(degrees, ZERO + degrees)) };
  const degrees = multiples(100, scale.of(ZERO), scale.of(ZERO + end));
  return { unit: scale.symbol, ticks: degrees.map((each) => at(each, scale.si(each))) };
}

function RowName({ y, children }: { y: number; children: string }) {
  return (
    <text x={0} y={y + 17} style={{ fill: colour("quiet") }}>
      {children}
    </text>
  );
}

/** A temperature on a row of its own, with a leader down to the scale. */
function Mark({ name, x, y, words, foot }: { name: string; x: number; y: number; words: string; foot: number }) {
  const right = x < WIDTH - 80;
  return (
    <g>
      <RowName y={y}>{name}</RowName>
      <path d={`M${coordinate(x)} ${y + 13}V${foot}`} stroke={colour("edge")} strokeWidth="0.75" />
      <circle cx={coordinate(x)} cy={y + 13} r="3" fill={colour("ink")} />
      <text
        x={coordinate(right ? x + 8 : x - 8)}
        y={y + 17}
        textAnchor={right ? "start" : "end"}
        style={{ fontWeight: 600 }}
      >
        {words}
      </text>
    </g>
  );
}
