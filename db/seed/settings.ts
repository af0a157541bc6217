import type { ProgrammeSettings } from "@/db/schema";
import { COWL } from "./aircraft";
import { abortAt, abortIf } from "./test-points/build";

export const NOTICE = "Limits invented for this demonstration: for no real aircraft.";

export const PROGRAMME_NAME = "Quillon R2, belly radiator and COWL";
export const PROGRAMME_SUMMARY =
  "New lower cowl with a ducted belly radiator and a pilot-operated exit, COWL. Does the engine stay inside its limits on the ground, in the air and on the hot day?";

export const SETTINGS: ProgrammeSettings = {
  notice: NOTICE,
  airfield: { name: "Harrow Fen", elevationFt: 350 },
  controls: [COWL],
  coolDown: { durationS: 180, text: "1000 rpm 3 min, turbine cool-down" },
  callWords: [
    { word: "terminate", meaning: "stop the point, not a safety matter" },
    { word: "abort", meaning: "stop now, make safe" },
    { word: "knock it off", meaning: "everybody stops, go home" },
  ],
  goNoGo: [
    "wind 15 kt, gust spread 8, crosswind 8 or less",
    "cloud base 3000 AGL, visibility 8 km or more",
    "DA 4000 ft or less, OAT 5-38 °C, runway dry",
    "no grounding squawk, calibrations in date",
    "configuration signed, exit gaps measured",
    "mass and CG inside, fuel at least plan",
    "fire cover, phone or radio relay",
    "pilot rested and content, REV read aloud, equal",
  ],
  thenLine: {
    air: "COWL OPEN (below 105 kt), 45 %, nose down, to strip, call, not above 105 kt",
    ground: "COWL OPEN, 1000 rpm, nose into wind, cool-down 3 min unless fire, stop, call",
  },
  thenActions: {
    air: [
      "COWL OPEN (below 105 kt; if faster, slow first)",
      "power back to 45 % over 5 s, never slammed shut",
      "nose down if climbing",
      "turn to the strip",
      "call; not above 105 kt",
    ],
    ground: ["COWL OPEN", "1000 rpm", "nose into wind", "cool-down 3 min unless fire", "stop", "call"],
  },
  /** Card limit less U less the standard rate over 30 s, turned to the gauge and rounded to a mark on the cautious side. */
  standingAborts: [
    abortAt("coolant", "COOLANT-PANEL", 105, 102.5),
    abortAt("cht", "CHT-PANEL", (303 - 32) / 1.8, 300),
    abortAt("oil-t", "OIL-T", 113, 110),
    abortAt("tit", "TIT", 865, 860),
    abortAt("iat", "IAT", 57, 55),
    abortAt("oil-p", "OIL-P", 36, 37.5, { side: "min", when: "at power" }),
    ...abortIf("COWL lever stuck", "smoke, smell", "vibration, fluid"),
  ].map((line) => ({ ...line, id: `standing-${line.id}` })),
  reactionMin: 0.5,
  fuelPlan: { taxiL: 3, returnL: 7, reserveL: 15, taxiMin: 8, returnMin: 10, resetMin: 2 },
  daMaximumFt: 4000,
};
