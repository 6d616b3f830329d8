export interface Run<T> {
  value: T;
  /** Index of the first member. */
  from: number;
  /** Index after the last member. */
  to: number;
}

/** Neighbouring equal values of a list as runs, in order. */
export function runsOf<T>(values: readonly T[]): Run<T>[] {
  const runs: Run<T>[] = [];
  values.forEach((value, index) => {
    const last = runs.at(-1);
    if (last && last.value === value) last.to = index + 1;
    else runs.push({ value, from: index, to: index + 1 });
  });
  return runs;
}
