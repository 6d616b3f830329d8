import type { FlowChart } from "#app/schemas/flow-comparison.ts";

/** Accessible name of the chart, and its head in a file. */
export const flowChartName = ({ along }: Pick<FlowChart, "along">) =>
  along === "thickness"
    ? "Warp against silicon thickness, let go on the way of thinning, 25\u00A0°C"
    : "Warp along the steps, as it lies, 25\u00A0°C";

/** What the rows of the table are. */
export const TABLE_CAPTION = "Answers, plans and steps of the flows, side by side";
