import { describe, expect, it } from "vitest";
import type { Hazard } from "@/lib/testcards/card";
import { measureSheet, READINESS_RULES, reviewCard } from "@/lib/testcards/readiness";
import { must, oneFinding, oneSortieFinding, plain } from "../support/one-finding";
import { climb, readyCard, readyContext, shut } from "../support/ready-card";

describe("build-up", () => {
  it("finds a parent that is not flown, not reviewed or on hold, at the card and at the sortie", () => {
    const found = oneFinding("parent-not-clear", [climb()], ({ context }) => {
      context.buildUp = [];
    });
    expect(plain(found)).toBe("Point 1: its build-up parent T11 is not flown. Fly or decide it first.");
    oneFinding("parent-not-clear", [climb()], ({ context }) => {
      context.buildUp = [{ code: "T11", state: "hold", from: "flown" }];
    });
    oneSortieFinding("parent-not-clear", [climb()], ({ context }) => {
      context.buildUp = [{ code: "T11", state: "not reviewed", from: null }];
    });
  });

  it("finds a step of more than 1.5 times the largest earlier one: 60 to 70 % after steps of 5", () => {
    const found = oneFinding("build-up-skipped", [shut()], ({ point }) => {
      must(point.series).level.value = 70; // predicted 102.1, inside 104.5
    });
    expect(plain(found)).toContain("is a step of 10 %, more than 1.5 times the largest earlier step, 5 %. Put in a point between.");
    oneFinding("build-up-skipped", [shut()], ({ context }) => {
      context.seriesResults = [];
    });
  });

  it("lets a step of 7.5 after steps of 5 pass, and base points with nothing before them", () => {
    const near = shut();
    must(near.series).level.value = 67.5;
    expect(reviewCard(readyCard([near]), readyContext())).toEqual([]);
    const base = shut({ series: { name: "COWL SHUT power", level: { value: 45, unit: "%" }, base: true } });
    expect(reviewCard(readyCard([base]), readyContext({ seriesResults: [] }))).toEqual([]);
  });

  it("finds points out of build-up order and two that share a number", () => {
    const found = oneFinding("points-out-of-order", [climb(), shut()], ({ card }) => {
      card.content.points.reverse();
    });
    expect(plain(found)).toBe("Point 2 (F4) prints after Point 1 (F5), out of build-up order. Move it before and renumber.");
    oneFinding("points-out-of-order", [climb(), shut()], ({ card }) => {
      must(card.content.points[1]).id = "climb";
    });
  });

  it("finds two changes in one step", () => {
    const found = oneFinding("two-changes-at-once", [climb()], ({ point }) => {
      point.changes = ["power", "position"];
    });
    expect(plain(found)).toBe("Point 1 changes power and COWL position in one build-up step. Change one.");
  });
});

describe("hazards and objectives", () => {
  const hazard =
    (over: Partial<Hazard>) =>
    ({ card }: { card: ReturnType<typeof readyCard> }) =>
      Object.assign(must(card.programme.hazards[0]), over);

  it("finds a residual risk above the signer: 2C Serious for one who accepts Medium", () => {
    const found = oneFinding("risk-above-signer", [climb()], hazard({ after: { severity: 2, probability: "C" } }));
    expect(plain(found)).toBe(
      "H1 Coolant boils: residual risk Serious is above what B. Reviewer may accept, Medium. Get the higher signature.",
    );
    expect(found[0]?.where).toEqual({ at: "hazard", hazard: "H1" });
  });

  it("lets nobody accept High, even while the releaser is not known", () => {
    oneFinding("risk-above-signer", [climb()], ({ card, context }) => {
      context.releaser = null;
      hazard({ after: { severity: 1, probability: "C" } })({ card });
    });
  });

  it("does not take a hazard for eliminated by a procedure: 1F counts as 1E, Medium", () => {
    oneFinding("risk-above-signer", [climb()], ({ card, context }) => {
      context.releaser = { id: "x", name: "C. Reviewer", residualRisk: "Low" };
      hazard({
        after: { severity: 1, probability: "F" },
        before: { severity: 1, probability: "C" },
        mitigations: [{ kind: "procedure", text: "overhead climb" }],
      })({ card });
    });
  });

  it("finds a hazard without a mitigation, with only careful words, or not on the hazard sheet", () => {
    oneFinding("hazard-not-mitigated", [climb()], hazard({ mitigations: [] }));
    const found = oneFinding("hazard-not-mitigated", [climb()], hazard({ mitigations: [{ kind: "procedure", text: "Be careful" }] }));
    expect(plain(found)).toBe('H1 Coolant boils has only "Be careful". Add one that acts.');
    oneFinding("hazard-not-mitigated", [climb()], ({ point }) => {
      point.hazards.push("H9");
    });
  });

  it("finds a severity lowered by a procedure alone", () => {
    oneFinding(
      "severity-cut-by-procedure",
      [climb()],
      hazard({ after: { severity: 3, probability: "C" }, mitigations: [{ kind: "procedure", text: "glide range kept" }] }),
    );
  });

  it("finds a point without an objective and an objective without a point", () => {
    oneFinding("point-no-objective", [climb()], ({ point }) => {
      point.objectives = [];
    });
    const found = oneFinding("objective-no-point", [climb()], ({ card }) => {
      card.programme.objectives.push({ code: "O7", question: "Is it tight and sound?", success: "no leak", priority: "must" });
    });
    expect(plain(found)).toBe('O7 "Is it tight and sound?" has no point. Plan one or say who shows it otherwise.');
  });
});

