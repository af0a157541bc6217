/** Every day of the demo is an offset from its demo date, so that the calibrations always cover it. */
export function dayFrom(demoDate: string, offset: number): string {
  return new Date(Date.parse(`${demoDate}T00:00:00Z`) + offset * 86_400_000).toISOString().slice(0, 10);
}

/** "17:20" of a day, as an instant in UTC. */
export function instantOn(demoDate: string, offset: number, hhmm: string): Date {
  return new Date(`${dayFrom(demoDate, offset)}T${hhmm}:00.000Z`);
}

/** The same day a year later, less one: twelve months, both days counted. */
export function twelveMonthsFrom(day: string): string {
  const date = new Date(`${day}T00:00:00Z`);
  date.setUTCFullYear(date.getUTCFullYear() + 1);
  return new Date(date.getTime() - 86_400_000).toISOString().slice(0, 10);
}
