import { checkCount, checkFinite, checkRange } from "./check-range";

export type Load = { massKg: number; armM: number };
export type Loading = { massKg: number; cgM: number; momentKgM: number };
export type EnvelopeCorner = { massKg: number; cgM: number };

/** Room for rounding at the edge of the envelope, kg or m. */
const EDGE = 1e-9;

/**
 * Mass, centre of gravity and moment of a loading.
 *
 *     m = Σ mᵢ    cg = Σ (mᵢ · armᵢ)/m
 *
 * Source    [PHAK] ch. 9, computational method.
 * Inputs    one entry a station; arms in metres from one datum, negative ahead of it. A negative mass takes load away.
 * Domain    at least one station, total mass above zero.
 * Throws    RangeError outside the domain.
 * Accuracy  exact.
 */
export function loadingOf(stations: readonly Load[]): Loading {
  checkCount("stations", stations, 1);
  for (const { massKg, armM } of stations) {
    checkFinite("stations.massKg", massKg);
    checkFinite("stations.armM", armM);
  }
  const massKg = stations.reduce((sum, s) => sum + s.massKg, 0);
  const momentKgM = stations.reduce((sum, s) => sum + s.massKg * s.armM, 0);
  if (massKg <= 0) throw new RangeError(`stations.massKg adds up to ${massKg}; it must be above 0.`);
  return { massKg, cgM: momentKgM / massKg, momentKgM };
}

type Point = { along: number; across: number };

/** Room to the nearer edge of a closed polygon on the line along = at; negative outside. */
function roomAcross(corners: readonly Point[], at: number, across: number): number {
  const crossings: number[] = [];
  for (const [i, a] of corners.entries()) {
    const b = corners[(i + 1) % corners.length] ?? a;
    if (Math.min(a.along, b.along) > at || Math.max(a.along, b.along) < at) continue;
    if (a.along === b.along) crossings.push(a.across, b.across);
    else crossings.push(a.across + ((b.across - a.across) * (at - a.along)) / (b.along - a.along));
  }
  return Math.min(across - Math.min(...crossings), Math.max(...crossings) - across);
}

/**
 * Whether a loading lies inside the mass and centre-of-gravity envelope, and how far from its edges.
 *
 * Source    [PHAK] ch. 9, centre-of-gravity limits; straight lines between corners.
 * Inputs    corners in order round the envelope; metres from the same datum as the loading.
 * Domain    at least 3 corners enclosing an area without a notch (every line of one mass or one CG crosses it once).
 * Throws    RangeError outside the domain.
 * Accuracy  the edge is inside. massMarginKg is the room to the nearer mass limit at this CG, cgMarginM to the nearer CG limit at this mass;
 *           negative is how far outside. Beyond the envelope's range a margin is taken at its nearest end.
 */
export function insideEnvelope(
  { massKg, cgM }: { massKg: number; cgM: number },
  corners: readonly EnvelopeCorner[],
): { inside: boolean; massMarginKg: number; cgMarginM: number } {
  checkRange("massKg", massKg, 0, Number.POSITIVE_INFINITY);
  checkFinite("cgM", cgM);
  checkCount("corners", corners, 3);
  for (const corner of corners) {
    checkRange("corners.massKg", corner.massKg, 0, Number.POSITIVE_INFINITY);
    checkFinite("corners.cgM", corner.cgM);
  }
  const masses = corners.map((corner) => corner.massKg);
  const cgs = corners.map((corner) => corner.cgM);
  const clamp = (x: number, list: number[]) => Math.min(Math.max(x, Math.min(...list)), Math.max(...list));
  if (new Set(masses).size < 2 || new Set(cgs).size < 2) throw new RangeError("corners lie on one line; they must enclose an area.");

  const cgMarginM = roomAcross(
    corners.map((c) => ({ along: c.massKg, across: c.cgM })),
    clamp(massKg, masses),
    cgM,
  );
  const massMarginKg = roomAcross(
    corners.map((c) => ({ along: c.cgM, across: c.massKg })),
    clamp(cgM, cgs),
    massKg,
  );
  return { inside: massMarginKg >= -EDGE && cgMarginM >= -EDGE, massMarginKg, cgMarginM };
}
