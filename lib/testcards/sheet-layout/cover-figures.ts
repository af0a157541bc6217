import type { CardDocument } from "../card";
import { type CardPlan, planCard } from "../card-plan";
import { figure, withUnit } from "./gauge-figures";

export type CoverFigure = { label: string; value: string; boxed: boolean };

/** The plan that the readiness rules judge too; none where the draft's loading makes no sense yet. */
function planOf(card: CardDocument): CardPlan | null {
  try {
    return planCard(card);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

function hoursAndMinutes(minutes: number): string {
  const whole = Math.ceil(minutes);
  return `${Math.floor(whole / 60)}\u00a0h\u00a0${String(whole % 60).padStart(2, "0")}`;
}

/** An empty value is a blank to fill in by hand. */
export function coverFigures(card: CardDocument): CoverFigure[] {
  const { programme, content } = card;
  const inTheAir = content.points.some((p) => p.place === "air");
  const plan = planOf(card);
  const loading = plan?.takeOff ?? null;
  const litres = (value: number | null) => (value === null ? "" : withUnit(figure(value, "L", 1), "L"));
  const plain = (label: string, value: string): CoverFigure => ({ label, value, boxed: false });
  const mass = content.kind === "flight" ? "take-off mass" : "mass";
  return [
    plain("config", programme.configuration?.number ?? ""),
    plain(mass, loading === null ? "" : withUnit(figure(loading.massKg, "kg", 0), "kg")),
    plain("CG", loading === null ? "" : withUnit(loading.cgM.toFixed(3), "m")),
    plain("fuel on board", litres(content.fuelOnBoardL)),
    ...(inTheAir ? [{ label: "BINGO", value: litres(content.bingoL), boxed: true }] : []),
    plain("planned", plan === null ? "" : hoursAndMinutes(plan.minutes)),
    ...(inTheAir ? [plain("DA max", programme.daMaximumFt === null ? "" : withUnit(figure(programme.daMaximumFt, "ft", 0), "ft"))] : []),
    plain("hot-day basis", programme.hotDayBasis ?? ""),
  ];
}
