import { describe, expect, test } from "vitest";
import { riskLevel } from "@/lib/testcards/risk";
import type { HazardSeverity, Probability } from "@/lib/testcards/words";
import matrix from "./truth/risk-matrix.json";

const cells = matrix.rows.flatMap(({ probability, levels }) =>
  levels.map(
    (level, i) => [`${matrix.columns[i]}${probability}`, matrix.columns[i] as HazardSeverity, probability as Probability, level] as const,
  ),
);

describe("riskLevel", () => {
  // MIL-STD-882E Table III, all twenty-four cells.
  test.each(cells)("gives %s the level of Table III", (_, severity, probability, level) => {
    expect(riskLevel(severity, probability)).toBe(level);
  });

  test("covers four severities and six probabilities", () => {
    expect(cells).toHaveLength(24);
  });

  test("refuses severities and letters that are not in the table", () => {
    expect(() => riskLevel(0 as 1, "A")).toThrow(/severity is 0; it must be one of 1, 2, 3, 4/);
    expect(() => riskLevel(1, "G" as "A")).toThrow(/probability is "G"/);
    expect(() => riskLevel(1, "toString" as "A")).toThrow(RangeError);
  });
});
