import { HIGHEST_ALTITUDE_M, hotDayAmbient, LOWEST_ALTITUDE_M } from "./atmosphere";
import { rateUncertainty } from "./calibration";
import { checkFinite, checkOneOf, checkPositive, checkRange, checkResult } from "./check-range";
import { checkSeries, endsOf, type Sample, type Series } from "./series";
import { fitLine } from "./straight-line";
import { COMPLETION_RULES, type CompletionRule, HOT_DAY_RULES, type HotDayBasis, type HotDayRule, type Reason } from "./words";

export type { HotDayRule, Sample, Series };

/** [CFR-25.1045] (a): stabilised is a change of less than 2 °F a minute; in °C or K a minute. */
export const STABILISED_PER_MIN = 2 / 1.8;
/** [CS-22.1047] (a): the climb goes on for five minutes after the highest temperature. */
export const PAST_PEAK_S = 300;
const SHORTEST_WINDOW_S = 120;
const BARREL_FACTOR = 0.7; // [CFR-25.1043] (d), exact
const TIME_ROUNDING_S = 1e-6;

export type HotDayTemperature = { hotDayK: number; differenceK: number; clamped: boolean; expandedUncertaintyK?: number };

/**
 * A measured temperature carried to the hot day.
 *
 *     plus-one: T + (T_hot − T_amb)    barrel: T + 0.7 (T_hot − T_amb)    ratio: T · T_hot/T_amb, kelvins
 *     U = √(U_T² + (k U_amb)²), k = 1 or 0.7; ratio: r √(U_T² + (T/T_amb · U_amb)²), r = T_hot/T_amb
 *
 * Source    [CFR-23.1043] (c) plus-one, [CFR-25.1043] (d) barrel; ratio is plain physics for air after a compressor, no source claimed.
 * Inputs    measuredK true; ambientK at the moment the highest value first occurs, at that height; both U with k = 2.
 * Domain    measured 150 to 2,000 K, ambient 180 to 340 K, altitude −2,000 to 20,000 m.
 * Throws    RangeError outside the domain or for an unknown word.
 * Accuracy  plus-one over-corrects on a cold day. On a day hotter than the hot day nothing is subtracted: hotDayK is the measured value,
 *           clamped is true, differenceK stays negative. U is left out where either part is not known; "none" needs no ambient part.
 */
export function hotDayTemperature(input: {
  measuredK: number;
  ambientK: number;
  pressureAltitudeM: number;
  rule: HotDayRule;
  basis: HotDayBasis;
  expandedUncertaintyK?: number;
  ambientUncertaintyK?: number;
}): HotDayTemperature {
  const { measuredK, ambientK, rule } = input;
  checkRange("measuredK", measuredK, 150, 2000);
  checkRange("ambientK", ambientK, 180, 340);
  checkOneOf("rule", rule, HOT_DAY_RULES);
  const uT = input.expandedUncertaintyK;
  const uAmbient = input.ambientUncertaintyK;
  if (uT !== undefined) checkRange("expandedUncertaintyK", uT, 0, Number.POSITIVE_INFINITY);
  if (uAmbient !== undefined) checkRange("ambientUncertaintyK", uAmbient, 0, Number.POSITIVE_INFINITY);

  const hotK = hotDayAmbient(input.pressureAltitudeM, input.basis);
  const differenceK = hotK - ambientK;
  const added = Math.max(differenceK, 0);
  const clamped = rule !== "none" && differenceK < 0;
  const withU = (hotDayK: number, expandedUncertaintyK: number | undefined): HotDayTemperature =>
    expandedUncertaintyK === undefined ? { hotDayK, differenceK, clamped } : { hotDayK, differenceK, clamped, expandedUncertaintyK };

  if (rule === "none") return withU(measuredK, uT);
  const known = uT !== undefined && uAmbient !== undefined;
  if (rule === "ratio") {
    const r = Math.max(hotK / ambientK, 1);
    return withU(measuredK * r, known ? r * Math.hypot(uT, (measuredK / ambientK) * uAmbient) : undefined);
  }
  const k = rule === "barrel" ? BARREL_FACTOR : 1;
  return withU(measuredK + k * added, known ? Math.hypot(uT, k * uAmbient) : undefined);
}

