import type { Aircraft, Control } from "@/lib/testcards/card";
import { seedId } from "./ids";

export const AIRCRAFT_ID = seedId("aircraft", 1);
export const PROGRAMME_ID = seedId("programme", 1);
export const CONFIGURATION_IDS = { "C-13": seedId("configuration", 1), "C-14": seedId("configuration", 2) };

export const AIRCRAFT: Aircraft = {
  registration: "Q-R2-01",
  type: "Quillon R2",
  engine: "HF-4L, turbo-normalised flat four, 84 kW, liquid-cooled",
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
    { code: "V_S0", name: "Stall, WING FLAP landing, 600 kg", valueKt: 38, airspeed: "KCAS" },
    { code: "V_S1", name: "Stall, WING FLAP up, 600 kg", valueKt: 44, airspeed: "KCAS" },
    { code: "V_X", name: "Best angle", valueKt: 58, airspeed: "KIAS" },
    { code: "V_Y", name: "Best rate", valueKt: 68, airspeed: "KIAS" },
    { code: "V_GLIDE", name: "Best glide", valueKt: 65, airspeed: "KIAS" },
    { code: "V_FE", name: "WING FLAP down", valueKt: 80, airspeed: "KIAS" },
    { code: "V_A", name: "Manoeuvring", valueKt: 98, airspeed: "KIAS" },
    { code: "V_CO", name: "COWL OPEN", valueKt: 105, airspeed: "KIAS" },
    { code: "V_NO", name: "Smooth air above", valueKt: 115, airspeed: "KIAS" },
    { code: "V_NE", name: "Never exceed", valueKt: 138, airspeed: "KIAS" },
  ],
  criticalAltitudeFt: 9000,
};

/** The control under test: three detents in the air, and off the aircraft on the ground. */
export const COWL: Control = {
  name: "COWL",
  positions: [
    { name: "SHUT", groundOnly: false, maxSpeedKt: null, restricted: true },
    { name: "TRAIL", groundOnly: false, maxSpeedKt: null, restricted: false },
    { name: "OPEN", groundOnly: false, maxSpeedKt: 105, restricted: false },
    { name: "REMOVED", groundOnly: true, maxSpeedKt: null, restricted: false },
  ],
  recoverTo: "OPEN",
};

type ConfigurationSeed = {
  id: string;
  number: "C-13" | "C-14";
  fitted: string;
  details: { label: string; value: string }[];
  massKg: number;
  armM: number;
  isCurrent: boolean;
  gapsMeasured: number; // days from the demo date
  signed: number;
  disturbed: number | null;
};

const details = (gap: string, duct: string): { label: string; value: string }[] => [
  { label: "Engine", value: "HF-4L serial 0007" },
  { label: "Lower cowl and belly duct", value: duct },
  { label: "Order in the duct", value: "intercooler, radiator, oil cooler" },
  { label: "Exit gap SHUT / TRAIL / OPEN", value: `${gap} mm, each ±3` },
  { label: "Coolant", value: "6.5 L, 50 % glycol by volume" },
  { label: "Cap", value: "1.1 bar" },
  { label: "Thermostat valve", value: "starts 82 °C, full 92 °C" },
  { label: "Fuel", value: "aviation gasoline, 0.72 kg/L" },
];

export const CONFIGURATIONS: ConfigurationSeed[] = [
  {
    id: CONFIGURATION_IDS["C-13"],
    number: "C-13",
    fitted: "Ducted belly radiator, duct seal of the first build",
    details: details("12 / 42 / 104", "HF-R2-71 rev B"),
    massKg: 380.4,
    armM: 1.894,
    isCurrent: false,
    gapsMeasured: -71,
    signed: -70,
    disturbed: -56,
  },
  {
    id: CONFIGURATION_IDS["C-14"],
    number: "C-14",
    fitted: "Ducted belly radiator, duct resealed, COWL cable re-rigged",
    details: details("12 / 45 / 110", "HF-R2-71 rev C"),
    massKg: 381,
    armM: 1.895,
    isCurrent: true,
    gapsMeasured: -54,
    signed: -53,
    disturbed: -56,
  },
];
