/** A debrief in mixed units: the part of worked scenario 11 that the core answers. Figures by hand; conversions from NIST SP 811. */
import { describe, expect, test } from "vitest";
import type { Debrief } from "@/lib/testcards/debrief-types";
import { convert } from "@/lib/testcards/units";
import { minutesBetween, validateDebrief } from "@/lib/testcards/validate-debrief";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, typedDebrief } from "../testcards/support/sample-debrief";

const readings = [sampleReading("oil-p", "single"), sampleReading("cht", "highest"), sampleReading("oil-t", "highest")];
const card = sampleCard([samplePoint({ readings })]);

const debrief = (oilT: number, landing: string): Debrief => {
  const typed = typedDebrief(card, { p1: { readings: { "oil-p": { value: 58 }, cht: { value: 245 }, "oil-t": { value: oilT } } } });
  return {
    ...typed,
    times: { ...typed.times, offBlocks: "09:12", takeOff: "09:21", landing, onBlocks: "10:10" },
    fuel: { start: null, end: null, uplift: { value: 6.4, unit: "USgal" } },
  };
};
const sound = debrief(86, "10:04");

describe("S11, debrief in mixed units", () => {
  test("counts 58 minutes block and 43 airborne, and 25.1 L/h over the block", () => {
    const { offBlocks, takeOff, landing, onBlocks } = sound.times;
    const blockMin = minutesBetween(offBlocks, onBlocks) ?? 0;
    expect([blockMin, minutesBetween(takeOff, landing)]).toEqual([58, 43]);
    const litres = convert(6.4, "USgal", "L");
    expect(digit(litres)).toBe("24.2");
    expect(digit(litres / (58 / 60))).toBe("25.1");
    expect(validateDebrief(card, sound, { complete: true })).toEqual([]);
  });

  test("keeps oil pressure in psi, within: 58 + 3 ≤ 72, and 4.00 bar", () => {
    expect(lineOf(checked(card, sound), "oil-p", "as flown, card")).toMatchObject({
      verdict: "within",
      onGauge: { value: 58, unit: "psi" },
    });
    expect(convert(58, "psi", "bar").toFixed(2)).toBe("4.00");
  });

  test("turns head metal from °F: 199 + 45 × 1.04 = 245.8 °F = 118.8 °C, within", () => {
    const line = lineOf(checked(card, sound), "cht", "as flown, placard");
    expect(line.onGauge).toEqual({ value: 245, unit: "degF" });
    expect(digit(line.asTrue?.value)).toBe("118.8");
    expect(line.verdict).toBe("within");
  });

  test("refuses 860 typed for oil temperature and a landing before the take-off, and nothing else", () => {
    expect(validateDebrief(card, debrief(860, "09:04")).map((error) => error.key)).toEqual(["times.landing", "p1.oil-t.value"]);
  });

  test("judges an amendment of 58 to 56 psi beside the raw 58", () => {
    const report = checked(card, sound, { amendments: [{ reading: "oil-p", value: 56 }] });
    expect(lineOf(report, "oil-p", "as flown, card").onGauge?.value).toBe(56);
    expect(sound.points[0]?.readings[0]?.value).toBe(58);
  });
});
