import { type Calibration, correctReading } from "./calibration";
import type { CalibrationRecord, CardDocument, ProgrammeSnapshot } from "./card";
import { cardFacts } from "./readiness/facts";
import type { CardFacts } from "./readiness/rule";

/** One thing that a released card rests on. `digest` is its canonical text: compared, never signed. */
export type RestsOn = {
  kind: "calibration" | "limit" | "fuel plan" | "configuration" | "hazard";
  id: string;
  name: string; // for the reader: "COOLANT-PANEL"
  digest: string;
  calibration: CalibrationRecord | null; // a renewal is compared by what it corrects, not by its text
};

export type Broken = { kind: RestsOn["kind"]; id: string; why: string };

/** A renewal may change a corrected value by this part of U and leave releases standing (team's own rule). */
const RENEWAL_PART_OF_U = 0.1;
const EPSILON = 1e-9;

/** Fields in their written order make the same text for the same thing. */
const canonical = (thing: Record<string, unknown>): string => JSON.stringify(thing, Object.keys(thing).sort());

const NO_CONTEXT: CardFacts["context"] = {
  today: "",
  currentConfiguration: null,
  releaser: null,
  buildUp: [],
  seriesResults: [],
  groundingSquawks: [],
  objectivesCovered: [],
  digest: null,
  releasedDigest: null,
};

function fuelDigest({ fuelPlan, aircraft }: ProgrammeSnapshot): string {
  const { fuelArmM, fuelDensityKgPerL, fuelCapacityL, fuelUnusableL } = aircraft;
  return canonical({ ...fuelPlan, fuelArmM, fuelDensityKgPerL, fuelCapacityL, fuelUnusableL });
}

function configurationDigest({ configuration }: ProgrammeSnapshot): string {
  if (!configuration) return "none";
  const { id, number, fitted, massKg, armM } = configuration;
  return canonical({ id, number, fitted, massKg, armM });
}

const hazardDigest = (hazard: ProgrammeSnapshot["hazards"][number]): string =>
  JSON.stringify([
    hazard.title,
    hazard.cause,
    hazard.effect,
    hazard.before.severity,
    hazard.before.probability,
    hazard.after.severity,
    hazard.after.probability,
    hazard.mitigations.map(({ kind, text }) => [kind, text]),
  ]);

const limitDigest = (limit: ProgrammeSnapshot["limits"][number]): string => canonical({ ...limit });

const calibrationDigest = (calibration: CalibrationRecord | null): string =>
  calibration === null
    ? "none"
    : JSON.stringify([calibration.id, calibration.calibratedOn, calibration.validUntil, calibration.disturbedOn]);

/** The calibrations, limits, fuel figures, configuration and hazards without which a card would say something else. */
export function restsOn(card: CardDocument): RestsOn[] {
  const { programme } = card;
  const facts = cardFacts(card, NO_CONTEXT, "", null);
  const named = new Set(card.content.points.flatMap((point) => point.hazards));
  const plain = (kind: RestsOn["kind"], id: string, name: string, digest: string): RestsOn => ({
    kind,
    id,
    name,
    digest,
    calibration: null,
  });
  return [
    ...facts.used.flatMap(({ instrument }): RestsOn[] =>
      instrument
        ? [
            {
              kind: "calibration",
              id: instrument.id,
              name: instrument.name,
              digest: calibrationDigest(instrument.calibration),
              calibration: instrument.calibration,
            },
          ]
        : [],
    ),
    ...programme.limits.map((limit) => plain("limit", limit.id, `${limit.parameter} ${limit.side} ${limit.layer}`, limitDigest(limit))),
    plain("fuel plan", programme.id, "fuel plan", fuelDigest(programme)),
    plain(
      "configuration",
      programme.configuration?.id ?? "",
      programme.configuration?.number ?? "no configuration",
      configurationDigest(programme),
    ),
    ...programme.hazards
      .filter((hazard) => named.has(hazard.code))
      .map((hazard) => plain("hazard", hazard.code, `${hazard.code} ${hazard.title}`, hazardDigest(hazard))),
  ];
}

