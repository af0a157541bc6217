import { checkCount, checkFinite, checkResult } from "./check-range";

/** Readings against time: seconds from any start, rising; values in one unit throughout. */
export type Series = { timeS: number; value: number }[];
export type Sample = Series[number];

/** Two readings nearer than this are at one time, and a rate between them means nothing. */
const SHORTEST_STEP_S = 1e-6;

/** Throws RangeError unless the series holds `least` finite readings whose times rise. */
export function checkSeries(series: readonly Sample[], least = 1): void {
  checkCount("series", series, least);
  let previous: number | undefined;
  for (const { timeS, value } of series) {
    checkFinite("series.timeS", timeS);
    checkFinite("series.value", value);
    if (previous !== undefined && timeS - previous < SHORTEST_STEP_S)
      // a difference: on a huge time the sum would round the step away
      throw new RangeError(`series.timeS goes from ${previous} to ${timeS}; times must rise.`);
    previous = timeS;
  }
}

/** First and last reading of a checked series, and the time between them. */
export function endsOf(series: readonly Sample[]): { first: Sample; last: Sample; spanS: number } {
  const first = series[0];
  const last = series.at(-1);
  if (!first || !last) throw new RangeError("series holds 0 values; it must hold at least 1.");
  return { first, last, spanS: last.timeS - first.timeS };
}

/** Value at a moment inside the series, on the straight line between its neighbours. */
export function valueAt(series: readonly Sample[], timeS: number): number {
  const { first, last } = endsOf(series);
  if (timeS < first.timeS || timeS > last.timeS)
    throw new RangeError(`timeS is ${timeS}; it must be from ${first.timeS} to ${last.timeS}.`);
  let before = first;
  for (const sample of series) {
    if (sample.timeS >= timeS) {
      const step = sample.timeS - before.timeS;
      const share = step > 0 ? (timeS - before.timeS) / step : 1;
      return checkResult("value", before.value + share * (sample.value - before.value));
    }
    before = sample;
  }
  return last.value;
}
