import type { ProfilePlotInput } from "#app/components/drawings/profile-plot.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ScanDetail } from "#app/schemas/scan-view.ts";

/** The curves of a scan as the chart takes them; the parabola is drawn where it was fitted. */
export function scanCurves({ parameters, result }: Pick<ScanDetail, "parameters" | "result">): ProfilePlotInput {
  const { curve, from, to } = result;
  const { edgeExclusion } = parameters;
  const radius = (to - from) / 2;
  const fitted = curve.filter(({ x }) => Math.abs(x) <= radius - edgeExclusion);
  return {
    pre: curve.map(({ x, before }) => ({ x, y: before })),
    post: curve.map(({ x, after }) => ({ x, y: after })),
    difference: curve.map(({ x, difference }) => ({ x, y: difference })),
    fit: fitted.map(({ x, fitted: y }) => ({ x, y })),
    radius,
    edgeExclusion,
    formatPosition: (metres) => formatQuantity(metres, "length", { unit: "mm", decimals: 1 }),
    formatHeight: (metres) => formatQuantity(metres, "length", { unit: "µm", decimals: 2 }),
  };
}