const readsOf = (c: Calibration): number[] => (c.kind === "points" ? c.points.map((p) => p.read) : [c.low, c.high]);

/** Why a new calibration changes what an old release said; null: a renewal within a tenth of U, over at least the same range. */
function whyRecalibrated(old: CalibrationRecord | null, now: CalibrationRecord | null | undefined): string | null {
  if (!now) return old ? "its calibration was taken away" : null;
  if (!old) return "it was calibrated after the release";
  if (now.disturbedOn !== null && now.disturbedOn >= now.calibratedOn && now.disturbedOn !== old.disturbedOn)
    return `its sensor was moved, re-wired or replaced on ${now.disturbedOn}`;
  if (now.unit !== old.unit) return "its unit changed";
  if (now.low > old.low + EPSILON || now.high < old.high - EPSILON) return `its calibrated range shrank to ${now.low} to ${now.high}`;
  const u = old.expandedUncertainty;
  if (u === null || now.expandedUncertainty === null)
    return u === now.expandedUncertainty ? changedBy(old, now, 0) : "its uncertainty became known or unknown";
  if (now.expandedUncertainty > u + EPSILON) return `its uncertainty rose from ${u} to ${now.expandedUncertainty}`;
  return changedBy(old, now, RENEWAL_PART_OF_U * u);
}

/** Straight lines between points: two tables lie farthest apart at a point of one of them. */
function changedBy(old: CalibrationRecord, now: CalibrationRecord, allowed: number): string | null {
  const reads = [old.low, old.high, ...readsOf(old), ...readsOf(now)].filter((read) => read >= old.low && read <= old.high);
  const changes = reads.map((read) => Math.abs(correctReading(read, now).value - correctReading(read, old).value));
  const most = Math.max(...changes);
  return most <= allowed + EPSILON ? null : `its correction changed by ${Number(most.toFixed(2))}, more than a tenth of U`;
}

function whyBroken(rest: RestsOn, now: ProgrammeSnapshot): string | null {
  switch (rest.kind) {
    case "calibration": {
      const instrument = now.instruments.find((i) => i.id === rest.id);
      return instrument ? whyRecalibrated(rest.calibration, instrument.calibration) : "the instrument was taken out";
    }
    case "limit": {
      const limit = now.limits.find((l) => l.id === rest.id);
      return !limit ? "the limit was removed" : limitDigest(limit) === rest.digest ? null : "the limit changed";
    }
    case "fuel plan":
      return fuelDigest(now) === rest.digest ? null : "the fuel figures changed";
    case "configuration": {
      if (configurationDigest(now) !== rest.digest)
        return `the configuration is now ${now.configuration?.number ?? "none"}${now.configuration?.id === rest.id ? ", changed" : ""}`;
      return now.configuration && now.configuration.signedBy === null ? "the configuration is no longer signed" : null;
    }
    case "hazard": {
      const hazard = now.hazards.find((h) => h.code === rest.id);
      return !hazard ? "the hazard was removed" : hazardDigest(hazard) === rest.digest ? null : "the hazard changed";
    }
  }
}

/** Why a release falls away, thing by thing; empty: it stands. A limit that came since is a change too. */
export function broken(rests: readonly RestsOn[], now: ProgrammeSnapshot): Broken[] {
  const fallen = rests.flatMap((rest): Broken[] => {
    const why = whyBroken(rest, now);
    return why === null ? [] : [{ kind: rest.kind, id: rest.id, why: `${rest.name}: ${why}` }];
  });
  const known = new Set(rests.filter((rest) => rest.kind === "limit").map((rest) => rest.id));
  const added = now.limits.filter((limit) => !known.has(limit.id));
  return [
    ...fallen,
    ...added.map(
      (limit): Broken => ({ kind: "limit", id: limit.id, why: `${limit.parameter} ${limit.side} ${limit.layer}: the limit was added` }),
    ),
  ];
}
