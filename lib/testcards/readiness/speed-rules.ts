import type { Aircraft } from "../card";
import { restrictedInAir, saysPosition } from "./facts";
import { atPoint, type CardFacts, type PointFacts, type Problem, type Rule, type StatedSpeed } from "./rule";
import { amount } from "./say";

const EPSILON = 1e-9;

/** A speed of the aircraft by its usual symbol, however it is spelled: "V_NE", "VNE". */
function speedOf(aircraft: Aircraft, symbol: string): number | null {
  return aircraft.speeds.find((speed) => speed.code.replace(/[^a-z0-9]/gi, "").toUpperCase() === symbol)?.valueKt ?? null;
}

function fastestBeyond({ speeds }: PointFacts, limitKt: number | null): StatedSpeed | null {
  if (limitKt === null) return null;
  const beyond = speeds.filter((speed) => speed.kt > limitKt + EPSILON);
  return beyond.reduce<StatedSpeed | null>((most, speed) => (most && most.kt >= speed.kt ? most : speed), null);
}

function pastLimit(facts: CardFacts): Problem[] {
  const { aircraft } = facts.programme;
  const neverExceed = speedOf(aircraft, "VNE");
  const flapExtended = speedOf(aircraft, "VFE");
  return facts.points.flatMap((at): Problem[] => {
    const { point, name } = at;
    const flap = point.wingFlap && flapExtended !== null && (neverExceed === null || flapExtended < neverExceed);
    const limit = flap ? flapExtended : neverExceed;
    const beyond = fastestBeyond(at, limit);
    if (beyond && limit !== null)
      return [
        {
          message: `${name}: ${beyond.said} reaches ${amount(beyond.kt, "kt", 1)}, beyond ${flap ? "V_FE" : "V_NE"} ${amount(limit, "kt", 1)}${flap ? " with the wing flap out" : ""}. Lower it.`,
          where: atPoint(at, beyond.field, beyond.item),
        },
      ];
    return point.limits.flatMap((l): Problem[] => {
      if (l.unit !== "kt" || l.side !== "max" || limit === null || l.value <= limit + EPSILON) return [];
      return [
        {
          message: `${name}: the limit ${l.label} ${amount(l.value, "kt", 1)} lies beyond ${flap ? "V_FE" : "V_NE"} ${amount(limit, "kt", 1)}. Lower it.`,
          where: atPoint(at, "limits", l.id),
        },
      ];
    });
  });
}

function smoothAirMissing(facts: CardFacts): Problem[] {
  const normalOperating = speedOf(facts.programme.aircraft, "VNO");
  return facts.points.flatMap((at): Problem[] => {
    const beyond = at.point.smoothAir ? null : fastestBeyond(at, normalOperating);
    if (!beyond || normalOperating === null) return [];
    return [
      {
        message: `${at.name}: ${beyond.said} lies beyond V_NO ${amount(normalOperating, "kt", 1)} without a smooth-air condition. Add it.`,
        where: atPoint(at, beyond.field, beyond.item),
      },
    ];
  });
}

function heightFloorMissing(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at): Problem[] => {
    if (at.point.heightFloor !== null) return [];
    const restricted = restrictedInAir(at);
    if (!restricted && !at.point.needsHeightFloor) return [];
    const why = restricted ? `takes ${restricted} in the air` : "is a stall, an engine cut or a point of its kind";
    return [{ message: `${at.name} ${why} and has no minimum height. Add it.`, where: atPoint(at, "heightFloor") }];
  });
}

/** A position with a speed of its own: stated for the whole point, or set in the very step that names the speed. */
function positionOverspeed(facts: CardFacts): Problem[] {
  return facts.points.flatMap((at) =>
    facts.programme.controls.flatMap((control) =>
      control.positions.flatMap((position): Problem[] => {
        const most = position.maxSpeedKt;
        if (most === null) return [];
        const stated = at.point.positions.some((p) => p.control === control.name && p.position === position.name);
        const inStep = (speed: StatedSpeed) =>
          at.point.steps.some((s) => s.id === speed.item && saysPosition(s.text, control.name, position.name));
        const beyond = at.speeds.find((speed) => speed.kt > most + EPSILON && (stated || inStep(speed)));
        if (!beyond) return [];
        const others = control.positions.filter(
          (p) => !p.groundOnly && !p.restricted && (p.maxSpeedKt === null || p.maxSpeedKt >= beyond.kt),
        );
        const instead = others[0] ? ` or use ${others[0].name}` : "";
        return [
          {
            message: `${at.name}: ${control.name} ${position.name} at ${beyond.said} reaches ${amount(beyond.kt, "kt", 1)}, above its ${amount(most, "kt", 1)}. Lower the speed${instead}.`,
            where: atPoint(at, beyond.field, beyond.item),
          },
        ];
      }),
    ),
  );
}

export const speedRules: Rule[] = [
  { number: "28a", code: "speed-past-limit", severity: "must", at: "card", card: pastLimit },
  { number: "28b", code: "smooth-air-missing", severity: "should", at: "card", card: smoothAirMissing },
  { number: "29", code: "height-floor-missing", severity: "must", at: "card", card: heightFloorMissing },
  { number: "46", code: "cowl-open-overspeed", severity: "must", at: "card", card: positionOverspeed },
];
