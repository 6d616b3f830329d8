/** Accessible name of the chart, and its head in a file. */
export const chartName = (temperature: string) => `Warp against silicon thickness, free wafers, ${temperature}`;

/** What the rows of the table are. */
export const TABLE_CAPTION = "Figures and inputs of the stacks, side by side";
