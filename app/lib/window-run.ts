import { EngineInputError } from "#app/engine/errors.ts";
import { processWindow } from "#app/engine/window/window.ts";
import type { WindowDrawing, WindowQuestion } from "#app/schemas/process-window.ts";
import { windowDrawing } from "./window-drawing.ts";
import { windowChoices } from "./window-inputs.ts";
import type { Run } from "./worker-run.ts";

/**
 * The verdict of a flow over two of its inputs, ready to be drawn; drawn roughly as soon as it has been looked at everywhere once. The
 * same on the server and in a worker.
 * @throws EngineInputError when an input is none of the flow's or today's engine refuses the flow
 */
export function* windowRun({ flow, limits, x, y, step }: WindowQuestion): Run<WindowDrawing> {
  const choices = windowChoices(flow);
  const axisOf = ({ input, from, to }: WindowQuestion["x"]) => {
    const choice = choices.find(({ key }) => key === input);
    if (!choice) throw new EngineInputError("input", "the flow has no such input");
    return { ...choice, from, to };
  };
  const axes = { x: axisOf(x), y: axisOf(y) };
  const search = processWindow(flow, limits, axes, { step });
  for (;;) {
    const next = search.next();
    if (next.done) return windowDrawing(next.value, axes);
    const { done, of, soFar } = next.value;
    yield {
      done,
      of,
      found: () => {
        const known = soFar();
        return known && windowDrawing(known, axes);
      },
    };
  }
}
