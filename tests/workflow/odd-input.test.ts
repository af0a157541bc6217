import { describe, expect, test } from "vitest";
import { B612_WIDTHS } from "@/lib/testcards/b612-widths";
import { checkDebrief } from "@/lib/testcards/check-debrief";
import { debriefModel } from "@/lib/testcards/debrief";
import type { Debrief, DebriefField } from "@/lib/testcards/debrief-types";
import { reviewCard } from "@/lib/testcards/readiness";
import { layOutSheet } from "@/lib/testcards/sheet";
import { validateDebrief } from "@/lib/testcards/validate-debrief";
import { CardContentInput } from "@/lib/workflow/card/schema";
import { DebriefInput } from "@/lib/workflow/debrief/schema";
import { type Chance, seeded, spoil } from "../support/odd-values";
import { climb, readyCard, readyContext, shut, soak } from "../testcards/support/ready-card";
import { CONTEXT, typedDebrief } from "../testcards/support/sample-debrief";

describe("whatever a schema takes", () => {
  test("as a draft can be reviewed, laid out and debriefed, so that no saved card breaks its own page", { timeout: 120_000 }, () => {
    const chance = seeded(7);
    let taken = 0;
    for (let i = 0; i < 150 && taken < 40; i += 1) {
      const card = readyCard([climb(), shut(), soak()]);
      for (let n = 0; n < 3; n += 1) spoil(card.content, chance);
      if (!CardContentInput.safeParse(card.content).success) continue;
      taken += 1;
      reviewCard(card, readyContext());
      layOutSheet(card, { paper: "a5", state: "draft", widths: B612_WIDTHS });
      debriefModel(card);
    }
    expect(taken).toBeGreaterThanOrEqual(15);
  });

  test("as a debrief, and the core finds possible, is judged without an error and with finite figures", { timeout: 120_000 }, () => {
    const chance = seeded(11);
    const card = readyCard([climb(), shut(), soak()]);
    const fields = new Map(debriefModel(card).map((field) => [field.key, field]));
    let judged = 0;
    for (let i = 0; i < 1500 && judged < 300; i += 1) {
      const debrief = typedDebrief(card, { climb: {}, shut: {}, soak: {} });
      fill(debrief, fields, chance);
      if (chance.next() < 0.5) spoil(debrief, chance);
      if (!DebriefInput.safeParse(debrief).success || validateDebrief(card, debrief, { complete: true }).length > 0) continue;
      judged += 1;
      const report = checkDebrief(card, debrief, { ...CONTEXT, stationPressureAltitudeFt: null });
      for (const { asTrue, hotDay, margin } of report.lines)
        for (const figure of [asTrue?.value, hotDay?.value, margin])
          if (typeof figure === "number") expect(Number.isFinite(figure)).toBe(true);
    }
    expect(judged).toBeGreaterThanOrEqual(100);
  });
});

/** Values at and between the ends of what each gauge can show. */
function fill(debrief: Debrief, fields: Map<string, DebriefField>, { next, pick }: Chance): void {
  for (const point of debrief.points) {
    point.ranForS = pick([null, 900, 3600]);
    for (const entry of point.readings)
      for (const part of ["value", "atS", "altitudeFt", "oat"] as const) {
        const field = fields.get(`${point.point}.${entry.reading}.${part}`);
        if (!field || next() < 0.25) continue;
        const [low, high] = [field.low ?? 0, field.high ?? 100];
        entry[part] = part === "atS" ? pick([0, 30, 600]) : pick([low, high, low + next() * (high - low)]);
      }
  }
}