describe("configuration, squawks and release", () => {
  it("finds a configuration that is not the signed current one, at the card and at the sortie", () => {
    const found = oneFinding("configuration-not-current", [climb()], ({ context }) => {
      context.currentConfiguration = { id: "c-15", number: "C-15", signed: true };
    });
    expect(plain(found)).toBe("Card 07 stands on C-14, but the current configuration is C-15. Update the card or the aircraft.");
    oneFinding("configuration-not-current", [climb()], ({ card }) => {
      must(card.programme.configuration).signedBy = null;
    });
    oneSortieFinding("configuration-not-current", [climb()], ({ sortie }) => {
      sortie.configuration = { id: "c-13", number: "C-13" };
    });
  });

  it("finds an open grounding squawk", () => {
    const squawks = [{ id: "s1", number: "S-3", text: "Cylinder 3 leaks." }];
    const found = oneFinding("grounding-squawk-open", [climb()], ({ context }) => {
      context.groundingSquawks = squawks;
    });
    expect(plain(found)).toBe("Grounding squawk S-3 is open: Cylinder 3 leaks. Clear it before release or brief.");
    oneSortieFinding("grounding-squawk-open", [climb()], ({ context }) => {
      context.groundingSquawks = squawks;
    });
  });

  it("finds gaps not measured since they were disturbed", () => {
    const found = oneFinding("exit-gap-not-measured", [climb()], ({ card }) => {
      must(card.programme.configuration).disturbedOn = "2031-05-02";
    });
    expect(plain(found)).toBe(
      "The gaps of COWL in C-14 were measured on 2031-05-01, but not since they were disturbed on 2031-05-02. Measure them at every position.",
    );
    oneSortieFinding("exit-gap-not-measured", [climb()], ({ card }) => {
      must(card.programme.configuration).gapsMeasuredOn = null;
    });
  });

  it("finds the author as releaser, and content edited after release", () => {
    oneFinding("author-sole-releaser", [climb()], ({ context }) => {
      context.releaser = { id: "engineer", name: "A. Engineer", residualRisk: "Medium" };
    });
    oneFinding("edited-after-release", [climb()], ({ context }) => {
      context.digest = "aaaaaaaa0001";
      context.releasedDigest = "bbbbbbbb0002";
    });
    oneSortieFinding("edited-after-release", [climb()], ({ sortie }) => {
      must(sortie.cards[0]).digest = "another";
    });
  });

  it("finds missing call words and a missing hot-day basis", () => {
    oneFinding("call-words-missing", [climb()], ({ card }) => {
      card.programme.callWords = [];
    });
    oneFinding("call-words-missing", [climb()], ({ card }) => {
      must(card.programme.callWords[0]).meaning = "";
    });
    oneFinding("hot-day-basis-missing", [climb()], ({ card }) => {
      card.programme.hotDayBasis = null;
    });
  });

  it("finds bingo fuel missing or below reserve, return and unusable: 15 + 7 + 4 = 26 L", () => {
    const found = oneFinding("bingo-low", [climb()], ({ card }) => {
      card.content.bingoL = 25;
    });
    expect(plain(found)).toBe("Card 07: bingo fuel 25 L is below reserve plus return plus unusable, 26 L. Set it to 26 L or more.");
    oneSortieFinding("bingo-low", [climb()], ({ card }) => {
      card.content.bingoL = null;
    });
  });
});

