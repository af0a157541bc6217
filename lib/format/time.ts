const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];
const two = (value: number) => String(value).padStart(2, "0");

/** A calendar day, YYYY-MM-DD, as "4 Dec 2026". */
export function formatDay(day: string): string {
  const [year = "", month = "1", date = "1"] = day.slice(0, 10).split("-");
  return `${Number(date)} ${MONTHS[Number(month) - 1] ?? month} ${year}`;
}

/** An instant, always in UTC and always saying so: "4 Dec 2026, 17:20 UTC". */
export function formatInstant(instant: string | Date): string {
  return `${formatDay(toUtcDay(instant))}, ${formatClock(instant)}${"\u202f"}UTC`;
}

/** The UTC time of day, "17:20". */
export function formatClock(instant: string | Date): string {
  const date = new Date(instant);
  return `${two(date.getUTCHours())}:${two(date.getUTCMinutes())}`;
}

export function toUtcDay(instant: string | Date): string {
  return new Date(instant).toISOString().slice(0, 10);
}

/** A stopwatch's time, mm:ss with whole seconds: 320 s is "5:20". */
export function formatStopwatch(seconds: number): string {
  const whole = Math.round(Math.abs(seconds));
  return `${seconds < 0 && whole > 0 ? "\u2212" : ""}${Math.floor(whole / 60)}:${two(whole % 60)}`;
}

/** A planned or block time in whole minutes: "50 min", "1 h 05". */
export function formatMinutes(minutes: number): string {
  const whole = Math.round(minutes);
  return whole < 60 ? `${whole}${"\u202f"}min` : `${Math.floor(whole / 60)}${"\u202f"}h${"\u202f"}${two(whole % 60)}`;
}

/** Whole UTC days from one day to another; negative when `to` lies before. */
export function daysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);
}
