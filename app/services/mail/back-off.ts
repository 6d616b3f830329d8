/** After this many attempts a mail is parked. */
export const MOST_ATTEMPTS = 14;
const SHORTEST = 5_000;
const LONGEST = 2 * 60 * 60_000;

/**
 * How long to wait before the next attempt, milliseconds: twice as long each time, up to two hours, and a quarter more or less, so
 * that all that waits for one mail server does not come back at once. Some seven hours until the last.
 * @param attempts made so far, from 1
 * @param random from 0 to 1
 */
export function backOff(attempts: number, random: number): number {
  return Math.min(SHORTEST * 2 ** (attempts - 1), LONGEST) * (0.75 + random / 2);
}