describe("the sheet", () => {
  it("finds content that runs off the sheet", () => {
    oneFinding("sheet-overflow", [climb()], ({ card }) => {
      card.programme.goNoGo = Array.from({ length: 40 }, (_, i) => `line ${i} 15 kt or less`);
    });
  });

  it("finds a THEN line that no point page can repeat, and a page that lacks a block", () => {
    oneFinding("block-not-repeated", [climb()], ({ card }) => {
      card.programme.thenLine.air = "";
    });
    const card = readyCard();
    const sheet = must(measureSheet(card, readyContext().widths));
    for (const page of sheet.pages) page.items = page.items.filter((item) => item.role !== "abort");
    const found = reviewCard(card, readyContext(), sheet);
    expect(new Set(found.map((f) => f.code))).toEqual(new Set(["block-not-repeated"]));
    expect(found[0]?.message).toBe("Page 2: abort missing. Repeat it on every point page.");
  });

  it("finds type below 12 pt for steps and 14 pt for limits", () => {
    const card = readyCard();
    const sheet = must(measureSheet(card, readyContext().widths));
    for (const page of sheet.pages) for (const item of page.items) if (item.kind === "text" && item.role === "step") item.sizePt = 11;
    const found = reviewCard(card, readyContext(), sheet);
    expect(found.map((f) => `${f.code} ${f.message}`)).toEqual(["type-too-small Page 2: step type of 11 pt is below 12 pt. Enlarge it."]);
  });

  it("finds more than six points on a card and more than three on a first flight", () => {
    const many = (n: number) => Array.from({ length: n }, (_, i) => climb({ id: `p${i}` }));
    oneFinding("too-many-points", many(6), ({ card }) => {
      card.content.points.push(climb({ id: "p7" }));
    });
    oneFinding("too-many-points", many(4), ({ card }) => {
      card.content.firstFlightOfChange = true;
    });
  });
});

describe("gauge numbers and true values in words", () => {
  it("finds a true value and a gauge number without its label on a pilot line", () => {
    const found = oneFinding("gauge-true-mixed", [climb()], ({ point }) => {
      point.recovery = "COWL OPEN, 45 % until coolant 85";
    });
    expect(plain(found)).toBe('Point 1, recovery: "coolant 85" stands without "on the gauge". Print the gauge number and say so.');
    oneFinding("gauge-true-mixed", [climb()], ({ point }) => {
      point.entryText = "coolant 93 true";
    });
  });

  it("lets a labelled gauge number and a time pass", () => {
    const card = readyCard([climb({ recovery: "COWL OPEN, 45 % until coolant 85 on gauge", entryText: "coolant 5 min past highest" })]);
    expect(reviewCard(card, readyContext())).toEqual([]);
  });
});

describe("the list of rules", () => {
  it("holds every code once, 56 numbers with their parts", () => {
    const codes = READINESS_RULES.map((rule) => rule.code);
    expect(new Set(codes).size).toBe(codes.length);
    const numbers = READINESS_RULES.map((rule) => rule.number);
    const split = [10, 16, 18, 24, 28, 32];
    const expected = Array.from({ length: 56 }, (_, i) => i + 1).flatMap((n) => (split.includes(n) ? [`${n}a`, `${n}b`] : [`${n}`]));
    expect(numbers).toEqual(expected);
  });

  it("takes little time on twelve points, for it runs at every keystroke", () => {
    const card = readyCard(Array.from({ length: 12 }, (_, i) => (i % 2 ? climb({ id: `p${i}` }) : shut({ id: `p${i}` }))));
    const context = readyContext();
    for (let i = 0; i < 50; i++) reviewCard(card, context, null);
    const from = process.cpuUsage().user;
    for (let i = 0; i < 50; i++) reviewCard(card, context, null);
    // 2 to 5 ms of processor time where it was written; the mark is set where typing would feel it.
    expect((process.cpuUsage().user - from) / 1000 / 50).toBeLessThan(30);
  });
});
