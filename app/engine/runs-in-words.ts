/** Numbers, ascending, in words with runs joined: '7', '1 to 12', '3 and 8', '3, 8 and 10 to 12'. */
export function runsInWords(numbers: readonly number[]): string {
  const runs: [from: number, to: number][] = [];
  for (const number of numbers) {
    const last = runs.at(-1);
    if (last && last[1] + 1 === number) last[1] = number;
    else runs.push([number, number]);
  }
  const words = runs.flatMap(([from, to]) =>
    from === to ? [`${from}`] : to === from + 1 ? [`${from}`, `${to}`] : [`${from} to ${to}`],
  );
  const end = words.pop() ?? "";
  return words.length === 0 ? end : `${words.join(", ")} and ${end}`;
}
