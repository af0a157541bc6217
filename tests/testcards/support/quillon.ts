import type { Aircraft, Control } from "@/lib/testcards/card";

/** The invented aircraft of the tests, new each time: a test may bend its own. */
export const quillon = (over: Partial<Aircraft> = {}): Aircraft => ({
  registration: "Q-R2-01",
  type: "Quillon R2",
  engine: "HF-4L",
  maxMassKg: 600,
  emptyMassKg: 381,
  emptyArmM: 1.895,
  envelope: [
    { massKg: 380, cgM: 1.9 },
    { massKg: 500, cgM: 1.9 },
    { massKg: 600, cgM: 1.96 },
    { massKg: 600, cgM: 2.06 },
    { massKg: 380, cgM: 2.06 },
  ],
  stations: [
    { name: "Left seat", armM: 2.15, maxKg: 110 },
    { name: "Right seat", armM: 2.15, maxKg: 110 },
    { name: "Baggage", armM: 2.8, maxKg: 15 },
  ],
  fuelArmM: 2.23,
  fuelDensityKgPerL: 0.72,
  fuelCapacityL: 90,
  fuelUnusableL: 4,
  speeds: [
    { code: "V_FE", name: "wing flap out", valueKt: 80, airspeed: "KIAS" },
    { code: "V_NO", name: "smooth air above", valueKt: 115, airspeed: "KIAS" },
    { code: "V_NE", name: "never exceed", valueKt: 138, airspeed: "KIAS" },
  ],
  criticalAltitudeFt: 9000,
  ...over,
});

/** Its one control. */
export const cowl = (): Control => ({
  name: "COWL",
  positions: [
    { name: "SHUT", groundOnly: false, maxSpeedKt: null, restricted: true },
    { name: "TRAIL", groundOnly: false, maxSpeedKt: null, restricted: false },
    { name: "OPEN", groundOnly: false, maxSpeedKt: 105, restricted: false },
    { name: "REMOVED", groundOnly: true, maxSpeedKt: null, restricted: false },
  ],
  recoverTo: "OPEN",
});
