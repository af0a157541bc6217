/** U+202F: between a value and its unit, and between groups of three digits from 10 000 on. */
export const THIN_SPACE = "\u202f";
const MINUS = "\u2212";
/** A decimal written 109.375 may be held as 109.37499999: half a step still rounds away from zero. */
const HALF_STEP_SLACK = 1e-9;

/** A number at a fixed count of decimals, with a real minus sign; zero never carries one. */
export function formatNumber(value: number, decimals = 0): string {
  const scale = 10 ** decimals;
  const rounded = Math.floor(Math.abs(value) * scale + 0.5 + HALF_STEP_SLACK) / scale;
  const [whole = "0", fraction] = rounded.toFixed(decimals).split(".");
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
  return `${value < 0 && rounded > 0 ? MINUS : ""}${grouped}${fraction ? `.${fraction}` : ""}`;
}

/** What is in hand. A miss too small for the decimals gets more of them: −0.04 never reads as 0.0. */
export function formatMargin(value: number, decimals = 1): string {
  for (let more = decimals; more < 9; more++) {
    const text = formatNumber(value, more);
    if (value >= 0 || text.startsWith(MINUS)) return text;
  }
  return formatNumber(value, decimals);
}

export function formatUncertainty(value: number | null, decimals = 1): string {
  return value === null ? "U unknown" : `±${formatNumber(value, decimals)}`;
}

/** A true or hot-day value: one decimal as the trade writes temperatures and pressures, none where it runs into thousands. */
export function formatDerived(value: number): string {
  return formatNumber(value, Math.abs(value) >= 1000 ? 0 : 1);
}

/** Decimals that a resolution needs: 2.5 needs one, 0.25 two, 10 none. */
export function decimalsOf(resolution: number): number {
  for (let decimals = 0; decimals < 6; decimals++) {
    const scaled = resolution * 10 ** decimals;
    if (Math.abs(scaled - Math.round(scaled)) < 1e-6) return decimals;
  }
  return 6;
}

/** The decimals a value was entered with, no more than `most`: a limit of 30.5 keeps its half, 2730 stays whole. */
export function ownDecimals(value: number, most = 3): number {
  return Math.min(most, decimalsOf(value));
}

/** As a person reads the gauge: to the nearest step, or to the step below or above. */
export function roundToResolution(value: number, resolution: number, towards: "nearest" | "below" | "above" = "nearest"): number {
  const steps = value / resolution;
  const whole =
    towards === "below"
      ? Math.floor(steps + 1e-6)
      : towards === "above"
        ? Math.ceil(steps - 1e-6)
        : Math.floor(steps + 0.5 + HALF_STEP_SLACK);
  return Number((whole * resolution).toFixed(decimalsOf(resolution)));
}
