import { describe, expect, test } from "vitest";
import { abortRow } from "@/app/(desk)/programmes/[programme]/limits/limit-rows";
import { demoSnapshot } from "@/db/seed/snapshot";
import { testPointNamed } from "@/db/seed/test-points/shelf";
import type { AbortLine, AbortNumber } from "@/lib/testcards/card";

const programme = demoSnapshot("2031-05-09");
const numberOf = (lines: AbortLine[], parameter: string): AbortNumber => {
  const found = lines.find((line) => line.kind === "number" && line.parameter === parameter);
  if (found?.kind !== "number") throw new Error(parameter);
  return found;
};
const rowOf = (line: AbortNumber) => {
  const parameter = programme.parameters.find(({ code }) => code === line.parameter);
  if (!parameter) throw new Error(line.parameter);
  const gauge = programme.instruments.find(({ id }) => id === line.instrument);
  return abortRow(line, parameter, gauge ? [gauge] : []);
};

describe("a standing abort on the limits page", () => {
  // The rule comes to 109 − 3 − 1 = 105; 102.5 prints, and 102.5 on the gauge is 101.5 + 2.5 · 1.05 = 104.125 true, not 105.
  test("shows the true value of the number that prints, not the rule's threshold", () => {
    const line = numberOf(programme.standingAborts, "coolant");
    expect(line).toMatchObject({ setBy: "rule", trueValue: 105, onGauge: 102.5 });
    const row = rowOf(line);
    expect(row.trueText).toBe("104.1\u202f°C");
    expect(row.onGauges[0]).toContain("102.5");
  });

  test("turns no rate back as if it were a temperature", () => {
    const row = rowOf(numberOf(testPointNamed("T15").aborts.lines, "cht"));
    expect(row.trueText).toBe("—");
    expect(row.onGauges[0]).toMatch(/^40.* in 60 s$/);
  });
});
