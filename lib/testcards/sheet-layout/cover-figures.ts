import type { CardDocument } from "../card";
import { loadingOf } from "../loading";
import { figure, withUnit } from "./gauge-figures";

/** Minutes between two points, where a point states none: common practice, no source. */
const RESET_MIN = 2;

export type CoverFigure = { label: string; value: string; boxed: boolean };

/** Crew in the stations in their order, baggage in the one named so (else the last), fuel at its own arm. Null: cannot be told. */
export function takeOffLoading(card: CardDocument): { massKg: number; cgM: number } | null {
  const { aircraft, configuration } = card.programme;
  const { crew, baggageKg, fuelOnBoardL } = card.content;
  const baggage = aircraft.stations.find((s) => /bag/i.test(s.name)) ?? aircraft.stations.at(-1);
  const seats = aircraft.stations.filter((s) => s !== baggage);
  if (fuelOnBoardL === null || !baggage || crew.length === 0 || crew.length > seats.length) return null;
  const empty = configuration ?? { massKg: aircraft.emptyMassKg, armM: aircraft.emptyArmM };
  const loads = [
    { massKg: empty.massKg, armM: empty.armM },
    ...crew.map(({ massKg }, i) => ({ massKg, armM: seats[i]?.armM ?? 0 })),
    { massKg: baggageKg, armM: baggage.armM },
    { massKg: fuelOnBoardL * aircraft.fuelDensityKgPerL, armM: aircraft.fuelArmM },
  ];
  return loads.every((l) => Number.isFinite(l.massKg) && Number.isFinite(l.armM)) ? loadingOf(loads) : null;
}

export function plannedMinutes(card: CardDocument): number {
  const { points } = card.content;
  return points.reduce((sum, p) => sum + p.durationMin, 0) + RESET_MIN * Math.max(0, points.length - 1);
}

function hoursAndMinutes(minutes: number): string {
  const whole = Math.ceil(minutes);
  return `${Math.floor(whole / 60)}\u00a0h\u00a0${String(whole % 60).padStart(2, "0")}`;
}

/** An empty value is a blank to fill in by hand. */
export function coverFigures(card: CardDocument): CoverFigure[] {
  const { programme, content } = card;
  const inTheAir = content.points.some((p) => p.place === "air");
  const loading = takeOffLoading(card);
  const litres = (value: number | null) => (value === null ? "" : withUnit(figure(value, "L", 1), "L"));
  const plain = (label: string, value: string): CoverFigure => ({ label, value, boxed: false });
  const mass = content.kind === "flight" ? "take-off mass" : "mass";
  return [
    plain("config", programme.configuration?.number ?? ""),
    plain(mass, loading === null ? "" : withUnit(figure(loading.massKg, "kg", 0), "kg")),
    plain("CG", loading === null ? "" : withUnit(loading.cgM.toFixed(3), "m")),
    plain("fuel on board", litres(content.fuelOnBoardL)),
    ...(inTheAir ? [{ label: "BINGO", value: litres(content.bingoL), boxed: true }] : []),
    plain("points take", hoursAndMinutes(plannedMinutes(card))),
    ...(inTheAir ? [plain("DA max", programme.daMaximumFt === null ? "" : withUnit(figure(programme.daMaximumFt, "ft", 0), "ft"))] : []),
    plain("hot-day basis", programme.hotDayBasis ?? ""),
  ];
}
