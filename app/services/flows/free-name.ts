const LONGEST_NAME = 120;

/** The name, or 'Name, 2', 'Name, 3', … : the first that is free. */
export function freeName(name: string, taken: ReadonlySet<string>): string {
  if (!taken.has(name)) return name;
  for (let count = 2; ; count++) {
    const suffix = `, ${count}`;
    const candidate = name.slice(0, LONGEST_NAME - suffix.length) + suffix;
    if (!taken.has(candidate)) return candidate;
  }
}
