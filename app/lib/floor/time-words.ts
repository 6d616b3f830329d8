const MINUTE = 60;
const HOUR = 3600;
const DAY = 24 * HOUR;

/** A time that hands can plan by, never longer than it is: '2 d 5 h', '3 h 20 min', '12 min'. */
export function timeWords(seconds: number): string {
  const whole = Math.floor(Math.abs(seconds) / MINUTE) * MINUTE;
  const [days, hours, minutes] = [Math.floor(whole / DAY), Math.floor((whole % DAY) / HOUR), (whole % HOUR) / MINUTE];
  if (days > 0) return hours > 0 ? `${days}\u00A0d ${hours}\u00A0h` : `${days}\u00A0d`;
  if (hours > 0) return minutes > 0 ? `${hours}\u00A0h ${minutes}\u00A0min` : `${hours}\u00A0h`;
  return `${minutes}\u00A0min`;
}
