const HOUR = 3600 * 1000;
const DAY = 24 * HOUR;

/** How long ago something was, in the largest unit that gives a whole number: 'under an hour', '3 hours', '12 days'. */
export function ageWords(since: string, now: Date): string {
  const past = Math.max(0, now.getTime() - new Date(since).getTime());
  if (past < HOUR) return "under an hour";
  const [size, unit] = past < DAY ? [HOUR, "hour"] : [DAY, "day"];
  const count = Math.floor(past / size);
  return `${count} ${unit}${count === 1 ? "" : "s"}`;
}
