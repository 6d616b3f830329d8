import { AnswerLine, type AnswerFigure } from "#app/components/drawings/AnswerLine.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { AnalysisWorkings } from "#app/components/film-analysis/AnalysisWorkings.tsx";
import { BothStresses } from "#app/components/film-analysis/BothStresses.tsx";
import { BudgetTable } from "#app/components/film-analysis/BudgetTable.tsx";
import { MistakeList } from "#app/components/film-analysis/MistakeList.tsx";
import { ScanInputs } from "#app/components/scans/ScanInputs.tsx";
import { formatWithUncertainty } from "#app/engine/units/format.ts";
import { waferAnswer } from "#app/lib/wafer-answer.ts";
import type { FilmAnalysis, ShapeView } from "#app/schemas/film-analysis.ts";
import type { FilmOnWafer, WaferPage } from "#app/schemas/wafer-page.ts";
import { DirectionsTable } from "./DirectionsTable.tsx";
import { ScanLines } from "./ScanLines.tsx";
import { ShapeSection } from "./ShapeSection.tsx";

/** A film on a wafer: the answer, the shape as maps and figures, the stress with its budget, what may be wrong. */
export function WaferView({ wafer, film }: { wafer: WaferPage; film: FilmOnWafer }) {
  const { analysis, fault, remarks, scans, parameters } = film;
  const about = (
    <div className="grid border-t border-ink wide:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
      <div className="min-w-0 p-4 tablet:p-6">
        <ScanLines scans={scans} />
        {remarks.map((remark) => (
          <p key={remark} className="mt-1">
            <b className="text-caution">Caution. </b>
            {noBreak(remark)}
          </p>
        ))}
      </div>
      <div className="min-w-0 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
        <ScanInputs parameters={parameters} placed={null} />
      </div>
    </div>
  );
  if (!analysis)
    return (
      <div className="frame">
        <p className="p-4 tablet:p-6">{fault}</p>
        {about}
      </div>
    );
  return (
    <div className="frame">
      <p className="print-only border-b border-line p-4">
        Wafer {wafer.name}
        {wafer.lot && `, lot ${wafer.lot.name}`}
        {wafer.slot !== null && `, slot ${wafer.slot}`}, program {wafer.program.name}. {film.name ?? "Film not named"}.
      </p>
      <AnswerLine
        figuresBelow
        level={2}
        sentences={waferAnswer(film.name ?? wafer.name, analysis)}
        figures={figuresOf(analysis)}
      />
      <div className="border-t border-ink p-4 tablet:p-6">
        <MistakeList mistakes={analysis.mistakes} />
      </div>
      <div className="space-y-6 border-t border-ink p-4 tablet:p-6">
        <DirectionsTable directions={analysis.directions} />
        <Shapes analysis={analysis} azimuths={[...new Set(scans.flatMap(({ azimuth }) => azimuth ?? []))]} />
      </div>
      <div className="grid border-t border-ink wide:grid-cols-2">
        <div className="min-w-0 p-4 tablet:p-6">
          <BothStresses stress={analysis.stress} directional={analysis.directional} />
        </div>
        <div className="min-w-0 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
          <BudgetTable budget={analysis.budget} stress={analysis.stress.stoney} />
        </div>
      </div>
      {about}
      <div className="border-t border-ink p-4 tablet:p-6 print:hidden">
        <AnalysisWorkings workings={analysis.workings} />
      </div>
    </div>
  );
}

function Shapes({ analysis, azimuths }: { analysis: FilmAnalysis; azimuths: number[] }) {
  const { shape, directions, gravity } = analysis;
  const of: Record<ShapeView["of"], keyof FilmAnalysis["directions"]> = {
    "after the film": "after",
    "before the film": "before",
    "change by the film": "change",
  };
  return (
    <section aria-labelledby="shape" className="space-y-6">
      <div>
        <h2 id="shape" className="font-semibold">
          Shape over the wafer
        </h2>
        {["why" in shape ? [shape.why] : [gravity, ...shape.remarks]].flat().map((sentence) => (
          <p key={sentence} className="max-w-[60em] text-quiet">
            {noBreak(sentence)}
          </p>
        ))}
      </div>
      {"shapes" in shape &&
        shape.shapes.map((each) => (
          <ShapeSection key={each.of} shape={each} directions={directions[of[each.of]]} azimuths={azimuths} />
        ))}
    </section>
  );
}

function figuresOf({ stress, directions, shape }: FilmAnalysis): AnswerFigure[] {
  const quiet = (text: string) => <span className="text-quiet">{text}</span>;
  const working = (
    <a href="#workings" className="link">
      Working
    </a>
  );
  const after = "shapes" in shape ? shape.shapes.find(({ of }) => of === "after the film") : undefined;
  const figure = (name: string, sign: boolean) => {
    const found = after?.figures.find((one) => one.name === name);
    return found
      ? formatWithUncertainty(found.value.value, found.value.uncertainty, "length", { unit: "µm", sign })
      : "not told";
  };
  const best = stress.differs ? stress.full : stress.stoney;
  return [
    {
      label: "Film stress, k = 2",
      value:
        best && stress.full
          ? formatWithUncertainty(best.value, best.uncertainty, "stress", { unit: "MPa" })
          : "not given",
      working,
    },
    {
      label: "Mean change of curvature, k = 2",
      value: formatWithUncertainty(directions.change.mean.value, directions.change.mean.uncertainty, "curvature", {
        unit: "1/km",
        sign: true,
      }),
      working: quiet(directions.change.all?.word ?? "of the lines that there are"),
    },
    { label: "Bow after the film, k = 2", value: figure("bow", true), working: quiet("three points; dome positive") },
    { label: "Warp after the film, k = 2", value: figure("warp", false), working: quiet("from the best-fit plane") },
  ];
}
