const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

/** An age as people say it: "14 min", "3 h", "2 d". Rounded down, so that nothing reads older than it is. */
export function ageWords(age_ms: number): string {
  if (age_ms < MINUTE_MS) return 'now';
  if (age_ms < HOUR_MS) return `${Math.floor(age_ms / MINUTE_MS)} min`;
  if (age_ms < 2 * DAY_MS) return `${Math.floor(age_ms / HOUR_MS)} h`;
  return `${Math.floor(age_ms / DAY_MS)} d`;
}

/** "14 min ago", "now". */
export function agoWords(age_ms: number): string {
  return age_ms < MINUTE_MS ? 'now' : `${ageWords(age_ms)} ago`;
}

/** Clock time of the lab: "16:12". */
export function clockWords(wall_ms: number, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', timeZone: zone }).format(
    wall_ms,
  );
}

/** "11 Dec". */
export function dayWords(wall_ms: number, zone: string): string {
  return new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', timeZone: zone }).format(wall_ms);
}

/** "11 Dec 16:12". */
export function momentWords(wall_ms: number, zone: string): string {
  return `${dayWords(wall_ms, zone)} ${clockWords(wall_ms, zone)}`;
}
