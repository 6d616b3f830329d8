import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { SUPPORT_SIGNS } from "#app/components/drawings/severity.ts";
import { HatchBox } from "#app/components/drawings/HatchBox.tsx";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import type { FloorSheet } from "#app/schemas/floor-view.ts";

const EDGES = {
  bare: "border-clear",
  "thin-wafer gripper": "border-caution",
  "tape or ring": "border-caution",
  carrier: "border-need",
  "none fits": "border-stop",
} as const;

/** The one command of a step with its hatch, the wafer as it lies, and the figures that hands need. */
export function StepCommand({ sheet, step }: { sheet: FloorSheet; step: FloorStep }) {
  const { number, title, tool, command, why, planned, stopped, bow, shape, stop, holding } = step;
  const level = stopped ? "stop" : SUPPORT_SIGNS[planned].level;
  const last = sheet.steps.at(-1)?.number ?? number;
  return (
    <>
      <p className="text-lead text-quiet">
        Step {number} of {last}
        {tool !== null && `, ${tool}`}
      </p>
      <h1 className="text-answer font-medium wrap-anywhere">{title}</h1>
      <div className={`mt-3 flex items-stretch border-2 bg-raised ${stopped ? "border-stop" : EDGES[planned]}`}>
        <span className="relative w-14 flex-none overflow-hidden">
          <svg
            className="absolute inset-0 size-full"
            viewBox="0 0 56 160"
            preserveAspectRatio="xMidYMin slice"
            aria-hidden
          >
            <HatchBox level={level} x={0} y={-1} width={57} height={400} scale={1.04} />
          </svg>
        </span>
        <div className="min-w-0 p-4 tablet:px-5">
          <p className="text-answer font-semibold tablet:text-floor">{command}</p>
          <p className="text-lead tablet:text-figure">{why}</p>
          {step.heldBy !== planned && (
            <p className="mt-1 text-lead">
              {SUPPORT_SIGNS[planned].word}: {step.heldBy}
            </p>
          )}
        </div>
      </div>
      <div className="mt-3 grid items-center gap-x-6 gap-y-2 tablet:grid-cols-[minmax(0,350px)_minmax(0,1fr)]">
        <figure className="min-w-0">
          <BowLine
            diameter={sheet.diameter}
            shape={bow.shape}
            deviceSideUp={bow.deviceSideUp}
            holding={bow.holding}
            exaggeration={sheet.exaggeration}
            width={350}
            height={80}
            label={`The wafer as it lies: ${shape.join(", ")}, ${step.sideUp}, ${holding}`}
          />
          <figcaption className="text-body text-quiet">
            {step.sideUp}, as it lies on the tool, drawn ×{bow.shape.kind === "rolled" ? 1 : sheet.exaggeration}
          </figcaption>
        </figure>
        <div className="text-lead">
          {shape.map((line) => (
            <p key={line} className="text-figure font-semibold">
              {line}
            </p>
          ))}
          <p>
            Stop: {stop.lines.join("; ")}, {stop.how}
          </p>
        </div>
      </div>
      <dl className="mt-3 grid grid-cols-2 border-y border-line text-lead tablet:grid-cols-4">
        <Fact name="Silicon" value={step.silicon} />
        <Fact name="Hottest here" value={step.hottest} />
        <Fact name="Side up" value={step.sideUp} />
        <Fact
          name={step.bond?.flows ? "Bond flows from" : "Bond takes up to"}
          value={step.bond ? (step.bond.flows ?? step.bond.limit) : "no bond"}
        />
      </dl>
      {step.bond && (
        <p className="mt-2 text-lead text-quiet">
          On {step.bond.carrier}, bonded with {step.bond.material}, which takes up to {step.bond.limit}
        </p>
      )}
    </>
  );
}

function Fact({ name, value }: { name: string; value: string }) {
  return (
    <div className="py-2 pr-3">
      <dt className="text-body text-quiet">{name}</dt>
      <dd className="text-figure font-semibold">{value}</dd>
    </div>
  );
}