/** The last readings that together reach back at least `windowS` from the end; undefined where the record is shorter. */
function lastWindow(series: readonly Sample[], windowS: number): Sample[] | undefined {
  const { last } = endsOf(series);
  const start = series.findLastIndex((sample) => sample.timeS <= last.timeS - windowS + TIME_ROUNDING_S);
  return start < 0 ? undefined : series.slice(start);
}

/**
 * Rate of change over the last window of a series, by least squares.
 *
 * Source    [STRD-NORRIS] straight line; U = 2 standard errors of the slope, [GUM] 6.2.
 * Inputs    values in one unit; windowS in seconds. The window is the last readings that reach back at least that far.
 * Domain    at least 3 readings in the window, times rising.
 * Throws    RangeError outside the domain, or where the record is shorter than the window.
 * Accuracy  scatter only: a dial that sticks on one number shows none, see rateUncertainty.
 */
export function rate(series: readonly Sample[], { windowS }: { windowS: number }): { perS: number; expandedUncertaintyPerS: number } {
  checkSeries(series, 3);
  checkPositive("windowS", windowS);
  const window = lastWindow(series, windowS);
  if (!window) throw new RangeError(`series spans ${endsOf(series).spanS} s; it must span at least the window, ${windowS} s.`);
  const fit = fitLine(
    "series in the window",
    window.map(({ timeS, value }) => ({ x: timeS, y: value })),
  );
  return { perS: fit.slope, expandedUncertaintyPerS: 2 * fit.slopeSe };
}

/** How a series stands against a rate limit over its last window: both figures per minute; null where the window is not filled. */
export function slopeOf(
  series: readonly Sample[],
  { windowS, readingUncertainty = 0 }: { windowS: number; readingUncertainty?: number },
): { perMin: number; expandedUncertaintyPerMin: number } | null {
  checkSeries(series);
  checkPositive("windowS", windowS);
  const window = lastWindow(series, windowS);
  if (!window || window.length < 3) return null;
  const fit = rate(window, { windowS });
  const dial = rateUncertainty({ readable: readingUncertainty, windowMin: endsOf(window).spanS / 60 });
  return { perMin: fit.perS * 60, expandedUncertaintyPerMin: Math.max(fit.expandedUncertaintyPerS * 60, dial) };
}

/**
 * Since when a series has been steady to its end; null where it is not, or where its slope is not known well enough to say.
 *
 *     steady: |slope| < limit and U_slope < limit/2, in the last window; U_slope the larger of 2 se and 2 · readable/√6/window
 *
 * Source    [CFR-25.1045] (a) for the limit; the demand on U_slope is the team's own rule.
 * Inputs    perMinute, the limit in the series' unit per minute; windowS in seconds; readingUncertainty is the smallest true difference
 *           that the display can show (readable times the table's slope).
 * Domain    times rising, limit and window > 0.
 * Throws    RangeError outside the domain.
 * Accuracy  the start of the earliest of the unbroken run of steady windows that ends with the last reading.
 */
export function steadySince(
  series: readonly Sample[],
  { perMinute, windowS, readingUncertainty = 0 }: { perMinute: number; windowS: number; readingUncertainty?: number },
): number | null {
  checkSeries(series);
  checkPositive("perMinute", perMinute);
  let since: number | null = null;
  for (let length = series.length; length >= 3; length--) {
    const part = series.slice(0, length);
    const slope = slopeOf(part, { windowS, readingUncertainty });
    const steady = slope !== null && Math.abs(slope.perMin) < perMinute && slope.expandedUncertaintyPerMin < perMinute / 2;
    if (!steady) break;
    since = lastWindow(part, windowS)?.[0]?.timeS ?? since;
  }
  return since;
}

/**
 * The shortest window, in whole minutes and at least two, over which a display resolves the slope to half the limit.
 *
 * Source    team's own rule, from rateUncertainty.
 * Inputs    readableTrue, smallest true difference shown; perMinute, the limit; one unit. Answers seconds.
 * Domain    readableTrue ≥ 0, limit > 0.
 * Throws    RangeError outside the domain.
 * Accuracy  exact arithmetic.
 */
