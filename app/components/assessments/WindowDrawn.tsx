import { useEffect } from "react";
import { Link, useLocation } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { RunBar } from "#app/components/ui/RunBar.tsx";
import { useInBrowser } from "#app/components/ui/use-in-browser.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { BY_SERVER, readSent } from "#app/lib/read-sent.ts";
import type {
  SentWindow,
  WindowDrawing,
  WindowInput,
  WindowPageData,
  WindowQuestion,
} from "#app/schemas/process-window.ts";
import { useFlowRun } from "./use-flow-run.ts";
import { WindowPlot } from "./WindowPlot.tsx";
import { WindowTable } from "./WindowTable.tsx";
import { useOwnUnits } from "#app/components/units/own-units-context.ts";
import { ownHead, type OwnUnits } from "#app/lib/own-units.ts";
import { ownWindow } from "#app/lib/own-window.ts";

interface Props {
  page: WindowPageData;
  /** what there is to draw; null where the server has drawn it */
  question: WindowQuestion | null;
  /** whether another page is on its way */
  waiting: boolean;
}

/** A process window as it is worked out in the browser, or as the server has drawn it. */
export function WindowDrawn({ page: { head, inputs, x, y, drawing }, question, waiting }: Props) {
  const scripted = useInBrowser();
  const { pathname, search } = useLocation();
  const { state, run, stop } = useFlowRun<WindowDrawing>(
    "window",
    drawing ? { kind: "done", found: drawing } : undefined,
  );
  useEffect(() => {
    if (question) run(question);
  }, [question, run]);
  const again = async () => {
    const sent = await readSent<SentWindow>(`/assessments/${head.id}/trial/window${search}`);
    if (!sent.question) throw new Error("the address asks for no window");
    return sent.question;
  };
  const { found } = state;
  const [alongX, alongY] = [x, y].map(({ input }) => inputs.find(({ key }) => key === input) ?? null);
  return (
    <>
      {scripted && head.mayAssess ? (
        <div className="mb-4">
          <RunBar
            state={state}
            label="Places walked"
            noun="places"
            done={found ? `All ${found.walks} places that it takes have been walked.` : ""}
            onStart={() => run(again())}
            onStop={stop}
            otherwise={
              <Link to={`${pathname}${search}${search ? "&" : "?"}${BY_SERVER}`} className="link">
                Let the server draw it
              </Link>
            }
          />
        </div>
      ) : null}
      {found && alongX && alongY ? (
        <article className="frame p-4 tablet:p-6" aria-busy={waiting || state.kind === "running"}>
          <Drawing drawing={found} x={alongX} y={alongY} whole={state.kind === "done"} />
        </article>
      ) : null}
    </>
  );
}

interface DrawingProps {
  drawing: WindowDrawing;
  x: WindowInput;
  y: WindowInput;
  /** false while it has not been looked at closely everywhere that the verdict turns */
  whole: boolean;
}

function Drawing({ drawing, x, y, whole }: DrawingProps) {
  const units = useOwnUnits();
  const names = { x: nameOf(x, units), y: nameOf(y, units) };
  return (
    <>
      <WindowPlot
        drawing={ownWindow(drawing, { x: x.unit, y: y.unit }, units)}
        names={names}
        label={`Verdict over ${names.x} and ${names.y}; the table below says the same in words`}
      />
      <ul className="mt-3 flex flex-wrap gap-x-6 gap-y-1" aria-label="Key">
        {[...new Set(drawing.runs.map(({ outcome }): Outcome => outcome))].map((outcome) => (
          <li key={outcome}>
            <FindingTag outcome={outcome} />
          </li>
        ))}
        <li className="text-quiet">Line: from there on it does not run</li>
        {drawing.planned ? <li className="text-quiet">Ring: as planned</li> : null}
      </ul>
      <WindowTable drawing={drawing} x={x} y={y} />
      <p className="mt-3 max-w-160 text-label text-quiet">
        {drawing.walks} places were walked with all rules at nominal values; the others lie between places that agree.{" "}
        {whole
          ? "An island smaller than four cells of the grid can be missed."
          : "The line is rough until it has been looked at closely: it may still move by four cells of the grid."}
      </p>
    </>
  );
}

const nameOf = ({ label, unit }: WindowInput, units: OwnUnits) =>
  `${label.split(":")[0] ?? label}, ${ownHead(unit, units)}`;
