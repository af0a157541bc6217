import { describe, expect, it } from "vitest";
import { reviewCard, reviewSortie } from "@/lib/testcards/readiness";
import { climb, readyCard, readyContext, readySortie, readySortieContext, shut, soak } from "../support/ready-card";

describe("a card that is in order", () => {
  it("raises nothing for a climb, a COWL SHUT point and a heat soak", () => {
    expect(reviewCard(readyCard([climb()]), readyContext())).toEqual([]);
    expect(reviewCard(readyCard([shut()]), readyContext())).toEqual([]);
    expect(reviewCard(readyCard([soak()]), readyContext())).toEqual([]);
  });

  it("raises nothing for a sortie that flies it", () => {
    expect(reviewSortie(readySortie(), readySortieContext())).toEqual([]);
  });
});
