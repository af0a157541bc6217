/** Drawing of gauges: positions only, no rounding of values. Angles in degrees clockwise from straight up. */

export type Span = { low: number; high: number };

/** Where a value stands between 0 and `length`; beyond the scale it stands at the end and says so. */
export function place(value: number, scale: Span, length: number): { at: number; beyond: "low" | "high" | null } {
  const at = ((value - scale.low) / (scale.high - scale.low)) * length;
  if (at < 0) return { at: 0, beyond: "low" };
  if (at > length) return { at: length, beyond: "high" };
  return { at, beyond: null };
}

/** A round step of 1, 2, 2.5 or 5 times a power of ten that gives at most `most` intervals. */
export function roundStep(span: number, most: number): number {
  const rough = span / most;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 2.5, 5, 10].find((factor) => factor * power >= rough * (1 - 1e-9)) ?? 10;
  return step * power;
}

/** Marks at round values, first and last inside the scale. */
export function ticks(scale: Span, most: number): number[] {
  const step = roundStep(scale.high - scale.low, most);
  const first = Math.ceil(scale.low / step - 1e-9);
  const last = Math.floor(scale.high / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => Number(((first + i) * step).toPrecision(12)));
}

/** A scale that holds every value with room at both ends, ending on round figures. */
export function scaleAround(values: readonly number[], room = 0.12): Span {
  const finite = values.filter(Number.isFinite);
  if (finite.length === 0) return { low: 0, high: 1 };
  const low = Math.min(...finite);
  const high = Math.max(...finite);
  const spread = high - low;
  const span = spread > 1e-6 * Math.max(1, Math.abs(high)) ? spread : Math.max(1, Math.abs(high) / 10); // one value alone
  const step = roundStep(span * (1 + 2 * room), 8);
  return { low: Math.floor((low - span * room) / step) * step, high: Math.ceil((high + span * room) / step) * step };
}

/** Moves labels apart along a line, keeping their order and staying inside; each keeps its own centre where there is room. */
export function spreadLabels(labels: readonly { at: number; width: number }[], length: number, gap = 6): number[] {
  const order = labels.map((label, index) => ({ ...label, index })).sort((a, b) => a.at - b.at || a.index - b.index);
  const centres = order.map(({ at, width }) => Math.min(Math.max(at, width / 2), length - width / 2));
  for (let i = 1; i < order.length; i++) {
    const need = (centres[i - 1] ?? 0) + ((order[i - 1]?.width ?? 0) + (order[i]?.width ?? 0)) / 2 + gap;
    centres[i] = Math.max(centres[i] ?? 0, need);
  }
  for (let i = order.length - 1; i >= 0; i--) {
    const right = i === order.length - 1 ? length : (centres[i + 1] ?? 0) - (order[i + 1]?.width ?? 0) / 2 - gap;
    centres[i] = Math.min(centres[i] ?? 0, right - (order[i]?.width ?? 0) / 2);
  }
  const placed: number[] = [];
  for (const [i, { index }] of order.entries()) placed[index] = centres[i] ?? 0;
  return placed;
}

export function onDial(angleDeg: number, radius: number, centre: { x: number; y: number }): { x: number; y: number } {
  const angle = (angleDeg * Math.PI) / 180;
  return { x: centre.x + radius * Math.sin(angle), y: centre.y - radius * Math.cos(angle) };
}

/** SVG path of an arc that runs clockwise from one angle to another. */
export function arcPath(fromDeg: number, toDeg: number, radius: number, centre: { x: number; y: number }): string {
  const from = onDial(fromDeg, radius, centre);
  const to = onDial(toDeg, radius, centre);
  const point = ({ x, y }: { x: number; y: number }) => `${x.toFixed(2)} ${y.toFixed(2)}`;
  return `M${point(from)}A${radius} ${radius} 0 ${toDeg - fromDeg > 180 ? 1 : 0} 1 ${point(to)}`;
}