export function windowToResolve({ readableTrue, perMinute = STABILISED_PER_MIN }: { readableTrue: number; perMinute?: number }): number {
  checkRange("readableTrue", readableTrue, 0, Number.POSITIVE_INFINITY);
  checkPositive("perMinute", perMinute);
  const overOneMinute = rateUncertainty({ readable: readableTrue, windowMin: 1 });
  let minutes = Math.max(SHORTEST_WINDOW_S / 60, Math.ceil(overOneMinute / (perMinute / 2)));
  if (overOneMinute / minutes >= perMinute / 2) minutes += 1;
  return checkResult("window", minutes * 60);
}

/** The first of the highest readings: the moment that fixes the hot-day ambient. Throws RangeError for no reading. */
export function highest(series: readonly Sample[]): Sample {
  checkSeries(series);
  return series.reduce((best, sample) => (sample.value > best.value ? sample : best));
}

/**
 * The peak between readings: a parabola through the highest reading and its neighbours.
 *
 * Source    common practice, no source; Newton's divided differences, so the spacing need not be equal.
 * Inputs    values in one unit, seconds.
 * Domain    at least 1 reading, times rising.
 * Throws    RangeError outside the domain.
 * Accuracy  good for a rounded peak sampled closely. With the highest reading at either end no peak was seen: that reading is answered.
 */
export function peak(series: readonly Sample[]): Sample {
  const top = highest(series);
  const i = series.indexOf(top);
  const before = series[i - 1];
  const after = series[i + 1];
  if (!before || !after) return { ...top };
  const rising = (top.value - before.value) / (top.timeS - before.timeS);
  const falling = (after.value - top.value) / (after.timeS - top.timeS);
  const bend = (falling - rising) / (after.timeS - before.timeS);
  if (bend >= 0) return { ...top };
  const timeS = (before.timeS + top.timeS) / 2 - rising / (2 * bend);
  const value = before.value + rising * (timeS - before.timeS) + bend * (timeS - before.timeS) * (timeS - top.timeS);
  return { value: checkResult("peak", value), timeS };
}

export type CompletionOptions = {
  topAltitudeM?: number | null; // highest pressure altitude reached
  criticalAltitudeM?: number | null; // of the turbocharger; null: none
  readableTrue?: number; // smallest true difference the display shows, in the series' unit
  windowS?: number; // "stabilised": where not given, windowToResolve answers it
  perMinute?: number; // "stabilised": where not given, 2/1.8 a minute, for °C or K
  ranForS?: number | null; // how long the point ran, from the series' zero; where not given, to the last reading
  runS?: number | null; // "whole run": the duration written on the card
  pastPeakS?: number | null; // "whole run" of a soak: to be logged this long past the peak
};

/**
 * Whether a run met its completion rule; where not, the reason that withholds the hot-day verdict.
 *
 *     stabilised: |slope| < 2 °F/min and known to half of it    5 min past peak: 300 s after the first highest, up to the critical altitude
 *     whole run: the written duration, and for a soak the written time past the peak    none: no hot-day comparison is wanted
 *
 * Source    [CFR-25.1045] (a); [CS-22.1047] (a); [CFR-23.1043] (a) (4) for the turbocharged climb; whole run and none are the team's own.
 * Inputs    series true, in °C or K unless perMinute is given; altitudes in metres.
 * Domain    at least 1 reading, times rising.
 * Throws    RangeError outside the domain or for an unknown rule.
 * Accuracy  reaching a figure meets it. What is missing (top altitude, written duration) is never met: "stopped early".
 */
