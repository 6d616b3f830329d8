import { BothStresses } from "#app/components/film-analysis/BothStresses.tsx";
import { BudgetTable } from "#app/components/film-analysis/BudgetTable.tsx";
import { MistakeList } from "#app/components/film-analysis/MistakeList.tsx";
import { AnswerLine, type AnswerFigure } from "#app/components/drawings/AnswerLine.tsx";
import { ProfileChart } from "#app/components/charts/ProfileChart.tsx";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { bowWord, COVERAGE, scanAnswer, stressText } from "#app/lib/scan-answer.ts";
import { scanRemarks } from "#app/lib/scan-remarks.ts";
import type { ScanDetail } from "#app/schemas/scan-view.ts";
import { ScanBudget } from "./ScanBudget.tsx";
import { ScanReading } from "./ScanReading.tsx";
import { ScanRemarks } from "./ScanRemarks.tsx";
import { ScanWorking } from "./ScanWorking.tsx";
import { scanCurves } from "./scan-curves.ts";
import { ScanInputs } from "./ScanInputs.tsx";
import { OwnHead } from "#app/components/units/OwnFigure.tsx";

/** A scan on its sheet: the answer, the curves, where the uncertainty comes from, how the files were read. */
export function ScanView({ scan }: { scan: ScanDetail }) {
  const { label, film, parameters, result, files, analysis } = scan;
  const mm = (metres: number) => formatQuantity(metres, "length", { unit: "mm", significant: 3, trim: true });
  return (
    <div className="frame">
      <AnswerLine
        figuresBelow
        level={2}
        sentences={scanAnswer(label, film, withTool(scan))}
        figures={figuresOf({ ...scan, result: withTool(scan) })}
      />
      <div className="border-t border-ink p-4 tablet:px-6">
        <ScanRemarks remarks={scanRemarks(parameters, result)} />
      </div>
      {analysis && (
        <div className="border-t border-ink p-4 tablet:px-6">
          <MistakeList mistakes={analysis.mistakes} />
        </div>
      )}
      <div className="grid border-t border-ink wide:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <div className="min-w-0">
          <section className="p-4 tablet:p-6" aria-labelledby="profile">
            <h2 id="profile" className="mb-2 font-semibold">
              Profile, <OwnHead unit="µm" />
            </h2>
            <ProfileChart
              data={scanCurves(scan)}
              label={`Profile of ${label} before and after the film`}
              summary={`Both scans levelled at the middle, their difference and the parabola fitted to it; ${mm(parameters.edgeExclusion)} at either end left out of the fit, ${result.used} points used.`}
            />
          </section>
          {!result.curled && (
            <div className="grid border-t border-line tablet:grid-cols-2 print:grid-cols-1">
              <div className="min-w-0 space-y-6 p-4 tablet:p-6">
                {analysis ? (
                  <>
                    <BothStresses stress={analysis.stress} directional={null} />
                    <BudgetTable budget={analysis.budget} stress={analysis.stress.stoney} />
                  </>
                ) : (
                  <ScanBudget result={result} />
                )}
              </div>
              <div className="min-w-0 border-line p-4 max-tablet:border-t tablet:border-l tablet:p-6">
                <ScanWorking working={scan.working} />
              </div>
            </div>
          )}
        </div>
        <div className="min-w-0 space-y-6 border-ink p-4 max-wide:border-t tablet:p-6 wide:border-l">
          <ScanInputs parameters={parameters} placed={scan.placed} />
          <ScanReading
            which="before"
            file={files.before}
            reading={result.before}
            parameters={parameters}
            drawn={result.curve.length}
          />
          <ScanReading
            which="after"
            file={files.after}
            reading={result.after}
            parameters={parameters}
            drawn={result.curve.length}
          />
        </div>
      </div>
    </div>
  );
}

/** The result with the uncertainty that also knows the instrument. */
function withTool({ result, analysis }: ScanDetail): ScanDetail["result"] {
  if (!analysis) return result;
  return { ...result, stressUncertainty: analysis.stress.stoney.uncertainty / COVERAGE };
}

function figuresOf({ result }: ScanDetail): AnswerFigure[] {
  const { curvatureChange, curvatureUncertainty, rms, bowChange } = result;
  const curvature = formatWithUncertainty(curvatureChange, COVERAGE * curvatureUncertainty, "curvature", {
    unit: "1/km",
    sign: true,
  });
  const left = formatQuantity(rms, "length", { significant: 2 });
  const share = result.curled || bowChange === 0 ? null : rms / Math.abs(bowChange);
  return [
    stressFigure(result),
    {
      label: "Curvature change, k = 2",
      value: curvature,
      working: <span className="text-quiet">{curvatureChange >= 0 ? "towards a bowl" : "towards a dome"}</span>,
    },
    shapeFigure(result),
    {
      label: "Left over after the fit",
      value: left,
      working: (
        <span className="text-quiet">
          {share === null || share > 1
            ? "root mean square"
            : `${formatQuantity(share, "fraction", { unit: "%", significant: 2 })} of the bow change`}
        </span>
      ),
    },
  ];
}

function stressFigure(result: ScanDetail["result"]): AnswerFigure {
  const working = (
    <a href="#working" className="link">
      Working
    </a>
  );
  if (!result.curled) return { label: "Stress, k = 2", value: stressText(result), working };
  return {
    label: "Stress",
    value: "not given",
    working: <span className="text-quiet">outside the relation’s range</span>,
  };
}

/** The bow change; of a wafer that has rolled, the radius of its roll and how far its edges lift. */
function shapeFigure({ curled, bowChange, bowUncertainty }: ScanDetail["result"]): AnswerFigure {
  if (curled)
    return {
      label: "Rolls up, radius",
      value: formatQuantity(curled.rollRadius, "length", { unit: "m", significant: 2 }),
      working: (
        <span className="text-quiet">
          edges lift {formatQuantity(curled.edgeLift, "length", { unit: "mm", significant: 2 })}; do not release
        </span>
      ),
    };
  return {
    label: "Bow change, k = 2",
    value: formatWithUncertainty(bowChange, COVERAGE * bowUncertainty, "length", { unit: "µm", sign: true }),
    working: <span className="text-quiet">{bowWord(bowChange, bowUncertainty)}</span>,
  };
}
