/** Processor time of this process so far, s: other work on the machine does not count, this process's own helper threads do. */
function processorTime() {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
}

/**
 * Shortest of several runs, processor time in seconds: what the work takes when nothing else is in its way.
 *
 * @param {number} runs
 * @param {() => unknown} work
 */
export function shortest(runs, work) {
  let least = Infinity;
  for (let run = 0; run < runs; run += 1) {
    const start = processorTime();
    work();
    least = Math.min(least, processorTime() - start);
  }
  return least;
}

/**
 * The one in the middle.
 *
 * @param {number[]} values an odd number of them
 */
export function median(values) {
  return values.toSorted((a, b) => a - b)[values.length >> 1];
}

/**
 * Slope of time against size on logarithmic scales, by least squares: 1 is linear.
 *
 * @param {number[]} sizes
 * @param {number[]} times
 */
export function slope(sizes, times) {
  const [x, y] = [sizes.map(Math.log), times.map(Math.log)];
  const mean = (values) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const [mx, my] = [mean(x), mean(y)];
  const above = x.reduce((sum, value, n) => sum + (value - mx) * (y[n] - my), 0);
  return above / x.reduce((sum, value) => sum + (value - mx) ** 2, 0);
}

/**
 * Standard deviation of a sample.
 *
 * @param {number[]} values
 */
export function scatter(values) {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (values.length - 1));
}
