/** Accessible name of the chart, and its head in a file. */
export const chartName = (temperature: string) => `Warp against silicon thickness, free wafers, ${temperature}`;
