import { describe, expect, test } from "vitest";
import { gaugeFromTrue, gaugeFromTrueRate, trueFromGauge, trueRateFromGauge, uncertaintyIn } from "@/components/builder/gauge-both-ways";
import { calibratedInstruments } from "@/db/seed/snapshot";
import type { Instrument } from "@/lib/testcards/card";

const gauge = (name: string): Instrument => {
  const found = calibratedInstruments("2031-05-09").find((instrument) => instrument.name === name);
  if (!found) throw new Error(name);
  return found;
};

describe("a number both ways", () => {
  // Coolant table: 101.5 true reads 100, then 1.05 true a degree read: 102.5 on the gauge is 101.5 + 2.625.
  test("102.5 on the coolant gauge is 104.125 true, and back", () => {
    expect(trueFromGauge(102.5, gauge("COOLANT-PANEL"), "degC")).toBeCloseTo(104.125, 9);
    expect(gaugeFromTrue(104.125, "degC", gauge("COOLANT-PANEL"))).toBeCloseTo(102.5, 9);
  });

  test("answers nothing beyond the calibrated range, or without a calibration", () => {
    expect(trueFromGauge(130, gauge("COOLANT-PANEL"), "degC")).toBeNull();
    expect(gaugeFromTrue(200, "degC", gauge("COOLANT-PANEL"))).toBeNull();
    const bare = { ...gauge("COOLANT-PANEL"), calibration: null };
    expect([trueFromGauge(90, bare, "degC"), gaugeFromTrue(90, "degC", bare), uncertaintyIn(bare, "degC")]).toEqual([null, null, null]);
    expect([trueRateFromGauge(5, 60, bare, "degC"), gaugeFromTrueRate(5, "degC", 60, bare)]).toEqual([null, null]);
  });

  // The head table has one slope, 1.04, over its hot end: 40 °F · 1.04 = 41.6 °F = 23.11 °C in 60 s, never less the 32.
  test("a change of 40 °F in 60 s is 23.11 °C a minute, in 30 s twice that", () => {
    expect(trueRateFromGauge(40, 60, gauge("CHT-PANEL"), "degC")).toBeCloseTo(23.111, 3);
    expect(trueRateFromGauge(40, 30, gauge("CHT-PANEL"), "degC")).toBeCloseTo(46.222, 3);
  });

  // 23.5 °C a minute is 42.3 °F; 42.3/1.04 = 40.673.
  test("23.5 °C a minute is 40.67 °F on the gauge in 60 s", () => {
    expect(gaugeFromTrueRate(23.5, "degC", 60, gauge("CHT-PANEL"))).toBeCloseTo(40.673, 3);
  });

  // U 6 °F is 6/1.8 = 3.33 °C.
  test("U turns as a difference", () => {
    expect(uncertaintyIn(gauge("CHT-PANEL"), "degC")).toBeCloseTo(3.333, 3);
  });
});
