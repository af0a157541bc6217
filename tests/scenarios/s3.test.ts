/** Heat soak with the exit flap open and shut. Figures: worked scenario 3 of the team, by hand; the logger reads true. */
import { describe, expect, test } from "vitest";
import type { PointLimit } from "@/lib/testcards/card";
import { sampleCard, samplePoint, sampleReading } from "../testcards/support/sample-card";
import { checked, digit, lineOf, minuteRows, typedDebrief } from "../testcards/support/sample-debrief";

const own = (reading: string, value: number): PointLimit => ({
  id: `own-${reading}`,
  reading,
  label: reading,
  side: "max",
  value,
  unit: "degC",
  forS: 0,
  statistic: "instant",
  expandedUncertainty: null,
  source: "PL-01 rev 2",
});

const soak = (position: string, values: { coolant: number[]; skin: number; line: number }) => {
  const point = samplePoint({
    positions: [{ control: "COWL", position }],
    completion: { rule: "whole run", runS: null, pastPeakS: 600 },
    cardTable: false,
    readings: [
      sampleReading("coolant", "series", { instrument: "LOGGER-COOLANT", conditions: [] }),
      sampleReading("skin", "series", { conditions: [] }),
      sampleReading("line", "series", { conditions: [] }),
      sampleReading("oat", "single"),
    ],
    limits: [own("coolant", 109), own("skin", 98), own("line", 52)],
  });
  const card = sampleCard([point], { content: { kind: "ground run" } });
  const logged = (peak: number) => minuteRows([peak - 1, peak, ...Array<number>(10).fill(peak - 2)]);
  const coolant = minuteRows([...values.coolant, ...Array<number>(11).fill(85)]);
  const readings = {
    coolant: { rows: coolant },
    skin: { rows: logged(values.skin) },
    line: { rows: logged(values.line) },
    oat: { value: 22 },
  };
  return checked(card, typedDebrief(card, { p1: { readings } }), { dispositions: [{ point: "p1", disposition: "accept" }] });
};

describe("S3, heat soak", () => {
  const shut = soak("SHUT", { coolant: [88, 93.5, 97.9, 100.6, 101.4, 101.0], skin: 78.5, line: 41 });
  const open = soak("OPEN", { coolant: [88, 90.5, 91.6, 91.2], skin: 60, line: 35 });

  test("SHUT exceeds on the hot day by 1.7, less than U: 101.4 + 37.307 − 22 = 116.7", () => {
    const line = lineOf(shut, "coolant", "hot day, placard");
    expect(line.hotDay?.difference.toFixed(2)).toBe("15.31");
    expect(digit(line.hotDay?.value)).toBe("116.7");
    expect(line.hotDay?.expandedUncertainty?.toFixed(2)).toBe("1.80"); // √(1.5² + 1.0²)
    expect(digit(line.margin)).toBe("-1.7");
    expect(line).toMatchObject({ verdict: "exceeded", notes: ["by less than U"], otherBasis: null });
  });

  test.each([
    ["skin", "93.8", "3.2", "within"],
    ["line", "56.3", "2.2", "marginal"], // 58.5 against 58
  ])("SHUT puts %s at %s ± %s, %s", (reading, value, u, verdict) => {
    const line = lineOf(shut, reading, "hot day, placard");
    expect(digit(line.hotDay?.value)).toBe(value);
    expect(digit(line.hotDay?.expandedUncertainty)).toBe(u);
    expect(line.verdict).toBe(verdict);
  });

  test("SHUT was logged to its peak and ten minutes past it, and holds without a squawk", () => {
    expect(shut.points[0]).toMatchObject({ completion: null, decision: "hold", worst: "exceeded" });
    expect(shut.squawks).toEqual([]);
  });

  test("OPEN is within and above normal: 91.6 + 15.31 = 106.9, upper 108.7", () => {
    const line = lineOf(open, "coolant", "hot day, placard");
    expect(digit(line.hotDay?.value)).toBe("106.9");
    expect(digit(line.hotDay?.expandedUncertainty)).toBe("1.8");
    expect(line).toMatchObject({ verdict: "within", notes: ["above normal"] });
  });
});