export function testComplete(series: readonly Sample[], rule: CompletionRule, options: CompletionOptions = {}): Reason | null {
  checkSeries(series);
  checkOneOf("rule", rule, COMPLETION_RULES);
  for (const name of ["topAltitudeM", "criticalAltitudeM"] as const)
    checkRange(name, options[name] ?? 0, LOWEST_ALTITUDE_M, HIGHEST_ALTITUDE_M);
  for (const name of ["ranForS", "runS", "pastPeakS"] as const) checkRange(name, options[name] ?? 0, 0, Number.POSITIVE_INFINITY);

  if (rule === "none") return "stopped early";
  if (rule === "stabilised") {
    const perMinute = options.perMinute ?? STABILISED_PER_MIN;
    const readableTrue = checkRange("readableTrue", options.readableTrue ?? 0, 0, Number.POSITIVE_INFINITY);
    const windowS = checkRange(
      "windowS",
      options.windowS ?? windowToResolve({ readableTrue, perMinute }),
      SHORTEST_WINDOW_S,
      Number.POSITIVE_INFINITY,
    );
    return steadySince(series, { perMinute, windowS, readingUncertainty: readableTrue }) === null ? "not stabilised" : null;
  }

  const endS = options.ranForS ?? endsOf(series).last.timeS;
  if (rule === "5 min past peak") {
    const critical = options.criticalAltitudeM ?? null;
    const reached = critical === null || (options.topAltitudeM ?? Number.NEGATIVE_INFINITY) >= critical - 1e-6;
    return reached && endS - highest(series).timeS >= PAST_PEAK_S - TIME_ROUNDING_S ? null : "stopped early";
  }
  const runS = options.runS ?? null;
  const pastPeakS = options.pastPeakS ?? null;
  if (runS === null && pastPeakS === null) return "stopped early";
  const ran = runS === null || endS >= runS - TIME_ROUNDING_S;
  const pastPeak = pastPeakS === null || endS - peak(series).timeS >= pastPeakS - TIME_ROUNDING_S;
  return ran && pastPeak ? null : "stopped early";
}

export type HeatSoak = { shutdown: number; peak: number; timeToPeakS: number; rise: number; coolDownTimeConstantS: number | null };

/**
 * What a temperature does after the engine stops.
 *
 *     peak by parabola    rise = peak − shutdown    τ = Δt / ln((T₁ − T_amb)/(T₂ − T_amb)), from the highest reading to the last
 *
 * Source    common practice, no source; τ is the first-order cooling law.
 * Inputs    series from the moment of shutdown, ambientK in the same unit as the series (a difference of kelvins is one of °C).
 * Domain    at least 1 reading, times rising.
 * Throws    RangeError outside the domain.
 * Accuracy  τ is null without an ambient, before any fall, or with the last reading not above ambient.
 */
export function heatSoak(series: readonly Sample[], { ambientK }: { ambientK?: number } = {}): HeatSoak {
  checkSeries(series);
  if (ambientK !== undefined) checkFinite("ambientK", ambientK);
  const { first, last } = endsOf(series);
  const top = peak(series);
  const hottest = highest(series);
  const cooled = ambientK !== undefined && last.value > ambientK + 1e-9 && last.value < hottest.value - 1e-9;
  const coolDownTimeConstantS = cooled
    ? (last.timeS - hottest.timeS) / Math.log((hottest.value - ambientK) / (last.value - ambientK))
    : null;
  return {
    shutdown: first.value,
    peak: top.value,
    timeToPeakS: top.timeS - first.timeS,
    rise: top.value - first.value,
    coolDownTimeConstantS,
  };
}

/**
 * Where three equally spaced readings are heading: an estimate, never a basis for "within".
 *
 *     T∞ = (T₁ T₃ − T₂²)/(T₁ + T₃ − 2 T₂)    τ = Δt / ln((T₂ − T₁)/(T₃ − T₂))
 *
 * Source    first-order approach; hand calculation.
 * Inputs    three values in one unit, stepS between neighbours in seconds.
 * Domain    step > 0; the second difference in the same direction as the first, and smaller.
 * Throws    RangeError outside the domain: differences that do not shrink are heading nowhere that can be named.
 * Accuracy  poor: errors of reading grow as the differences approach one another.
 */
export function steadyState(t1: number, t2: number, t3: number, stepS: number): { final: number; timeConstantS: number } {
  for (const [name, value] of Object.entries({ t1, t2, t3 })) checkFinite(name, value);
  checkPositive("stepS", stepS);
  const first = t2 - t1;
  const second = t3 - t2;
  const shrinking = first !== 0 && second / first > 0 && second / first < 1;
  if (!shrinking) throw new RangeError(`t3 − t2 is ${second}; it must be smaller than t2 − t1, ${first}, and in the same direction.`);
  const final = t2 + (first * second) / (first - second); // the formula above with t2 taken out, kinder to rounding
  return { final: checkResult("final", final), timeConstantS: checkResult("timeConstantS", stepS / Math.log(first / second)) };
}
